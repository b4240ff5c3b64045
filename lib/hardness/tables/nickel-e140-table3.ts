import type { HardnessTable } from "../hardness-table";

/** ASTM E140 Table 3, nickel and high-nickel alloys. */
export const nickelE140Table3 = {
  id: "nickel-e140-table3",
  title: "ASTM E140 Table 3, nickel and high-nickel alloys",
  standard: "ASTM E140",
  tableNumber: "Table 3",
  edition: "E140-02 to E140-12b",
  materialGroup: "nickel-high-nickel",
  holdsFor:
    "Nickel and alloys over 50 % nickel, in particular annealed to cold-worked or aged nickel-aluminium-silicon material; Vickers at 1, 5, 10 or 30 kgf.",
  keyScale: "HV",
  tier: "C",
  enabledByDefault: false,
  source:
    "From memory of the standard; no reprint could be read. Every column is strictly monotonic. Cells that fell off the line were left empty: HR15T at 91, 87, 83, 81, 79, 78 and 77 HV, HR45T from 91 to 77 HV. Parentheses follow the limits of the scales.",
  checked: "2026-12-01",
  doubts: [],
  caution:
    "Not yet compared with a copy of the standard. A conversion is approximate: different tests measure different mixtures of properties. The converted value never replaces the measured one; report both, with this table.",
  columns: {
    HV: [
      513, 481, 452, 427, 404, 382, 362, 344, 326, 309,
      285, 266, 248, 234, 220, 209, 198, 188, 179, 171,
      164, 157, 151, 145, 140, 135, 130, 126, 122, 119,
      115, 112, 108, 106, 103, 100, 98, 95, 93, 91,
      89, 87, 85, 83, 81, 79, 78, 77,
    ],
    HB_3000: [
      479, 450, 425, 403, 382, 363, 346, 329, 313, 298,
      275, 258, 241, 228, 215, 204, 194, 184, 176, 168,
      161, 155, 149, 144, 139, 134, 129, 125, 121, 118,
      114, 111, 108, 106, 103, 100, 98, 95, 93, 91,
      89, 87, 85, 83, 81, 79, 78, 77,
    ],
    HRA: [
      75.5, 74.5, 73.5, 72.5, 71.5, 70.5, 69.5, 68.5, 67.5, 66.5,
      64.5, 63, 61.5, 60.5, 59, 57.5, 56.5, 55, 53.5, 52.5,
      51.5, 50, 49, 47.5, 46.5, 45.5, 44, 43, 42, 41,
      40, 39, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, null, null,
    ],
    HRB: [
      null, null, null, null, null, null, null, null, null, 106,
      104, 102, 100, 98, 96, 94, 92, 90, 88, 86,
      84, 82, 80, 78, 76, 74, 72, 70, 68, 66,
      64, 62, 60, 58, 56, 54, 52, 50, 48, 46,
      44, 42, 40, 38, 36, 34, 32, 30,
    ],
    HRC: [
      50, 48, 46, 44, 42, 40, 38, 36, 34, 32,
      28.5, 25.5, 22.5, 20, 17, 14.5, 12, 9, 6.5, 4,
      2, null, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, null, null,
    ],
    HRD: [
      63, 61.5, 60, 58.5, 57, 55.5, 54, 52.5, 50.5, 49.5,
      46.5, 44.5, 42, 40, 38, 36, 34, 32, 30, 28,
      26.5, 24.5, 22.5, 21, 19, 17.5, 16, 14.5, 13, 11.5,
      10, 8, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, null, null,
    ],
    HR15N: [
      85.5, 84.5, 83.5, 82.5, 81.5, 80.5, 79.5, 78.5, 77.5, 76.5,
      75, 73.5, 72, 70.5, 69, 68, 66.5, 65, 64, 62.5,
      61.5, null, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, null, null,
    ],
    HR30N: [
      68, 66.5, 64.5, 63, 61, 59.5, 58, 56, 54.5, 52.5,
      49.5, 47, 44.5, 42, 39.5, 37.5, 35.5, 32.5, 30.5, 28.5,
      26.5, null, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, null, null,
    ],
    HR45N: [
      54.5, 52.5, 50, 47.5, 45.5, 43, 41, 38.5, 36, 34,
      30, 26.5, 23, 20, 17, 14, 11, 7.5, 5, 2,
      -0.5, null, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, null, null,
    ],
    HR15T: [
      null, null, null, null, null, null, null, null, null, 94.5,
      94, 93, 92.5, 92, 91, 90.5, 89.5, 89, 88, 87.5,
      87, 86, 85.5, 84.5, 84, 83, 82.5, 82, 81, 80.5,
      79.5, 79, 78.5, 77.5, 77, 76, 75.5, 74.5, 74, null,
      72.5, null, 71, null, null, null, null, null,
    ],
    HR30T: [
      null, null, null, null, null, null, null, null, null, 85.5,
      84.5, 83, 81.5, 80.5, 79, 77.5, 76, 75, 73.5, 72,
      70.5, 69.5, 68, 66.5, 65.5, 64, 62.5, 61, 60, 58.5,
      57, 56, 54.5, 53, 51.5, 50.5, 49, 47.5, 46.5, 45,
      43.5, 42, 41, 39.5, 38, 36.5, 35.5, 34,
    ],
    HR45T: [
      null, null, null, null, null, null, null, null, null, 77,
      75, 73, 71, 69, 67, 65, 63, 61, 59.5, 57.5,
      55.5, 53.5, 51.5, 49.5, 47.5, 45.5, 43.5, 41.5, 39.5, 37.5,
      35.5, 33.5, 31.5, 29.5, 27.5, 25.5, 23.5, 21.5, 19.5, null,
      null, null, null, null, null, null, null, null,
    ],
  },
  parentheses: {
    HB_3000: [513],
    HRB: [309, 285, 266],
    HRC: [220, 209, 198, 188, 179, 171, 164],
  },
  unconfirmed: "all",
} as const satisfies HardnessTable;
