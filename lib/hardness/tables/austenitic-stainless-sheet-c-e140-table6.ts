import type { HardnessTable } from "../hardness-table";

/** ASTM E140 Table 6, austenitic stainless steel sheet, Rockwell C range. */
export const austeniticStainlessSheetCE140Table6 = {
  id: "austenitic-stainless-sheet-c-e140-table6",
  title: "ASTM E140 Table 6, austenitic stainless steel sheet, Rockwell C range",
  standard: "ASTM E140",
  tableNumber: "Table 6",
  edition: "E140-02 to E140-12b",
  materialGroup: "steel-austenitic-stainless",
  holdsFor: "Austenitic stainless steel sheet.",
  keyScale: "HRC",
  tier: "C",
  enabledByDefault: false,
  source:
    "From memory of the standard; no reprint could be read. Every column is strictly monotonic and a straight line in HRC to within 0.05.",
  checked: "2026-12-01",
  doubts: [],
  caution:
    "Not yet compared with a copy of the standard. The Rockwell F column of this table is not here. A conversion is approximate: different tests measure different mixtures of properties. The converted value never replaces the measured one; report both, with this table.",
  columns: {
    HRC: [
      48, 47, 46, 45, 44, 43, 42, 41, 40, 39,
      38, 37, 36, 35, 34, 33, 32, 31, 30, 29,
      28, 27, 26, 25, 24, 23, 22, 21, 20,
    ],
    HRA: [
      74.4, 73.9, 73.4, 72.9, 72.4, 71.9, 71.4, 70.9, 70.4, 69.9,
      69.3, 68.8, 68.3, 67.8, 67.3, 66.8, 66.3, 65.8, 65.3, 64.8,
      64.3, 63.8, 63.3, 62.8, 62.3, 61.8, 61.3, 60.8, 60.3,
    ],
    HR15N: [
      84.1, 83.6, 83.1, 82.6, 82.1, 81.6, 81, 80.5, 80, 79.5,
      79, 78.5, 78, 77.5, 77, 76.5, 75.9, 75.4, 74.9, 74.4,
      73.9, 73.4, 72.9, 72.4, 71.9, 71.3, 70.8, 70.3, 69.8,
    ],
    HR30N: [
      66.2, 65.3, 64.5, 63.6, 62.7, 61.8, 61, 60.1, 59.2, 58.4,
      57.5, 56.6, 55.7, 54.9, 54, 53.1, 52.3, 51.4, 50.5, 49.6,
      48.8, 47.9, 47, 46.2, 45.3, 44.4, 43.5, 42.7, 41.8,
    ],
    HR45N: [
      52.1, 50.9, 49.8, 48.7, 47.5, 46.4, 45.2, 44.1, 43, 41.8,
      40.7, 39.6, 38.4, 37.3, 36.1, 35, 33.9, 32.7, 31.6, 30.4,
      29.3, 28.2, 27, 25.9, 24.8, 23.6, 22.5, 21.3, 20.2,
    ],
  },
  parentheses: {},
  unconfirmed: "all",
} as const satisfies HardnessTable;
