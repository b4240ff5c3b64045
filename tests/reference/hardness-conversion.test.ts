import { describe, expect, it } from "vitest";
import { checkConversionRow } from "@/scripts/check-values/conversion-rows";
import { readChecks } from "./read-checks";

/** Published pairs and refusals; each test carries its source. */
const checks = readChecks("hardness_conversion_checks.csv");

describe("published hardness conversions", () => {
  it("are all here", () => {
    expect(checks).toHaveLength(143);
    expect(checks.every(({ row }) => row.source !== "")).toBe(true);
  });

  it.each(checks.map(({ title, row }) => [title, row] as const))("%s", (_title, row) => {
    expect(checkConversionRow(row)).toEqual({ id: row.id, status: "passed" });
  });

  it("fail when a published value is changed", () => {
    const row = checks.find(({ row: { verdict } }) => verdict === "convert")?.row;
    const changed = { ...row, expected: String(Number(row?.expected) + 10) };
    expect(checkConversionRow(changed).status).toBe("failed");
  });
});
