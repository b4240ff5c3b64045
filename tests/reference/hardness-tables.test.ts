import { describe, expect, it } from "vitest";
import type { HardnessTable } from "@/lib/hardness/hardness-table";
import { getTable, type TableId } from "@/lib/hardness/published-tables";
import { isScale, type Scale } from "@/lib/hardness/scales";

type SpotRow = readonly [
  table: TableId,
  key: number,
  cells: Partial<Record<Scale, number | null>>,
  source: string,
];

/** Rows typed from the printed tables, apart from the files they are compared with. */
const SPOT_ROWS: readonly SpotRow[] = [
  [
    "steel-nonaustenitic-e140-table1",
    60,
    { HV: 697, HBW_3000: 654, HBS_3000: null, HRA: 81.2, HRD: 70.7, HR15N: 90.2 },
    "ASTM E140 Table 1, row 60 HRC",
  ],
  [
    "steel-nonaustenitic-e140-table1",
    50,
    { HV: 513, HBW_3000: 481, HK: 542, HRA: 75.9 },
    "ASTM E140 Table 1, row 50 HRC",
  ],
  [
    "steel-nonaustenitic-e140-table1",
    40,
    { HV: 392, HBS_3000: 371, HBW_3000: 371, HK: 402, HRA: 70.4 },
    "ASTM E140 Table 1, row 40 HRC",
  ],
  [
    "steel-nonaustenitic-e140-table1",
    20,
    { HV: 238, HBW_3000: 226, HRA: 60.5, HRD: 40.1 },
    "ASTM E140 Table 1, row 20 HRC",
  ],
  [
    "steel-nonaustenitic-e140-table2",
    90,
    { HV: 185, HB_3000: 185, HRF: null },
    "ASTM E140 Table 2, row 90 HRB",
  ],
  [
    "steel-nonaustenitic-e140-table2",
    80,
    { HV: 150, HB_3000: 150 },
    "ASTM E140 Table 2, row 80 HRB",
  ],
  [
    "steel-unalloyed-lowalloy-iso18265-a1",
    200,
    { Rm_MPa: 640, HB_30D2: 190, HRB: 91.5, HRC: null },
    "ISO 18265:2013 Table A.1, row 200 HV",
  ],
  [
    "steel-unalloyed-lowalloy-iso18265-a1",
    400,
    { Rm_MPa: 1290, HB_30D2: 380, HRC: 40.8, HRA: 70.8 },
    "ISO 18265:2013 Table A.1, row 400 HV",
  ],
  [
    "steel-unalloyed-lowalloy-iso18265-a1",
    700,
    { Rm_MPa: null, HB_30D2: null, HRC: 60.1 },
    "ISO 18265:2013 Table A.1, row 700 HV",
  ],
  [
    "steel-a370-rockwell-c",
    50,
    { HV: 513, HB_3000: 482, Rm_MPa: 1760, Rm_ksi: 255 },
    "ASTM A370 Rockwell C table, row 50 HRC",
  ],
  ["steel-a370-rockwell-b", 80, { HV: 150, Rm_MPa: 495 }, "ASTM A370 Rockwell B table, row 80 HRB"],
  [
    "steel-sae-j417-rockwell-c",
    45,
    { HV: 446, HBS_3000: 421, HBW_3000: 421, Rm_MPa: 1480 },
    "SAE J417 (1983), row 45 HRC",
  ],
];

describe("rows of the published tables", () => {
  it.each(SPOT_ROWS)("%s at %s %j [%s]", (id, key, cells) => {
    const table: HardnessTable = getTable(id);
    const row = table.columns[table.keyScale]?.indexOf(key) ?? -1;
    const found = Object.keys(cells)
      .filter(isScale)
      .map((scale) => [scale, table.columns[scale]?.[row]]);
    expect(Object.fromEntries(found)).toEqual(cells);
  });

  it("name the table and row that each was typed from", () => {
    expect(SPOT_ROWS.every(([, key, , source]) => source.includes(String(key)))).toBe(true);
  });
});
