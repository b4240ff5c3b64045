import { describe, expect, it } from "vitest";
import type { HardnessTable } from "@/lib/hardness/hardness-table";
import { convert } from "@/lib/hardness/convert";
import {
  ALL_TABLE_IDS,
  DEFAULT_ENABLED_TABLE_IDS,
  getTable,
  PUBLISHED_TABLES,
  tablesInOrder,
  type TableId,
} from "@/lib/hardness/published-tables";
import { isScale, type Scale } from "@/lib/hardness/scales";

const tables: readonly (HardnessTable & { readonly id: TableId })[] = PUBLISHED_TABLES;

function columnsOf(table: HardnessTable) {
  return Object.entries(table.columns).map(([name, column]) => {
    if (!isScale(name)) throw new Error(`${name} is no scale`);
    return [name, column] as const;
  });
}

const filled = (column: readonly (number | null)[]) => column.filter((cell) => cell !== null);

describe.each(tables.map((table) => [table.id, table] as const))("%s", (id, table) => {
  const keys = filled(table.columns[table.keyScale] ?? []);

  it("has columns of equal length, the key column without a gap", () => {
    const lengths = new Set(columnsOf(table).map(([, column]) => column.length));
    expect([...lengths]).toEqual([keys.length]);
  });

  it("falls strictly in every column, row by row, or rises in every one", () => {
    const directions = columnsOf(table).map(([, column]) => {
      const cells = filled(column);
      const steps = cells.slice(1).map((cell, index) => Math.sign(cell - (cells[index] ?? cell)));
      expect(new Set(steps).size).toBe(1);
      return steps[0];
    });
    expect(new Set(directions).size).toBe(1);
    expect(directions[0]).not.toBe(0);
  });

  it("marks only cells that are filled", () => {
    const marks = [table.parentheses, table.unconfirmed === "all" ? {} : table.unconfirmed];
    for (const mark of marks)
      for (const [scale, rows] of Object.entries(mark))
        for (const key of rows) {
          const row = table.columns[table.keyScale]?.indexOf(key) ?? -1;
          expect(isScale(scale) && table.columns[scale]?.[row], `${scale} at ${key}`).toEqual(
            expect.any(Number),
          );
        }
  });

  it("names its source, and is switched off when it rests on memory alone", () => {
    expect(table.source.length).toBeGreaterThan(40);
    expect(table.enabledByDefault).toBe(table.tier !== "C");
    expect(table.unconfirmed === "all").toBe(table.tier === "C");
  });

  it("leads back to the same value through every pair of columns", () => {
    const rule = {
      materialGroup: table.materialGroup,
      tableId: id,
      enabledTableIds: ALL_TABLE_IDS,
    };
    for (const [from, column] of columnsOf(table))
      for (const [to] of columnsOf(table)) {
        if (from === to) continue;
        for (const value of filled(column)) {
          const there = convert({ ...rule, from, to, value });
          if (there.status === "refused") continue;
          const back = convert({ ...rule, from: to, to: from, value: there.value });
          expect(back.status === "ok" && back.value, `${value} ${from} to ${to}`).toBeCloseTo(
            value,
            6,
          );
        }
      }
  });
});

describe("the set of tables", () => {
  it("asks the tables of a group in the order laid down", () => {
    expect(tablesInOrder("steel-nonaustenitic")).toEqual([
      "steel-nonaustenitic-e140-table1",
      "steel-nonaustenitic-e140-table2",
      "steel-a370-rockwell-c",
      "steel-a370-rockwell-b",
    ]);
    expect(tablesInOrder("steel-austenitic-stainless")).toEqual([
      "austenitic-stainless-plate-e140-table5",
      "austenitic-stainless-sheet-c-e140-table6",
      "austenitic-steel-a370-rockwell-b",
    ]);
    expect(tablesInOrder("titanium")).toEqual([]);
  });

  it("starts with the six tables that were compared with reprints", () => {
    expect(DEFAULT_ENABLED_TABLE_IDS.size).toBe(6);
    expect(ALL_TABLE_IDS.size).toBe(12);
  });

  // Row counts as the standards print them.
  it.each<[TableId, Scale, number, number, number]>([
    ["steel-nonaustenitic-e140-table1", "HRC", 49, 20, 68],
    ["steel-nonaustenitic-e140-table2", "HRB", 71, 30, 100],
    ["steel-a370-rockwell-c", "HRC", 49, 20, 68],
    ["steel-a370-rockwell-b", "HRB", 71, 30, 100],
    ["steel-sae-j417-rockwell-c", "HRC", 59, 0, 68],
    ["steel-unalloyed-lowalloy-iso18265-a1", "HV", 97, 80, 940],
    ["austenitic-stainless-plate-e140-table5", "HRB", 41, 60, 100],
    ["austenitic-stainless-sheet-c-e140-table6", "HRC", 29, 20, 48],
    ["austenitic-steel-a370-rockwell-b", "HRB", 21, 80, 100],
    ["nickel-e140-table3", "HV", 48, 77, 513],
    ["cartridge-brass-e140-table4", "HV", 79, 45, 196],
    ["aluminium-wrought-e140-table9-partial", "HB_500", 25, 40, 160],
  ])("%s is keyed by %s, %i rows from %i to %i", (id, key, rows, lowest, highest) => {
    const table = getTable(id);
    const column = filled(table.columns[key] ?? []);
    expect(table.keyScale).toBe(key);
    expect(column).toHaveLength(rows);
    expect([Math.min(...column), Math.max(...column)]).toEqual([lowest, highest]);
  });
});
