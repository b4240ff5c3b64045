import type { HardnessTable } from "./hardness-table";
import type { MaterialGroup } from "./material-groups";
import { aluminiumWroughtE140Table9Partial } from "./tables/aluminium-wrought-e140-table9-partial";
import { austeniticStainlessPlateE140Table5 } from "./tables/austenitic-stainless-plate-e140-table5";
import { austeniticStainlessSheetCE140Table6 } from "./tables/austenitic-stainless-sheet-c-e140-table6";
import { austeniticSteelA370RockwellB } from "./tables/austenitic-steel-a370-rockwell-b";
import { cartridgeBrassE140Table4 } from "./tables/cartridge-brass-e140-table4";
import { nickelE140Table3 } from "./tables/nickel-e140-table3";
import { steelA370RockwellB } from "./tables/steel-a370-rockwell-b";
import { steelA370RockwellC } from "./tables/steel-a370-rockwell-c";
import { steelNonausteniticE140Table1 } from "./tables/steel-nonaustenitic-e140-table1";
import { steelNonausteniticE140Table2 } from "./tables/steel-nonaustenitic-e140-table2";
import { steelSaeJ417RockwellC } from "./tables/steel-sae-j417-rockwell-c";
import { steelUnalloyedLowalloyIso18265A1 } from "./tables/steel-unalloyed-lowalloy-iso18265-a1";

/**
 * Every published table, in the order in which the tables of one group are asked: the first that
 * holds both scales around the value answers.
 */
export const PUBLISHED_TABLES = [
  steelNonausteniticE140Table1,
  steelNonausteniticE140Table2,
  steelA370RockwellC,
  steelA370RockwellB,
  steelSaeJ417RockwellC,
  steelUnalloyedLowalloyIso18265A1,
  austeniticStainlessPlateE140Table5,
  austeniticStainlessSheetCE140Table6,
  austeniticSteelA370RockwellB,
  nickelE140Table3,
  cartridgeBrassE140Table4,
  aluminiumWroughtE140Table9Partial,
] as const;

export type TableId = (typeof PUBLISHED_TABLES)[number]["id"];

/** Answers only when it is asked for by name: its strength column overlaps that of A370. */
const ONLY_WHEN_NAMED: ReadonlySet<string> = new Set<TableId>(["steel-sae-j417-rockwell-c"]);

const BY_ID: ReadonlyMap<string, HardnessTable> = new Map(
  PUBLISHED_TABLES.map((table) => [table.id, table]),
);

export function isTableId(name: string): name is TableId {
  return BY_ID.has(name);
}

export function getTable(id: TableId): HardnessTable {
  const table = BY_ID.get(id);
  if (!table) throw new Error(`No published hardness table has the id ${id}`);
  return table;
}

/** The tables of a group in the order of asking, those that are switched off included. */
export function tablesInOrder(group: MaterialGroup): readonly TableId[] {
  return PUBLISHED_TABLES.filter(
    (table) => table.materialGroup === group && !ONLY_WHEN_NAMED.has(table.id),
  ).map((table) => table.id);
}

export const ALL_TABLE_IDS: ReadonlySet<TableId> = new Set(PUBLISHED_TABLES.map(({ id }) => id));

/** What an installation starts with; tables from memory alone are switched off. */
export const DEFAULT_ENABLED_TABLE_IDS: ReadonlySet<TableId> = new Set(
  PUBLISHED_TABLES.filter((table) => table.enabledByDefault).map(({ id }) => id),
);
