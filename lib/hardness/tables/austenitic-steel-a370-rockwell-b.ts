import type { HardnessTable } from "../hardness-table";

/** ASTM A370, austenitic steel, Rockwell B range. */
export const austeniticSteelA370RockwellB = {
  id: "austenitic-steel-a370-rockwell-b",
  title: "ASTM A370, austenitic steel, Rockwell B range",
  standard: "ASTM A370",
  tableNumber: "austenitic Rockwell B table",
  edition: "A370-03a and later",
  materialGroup: "steel-austenitic-stainless",
  holdsFor: "Austenitic steel products tested to ASTM A370.",
  keyScale: "HRB",
  tier: "C",
  enabledByDefault: false,
  source:
    "From memory of the standard; no reprint could be read. Every column is strictly monotonic; all but the Brinell column lie on straight lines in HRB to within 0.05.",
  checked: "2026-12-01",
  doubts: ["97 HRB: 233 HB, perhaps 232."],
  caution:
    "Not yet compared with a copy of the standard. A conversion is approximate: different tests measure different mixtures of properties. The converted value never replaces the measured one; report both, with this table.",
  columns: {
    HRB: [
      100, 99, 98, 97, 96, 95, 94, 93, 92, 91,
      90, 89, 88, 87, 86, 85, 84, 83, 82, 81,
      80,
    ],
    HB_3000: [
      256, 248, 240, 233, 226, 219, 213, 207, 202, 197,
      192, 187, 183, 178, 174, 170, 167, 163, 160, 156,
      153,
    ],
    HRA: [
      61.5, 60.9, 60.3, 59.7, 59.1, 58.5, 58, 57.4, 56.8, 56.2,
      55.6, 55, 54.5, 53.9, 53.3, 52.7, 52.1, 51.5, 50.9, 50.4,
      49.8,
    ],
    HR15T: [
      91.5, 91.2, 90.8, 90.4, 90.1, 89.7, 89.3, 88.9, 88.6, 88.2,
      87.8, 87.5, 87.1, 86.7, 86.4, 86, 85.6, 85.2, 84.9, 84.5,
      84.1,
    ],
    HR30T: [
      80.4, 79.7, 79, 78.3, 77.7, 77, 76.3, 75.6, 74.9, 74.2,
      73.5, 72.8, 72.1, 71.4, 70.7, 70, 69.3, 68.6, 67.9, 67.2,
      66.5,
    ],
    HR45T: [
      70.2, 69.2, 68.2, 67.2, 66.1, 65.1, 64.1, 63.1, 62.1, 61.1,
      60.1, 59, 58, 57, 56, 55, 54, 52.9, 51.9, 50.9,
      49.9,
    ],
  },
  parentheses: {},
  unconfirmed: "all",
} as const satisfies HardnessTable;
