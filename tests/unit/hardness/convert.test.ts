import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { convert, converterFor, type ConversionRule } from "@/lib/hardness/convert";
import { ALL_TABLE_IDS, DEFAULT_ENABLED_TABLE_IDS } from "@/lib/hardness/published-tables";

const steel: Omit<ConversionRule, "from" | "to"> = {
  materialGroup: "steel-nonaustenitic",
  enabledTableIds: DEFAULT_ENABLED_TABLE_IDS,
};
const lowAlloy = { ...steel, materialGroup: "steel-unalloyed-lowalloy" } as const;
const codes = (result: ReturnType<typeof convert>) =>
  result.status === "ok" ? result.warnings.map(({ code }) => code) : [result.code];

describe("converting by a straight line in one table", () => {
  it("reads between two neighbouring rows and does not round", () => {
    const result = convert({ ...steel, from: "HV", to: "HRC", value: 620 });
    expect(result).toMatchObject({
      status: "ok",
      table: "steel-nonaustenitic-e140-table1",
      warnings: [],
    });
    expect(result.status === "ok" && result.value).toBeCloseTo(56.35, 10);
    expect(result.status === "ok" && result.edition).toMatch(/^ASTM E140 \(.+\), Table 1$/);
  });

  it("falls to the next table of the group that holds both scales around the value", () => {
    const table = (result: ReturnType<typeof convert>) => result.status === "ok" && result.table;
    expect(table(convert({ ...steel, from: "HRC", to: "Rm_MPa", value: 45 }))).toBe(
      "steel-a370-rockwell-c",
    );
    expect(table(convert({ ...steel, from: "HRB", to: "Rm_MPa", value: 80 }))).toBe(
      "steel-a370-rockwell-b",
    );
    expect(table(convert({ ...steel, from: "HV", to: "HRA", value: 200 }))).toBe(
      "steel-nonaustenitic-e140-table2",
    );
  });

  it("uses SAE J417 only when it is named", () => {
    const tableId = "steel-sae-j417-rockwell-c";
    expect(convert({ ...steel, from: "HRC", to: "HRB", value: 21 }).status).toBe("refused");
    expect(convert({ ...steel, from: "HRC", to: "HRB", value: 21, tableId })).toMatchObject({
      status: "ok",
      table: tableId,
      value: 98.5,
    });
  });

  it("reads across an empty cell inside the filled range and says so", () => {
    const result = convert({ ...lowAlloy, from: "HV", to: "HRB", value: 155 });
    expect(codes(result)).toContain("interpolated_over_empty_cell");
    expect(codes(convert({ ...lowAlloy, from: "HV", to: "HRB", value: 160 }))).toEqual([]);
  });

  it("never falls while the value rises", () => {
    const toHrc = converterFor({ ...steel, from: "HV", to: "HRC" });
    fc.assert(
      fc.property(
        fc.double({ min: 238, max: 940, noNaN: true }),
        fc.double({ min: 238, max: 940, noNaN: true }),
        (a, b) => {
          const [low, high] = [toHrc(Math.min(a, b)), toHrc(Math.max(a, b))];
          if (low.status !== "ok" || high.status !== "ok")
            throw new Error("refused inside the range");
          expect(low.value).toBeLessThanOrEqual(high.value);
        },
      ),
    );
  });

  it("leads back to where it began, anywhere inside a table", () => {
    const tableId = "steel-unalloyed-lowalloy-iso18265-a1";
    fc.assert(
      fc.property(fc.double({ min: 240, max: 940, noNaN: true }), (value) => {
        const there = convert({ ...lowAlloy, tableId, from: "HV", to: "HRC", value });
        if (there.status !== "ok") throw new Error(there.reason);
        const back = convert({ ...lowAlloy, tableId, from: "HRC", to: "HV", value: there.value });
        expect(back.status === "ok" && back.value).toBeCloseTo(value, 6);
      }),
    );
  });
});

describe("warnings that go with a value", () => {
  it("warns of a value printed in parentheses", () => {
    expect(codes(convert({ ...steel, from: "HRC", to: "HBW_3000", value: 62.5 }))).toContain(
      "printed_in_parentheses",
    );
    expect(codes(convert({ ...lowAlloy, from: "HV", to: "HRB", value: 260 }))).toContain(
      "printed_in_parentheses",
    );
  });

  it("does not warn of a Brinell value that ISO 18265 prints in parentheses: HBW is valid there", () => {
    expect(codes(convert({ ...lowAlloy, from: "HV", to: "HB_30D2", value: 500 }))).toEqual([]);
  });

  it("warns of a cell that no reprint confirms, on either side", () => {
    expect(codes(convert({ ...steel, from: "HRC", to: "HR45N", value: 31 }))).toEqual([
      "unconfirmed",
    ]);
    expect(codes(convert({ ...steel, from: "HR45N", to: "HRC", value: 32.5 }))).toEqual([
      "unconfirmed",
    ]);
    expect(codes(convert({ ...steel, from: "HRC", to: "HR45N", value: 40 }))).toEqual([]);
  });

  it("warns beyond the limits of the scales themselves", () => {
    const off = "outside_scale_limits";
    expect(codes(convert({ ...steel, from: "HV", to: "HBW_3000", value: 740 }))).toContain(off);
    expect(codes(convert({ ...steel, from: "HBS_3000", to: "HRC", value: 460 }))).toContain(off);
    expect(codes(convert({ ...lowAlloy, from: "HV", to: "HRB", value: 270 }))).toContain(off);
    const tableId = "steel-sae-j417-rockwell-c";
    expect(codes(convert({ ...steel, tableId, from: "HV", to: "HRC", value: 225 }))).toContain(off);
  });
});

describe("refusals, each with its reason", () => {
  const hv = { from: "HV", to: "HRC", value: 350 } as const;

  it("refuses beyond the end of the table and names its range", () => {
    const result = convert({ ...steel, ...hv, value: 941 });
    expect(result).toMatchObject({ status: "refused", code: "outside_range" });
    expect(result.status === "refused" && result.reason).toContain("238 to 940\u00a0HV");
  });

  it("names the range of the first table that holds both scales", () => {
    const result = convert({ ...steel, from: "HRC", to: "Rm_MPa", value: 60 });
    expect(result.status === "refused" && result.reason).toContain("20 to 59\u00a0HRC");
  });

  it("offers the non-austenitic table where the low-alloy one ends", () => {
    const result = convert({ ...lowAlloy, from: "HRC", to: "HV", value: 20 });
    expect(result.status === "refused" && result.reason).toContain("ASTM E140 Table 1 has it");
  });

  it("refuses a pair of scales that no table holds", () => {
    expect(codes(convert({ ...lowAlloy, from: "HV", to: "HK", value: 300 }))).toEqual([
      "no_table_with_both_scales",
    ]);
    const named = { ...steel, tableId: "steel-nonaustenitic-e140-table1" } as const;
    expect(codes(convert({ ...named, from: "HRC", to: "HRB", value: 40 }))).toEqual([
      "no_table_with_both_scales",
    ]);
  });

  it("refuses a converted value before anything else", () => {
    expect(codes(convert({ ...steel, ...hv, inputStatus: "converted" }))).toEqual([
      "already_converted",
    ]);
  });

  it.each(["titanium", "grey-cast-iron"] as const)(
    "refuses %s: no table holds for it",
    (materialGroup) => {
      expect(codes(convert({ ...steel, ...hv, materialGroup }))).toEqual(["no_table_for_material"]);
    },
  );

  it("refuses cold-worked steel unless a person overrides, and then says so", () => {
    const coldWorked = { ...steel, ...hv, materialGroup: "steel-cold-worked" } as const;
    expect(codes(convert(coldWorked))).toEqual(["cold_worked"]);
    const overridden = convert({ ...coldWorked, allowColdWorkedOverride: true });
    expect(codes(overridden)).toContain("cold_worked_override");
    expect(overridden.status === "ok" && overridden.table).toBe(
      "steel-unalloyed-lowalloy-iso18265-a1",
    );
  });

  it("refuses a table of another group", () => {
    const tableId = "steel-nonaustenitic-e140-table1";
    const materialGroup = "steel-austenitic-stainless";
    expect(
      codes(convert({ ...steel, from: "HRC", to: "HV", value: 30, materialGroup, tableId })),
    ).toEqual(["table_of_another_group"]);
  });

  it("refuses a group whose tables are switched off, and converts once they are on", () => {
    const nickel = {
      from: "HV",
      to: "HRC",
      value: 248,
      materialGroup: "nickel-high-nickel",
    } as const;
    expect(codes(convert({ ...steel, ...nickel }))).toEqual(["table_switched_off"]);
    expect(convert({ ...steel, ...nickel, enabledTableIds: ALL_TABLE_IDS })).toMatchObject({
      status: "ok",
      value: 22.5,
    });
  });

  it("refuses a named table that is switched off", () => {
    const enabledTableIds = new Set(["steel-a370-rockwell-c"] as const);
    const tableId = "steel-nonaustenitic-e140-table1";
    expect(codes(convert({ ...steel, ...hv, tableId, enabledTableIds }))).toEqual([
      "table_switched_off",
    ]);
  });

  it("refuses what is not a number, and a scale into itself", () => {
    expect(codes(convert({ ...steel, ...hv, value: NaN }))).toEqual(["not_a_number"]);
    expect(codes(convert({ ...steel, ...hv, value: -5 }))).toEqual(["outside_range"]);
    expect(codes(convert({ ...steel, ...hv, to: "HV" }))).toEqual(["same_scale"]);
  });
});
