import { describe, expect, it } from "vitest";
import { checkQuantityRow } from "@/scripts/check-values/quantity-rows";
import { readChecks } from "./read-checks";

/** Published and worked values; each test carries its source. */
const checks = readChecks("case_depth.csv");

describe("published values of case and decarburization depth", () => {
  it("are all here", () => {
    expect(checks).toHaveLength(67);
    expect(checks.every(({ row }) => row.source !== "")).toBe(true);
  });

  it.each(checks.map(({ title, row }) => [title, row] as const))("%s", (_title, row) => {
    expect(checkQuantityRow(row)).toEqual({ id: row.id, status: "passed" });
  });
});
