import type { HardnessTable } from "../hardness-table";

/** ASTM E140 Table 9 (HB, HV and HRB columns), wrought aluminium. */
export const aluminiumWroughtE140Table9Partial = {
  id: "aluminium-wrought-e140-table9-partial",
  title: "ASTM E140 Table 9 (HB, HV and HRB columns), wrought aluminium",
  standard: "ASTM E140",
  tableNumber: "Table 9",
  edition: "E140-02 to E140-12b",
  materialGroup: "aluminium-wrought",
  holdsFor: "Wrought aluminium products; Vickers at 15 kgf.",
  keyScale: "HB_500",
  tier: "C",
  enabledByDefault: false,
  source:
    "From memory of the standard; no reprint could be read. Every column is strictly monotonic. Only the HB, HV and HRB columns are here.",
  checked: "2026-12-01",
  doubts: [],
  caution:
    "Not yet compared with a copy of the standard. A conversion is approximate: different tests measure different mixtures of properties. The converted value never replaces the measured one; report both, with this table.",
  columns: {
    HB_500: [
      160, 155, 150, 145, 140, 135, 130, 125, 120, 115,
      110, 105, 100, 95, 90, 85, 80, 75, 70, 65,
      60, 55, 50, 45, 40,
    ],
    HV: [
      189, 183, 177, 171, 165, 159, 153, 147, 141, 135,
      129, 123, 117, 111, 105, 98, 92, 86, 80, 74,
      68, 62, 56, 50, 44,
    ],
    HRB: [
      91, 90, 89, 87, 86, 84, 81, 79, 76, 72,
      69, 65, 60, 56, 51, 46, 40, 34, 28, null,
      null, null, null, null, null,
    ],
  },
  parentheses: {},
  unconfirmed: "all",
} as const satisfies HardnessTable;
