import { describe, expect, it } from "vitest";
import { DEFAULT_ENABLED_TABLE_IDS } from "@/lib/hardness/published-tables";
import { profileInputOf, type ShownTraverse } from "@/lib/traverses/chart-of-traverse";
import { evaluateContent } from "@/lib/traverses/evaluate-content";
import { newTraverse } from "@/lib/traverses/new-traverse";

function shown(label: string, depthsMm: readonly number[]): ShownTraverse {
  const content = {
    ...newTraverse(),
    name: label,
    readings: depthsMm.map((depthMm, i) => ({
      id: `r${i + 1}`,
      depth: String(depthMm),
      hardness: "500",
    })),
  };
  const made = {
    traverseId: label,
    traverseLabel: label,
    enabledTableIds: DEFAULT_ENABLED_TABLE_IDS,
  };
  return { label, content, result: evaluateContent(content, made) };
}
const drawn = (own: readonly number[], other: readonly number[]) =>
  profileInputOf(shown("T1", own), { others: [shown("T3", other)] }).series.map(
    ({ label }) => label,
  );

describe("profiles behind a profile", () => {
  it("are drawn where they reach into its depths", () => {
    expect(drawn([0.5, 2, 4], [0.5, 3, 9])).toEqual(["T1", "T3"]);
    expect(drawn([0.5, 2, 4], [6, 7])).toEqual(["T1", "T3"]);
  });
  it("are left out where they begin far beyond them, as a core grid does", () => {
    expect(drawn([0.5, 2, 4], [20, 21])).toEqual(["T1"]);
  });
  it("are drawn when it has no indents of its own yet", () => {
    expect(drawn([], [20, 21])).toEqual(["T1", "T3"]);
  });
});
