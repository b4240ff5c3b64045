import { z } from "zod";
import { UnsupportedRow, type Computed } from "./check-row";

/** Computes the answer of one row from its inputs, already read from JSON. */
export type Quantity = (inputs: unknown) => Computed;

/**
 * Ties the shape of a quantity's inputs to its calculation. Inputs of another shape make the row
 * unsupported: ignoring a key would answer another question than the one asked.
 */
export function quantity<Shape extends z.ZodRawShape>(
  shape: Shape,
  compute: (inputs: z.infer<z.ZodObject<Shape, z.core.$strict>>) => Computed,
): Quantity {
  const schema = z.strictObject(shape);
  return (inputs) => {
    const parsed = schema.safeParse(inputs);
    if (!parsed.success)
      throw new UnsupportedRow(
        `inputs of another form: ${parsed.error.issues.map(({ message }) => message).join("; ")}`,
      );
    return compute(parsed.data);
  };
}

/** The word of a verdict or the value of an answer: what a check row expects to read. */
export function wordOf(answer: { readonly verdict: string }): string {
  return answer.verdict;
}

export const numbers = z.array(z.number());
