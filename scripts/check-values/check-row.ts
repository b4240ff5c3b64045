/** What became of one row of a check file. */
export type RowResult =
  | { readonly id: string; readonly status: "passed" }
  | { readonly id: string; readonly status: "failed" | "unsupported"; readonly reason: string };

/** What the product's code answered: a number, a word of the verdict list, or decimal text. */
export type Computed = number | string | readonly number[];

/** A row that this command has no calculation for, with what is missing. */
export class UnsupportedRow extends Error {}

function parseExpected(expected: string): number | readonly number[] {
  if (!expected.startsWith("[")) return Number(expected);
  const list: unknown = JSON.parse(expected);
  if (!Array.isArray(list) || !list.every((item) => typeof item === "number"))
    throw new UnsupportedRow(`the expected value ${expected} is not a list of numbers`);
  return list;
}

/** Why the answer is not the expected one; `null` when it is. */
export function difference(
  computed: Computed,
  check: { readonly expected: string; readonly tol: string; readonly tolKind: string },
): string | null {
  const { expected, tolKind } = check;
  const wrong = `expected ${expected}, got ${String(computed)}`;
  if (tolKind === "exact") return String(computed) === expected ? null : wrong;
  if (tolKind !== "abs" && tolKind !== "rel")
    throw new UnsupportedRow(`the tolerance kind "${tolKind}" is not known`);
  const tolerance = Number(check.tol);
  const wanted = [parseExpected(expected)].flat();
  const got = typeof computed === "number" ? [computed] : computed;
  if (typeof got === "string" || got.length !== wanted.length || !Number.isFinite(tolerance))
    return wrong;
  const isNear = (value: number, target: number) =>
    Math.abs(value - target) <= tolerance * (tolKind === "rel" ? Math.abs(target) : 1);
  const isEqual = wanted.every((target, index) => isNear(got[index] ?? NaN, target));
  return isEqual ? null : `${wrong}, tolerance ${check.tol} ${tolKind}`;
}
