import type { HardnessTable } from "../hardness-table";

/** ASTM E140 Table 5, austenitic stainless steel plate, annealed. */
export const austeniticStainlessPlateE140Table5 = {
  id: "austenitic-stainless-plate-e140-table5",
  title: "ASTM E140 Table 5, austenitic stainless steel plate, annealed",
  standard: "ASTM E140",
  tableNumber: "Table 5",
  edition: "E140-02 to E140-12b",
  materialGroup: "steel-austenitic-stainless",
  holdsFor: "Annealed austenitic stainless steel plate.",
  keyScale: "HRB",
  tier: "C",
  enabledByDefault: false,
  source:
    "From memory of the standard; no reprint could be read. Every column is strictly monotonic and follows the standard's equation HB = 1/(0.0001304 (130 - HRB)) to within one unit.",
  checked: "2026-12-01",
  doubts: ["77, 97 and 99 HRB: 144, 233 and 248 HB; the equation gives 145, 232 and 247."],
  caution:
    "Not yet compared with a copy of the standard. A conversion is approximate: different tests measure different mixtures of properties. The converted value never replaces the measured one; report both, with this table.",
  columns: {
    HRB: [
      100, 99, 98, 97, 96, 95, 94, 93, 92, 91,
      90, 89, 88, 87, 86, 85, 84, 83, 82, 81,
      80, 79, 78, 77, 76, 75, 74, 73, 72, 71,
      70, 69, 68, 67, 66, 65, 64, 63, 62, 61,
      60,
    ],
    HB_3000: [
      256, 248, 240, 233, 226, 219, 213, 207, 202, 197,
      192, 187, 183, 178, 174, 170, 167, 163, 160, 156,
      153, 150, 147, 144, 142, 139, 137, 135, 132, 130,
      128, 126, 124, 122, 120, 118, 116, 114, 113, 111,
      110,
    ],
  },
  parentheses: {},
  unconfirmed: "all",
} as const satisfies HardnessTable;
