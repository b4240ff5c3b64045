import { z } from "zod";

/** What the gates need to know of a hardness result; the rest of its content is the chart's. */
const facts = z.object({
  traverseId: z.string(),
  traverseLabel: z.string(),
  hasConversions: z.boolean(),
  tableTitles: z.array(z.string()),
  /** Must be settled before sign-off, in words: "indents 10 and 11". */
  unsettled: z.array(z.string()),
});
export type HardnessResultFacts = z.infer<typeof facts>;

export function hardnessResultFacts(content: unknown): HardnessResultFacts {
  return facts.parse(content);
}
