import type { HardnessTable } from "../hardness-table";

/** ASTM E140 Table 1, non-austenitic steel, Rockwell C range. */
export const steelNonausteniticE140Table1 = {
  id: "steel-nonaustenitic-e140-table1",
  title: "ASTM E140 Table 1, non-austenitic steel, Rockwell C range",
  standard: "ASTM E140",
  tableNumber: "Table 1",
  edition: "E140-02 to E140-12b",
  materialGroup: "steel-nonaustenitic",
  holdsFor:
    "Homogeneous non-austenitic carbon, alloy and tool steels, as forged, annealed, normalised, or quenched and tempered.",
  keyScale: "HRC",
  tier: "A",
  enabledByDefault: true,
  source:
    "Values of ASTM E140 Table 1, compared cell by cell with ten open reprints (makers' charts for hardness testers, a stockholder's chart, a works guide and SAE J417 reprints): 2207 of 2228 comparisons agree, the rest settled one by one. The standard itself was not in hand.",
  checked: "2026-12-01",
  doubts: [
    "29 HRC: reprints print 64.6, 64.7 and 64.8 HRA; 64.7 is kept.",
    "31 HRC: 32.5 HR45N rests on memory, a smooth curve and ISO 18265 Table A.1.",
  ],
  caution:
    "Knoop values hold for 500 gf and over. The steel-ball Brinell column (HBS) is obsolete and stops at 52 HRC. A conversion is approximate: different tests measure different mixtures of properties. The converted value never replaces the measured one; report both, with this table.",
  columns: {
    HRC: [
      68, 67, 66, 65, 64, 63, 62, 61, 60, 59,
      58, 57, 56, 55, 54, 53, 52, 51, 50, 49,
      48, 47, 46, 45, 44, 43, 42, 41, 40, 39,
      38, 37, 36, 35, 34, 33, 32, 31, 30, 29,
      28, 27, 26, 25, 24, 23, 22, 21, 20,
    ],
    HV: [
      940, 900, 865, 832, 800, 772, 746, 720, 697, 674,
      653, 633, 613, 595, 577, 560, 544, 528, 513, 498,
      484, 471, 458, 446, 434, 423, 412, 402, 392, 382,
      372, 363, 354, 345, 336, 327, 318, 310, 302, 294,
      286, 279, 272, 266, 260, 254, 248, 243, 238,
    ],
    HBS_3000: [
      null, null, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, 500, 487, 475, 464,
      451, 442, 432, 421, 409, 400, 390, 381, 371, 362,
      353, 344, 336, 327, 319, 311, 301, 294, 286, 279,
      271, 264, 258, 253, 247, 243, 237, 231, 226,
    ],
    HBW_3000: [
      null, null, null, 739, 722, 705, 688, 670, 654, 634,
      615, 595, 577, 560, 543, 525, 512, 496, 481, 469,
      455, 443, 432, 421, 409, 400, 390, 381, 371, 362,
      353, 344, 336, 327, 319, 311, 301, 294, 286, 279,
      271, 264, 258, 253, 247, 243, 237, 231, 226,
    ],
    HK: [
      920, 895, 870, 846, 822, 799, 776, 754, 732, 710,
      690, 670, 650, 630, 612, 594, 576, 558, 542, 526,
      510, 495, 480, 466, 452, 438, 426, 414, 402, 391,
      380, 370, 360, 351, 342, 334, 326, 318, 311, 304,
      297, 290, 284, 278, 272, 266, 261, 256, 251,
    ],
    HRA: [
      85.6, 85, 84.5, 83.9, 83.4, 82.8, 82.3, 81.8, 81.2, 80.7,
      80.1, 79.6, 79, 78.5, 78, 77.4, 76.8, 76.3, 75.9, 75.2,
      74.7, 74.1, 73.6, 73.1, 72.5, 72, 71.5, 70.9, 70.4, 69.9,
      69.4, 68.9, 68.4, 67.9, 67.4, 66.8, 66.3, 65.8, 65.3, 64.7,
      64.3, 63.8, 63.3, 62.8, 62.4, 62, 61.5, 61, 60.5,
    ],
    HRD: [
      76.9, 76.1, 75.4, 74.5, 73.8, 73, 72.2, 71.5, 70.7, 69.9,
      69.2, 68.5, 67.7, 66.9, 66.1, 65.4, 64.6, 63.8, 63.1, 62.1,
      61.4, 60.8, 60, 59.2, 58.5, 57.7, 56.9, 56.2, 55.4, 54.6,
      53.8, 53.1, 52.3, 51.5, 50.8, 50, 49.2, 48.4, 47.7, 47,
      46.1, 45.2, 44.6, 43.8, 43.1, 42.1, 41.6, 40.9, 40.1,
    ],
    HR15N: [
      93.2, 92.9, 92.5, 92.2, 91.8, 91.4, 91.1, 90.7, 90.2, 89.8,
      89.3, 88.9, 88.3, 87.9, 87.4, 86.9, 86.4, 85.9, 85.5, 85,
      84.5, 83.9, 83.5, 83, 82.5, 82, 81.5, 80.9, 80.4, 79.9,
      79.4, 78.8, 78.3, 77.7, 77.2, 76.6, 76.1, 75.6, 75, 74.5,
      73.9, 73.3, 72.8, 72.2, 71.6, 71, 70.5, 69.9, 69.4,
    ],
    HR30N: [
      84.4, 83.6, 82.8, 81.9, 81.1, 80.1, 79.3, 78.4, 77.5, 76.6,
      75.7, 74.8, 73.9, 73, 72, 71.2, 70.2, 69.4, 68.5, 67.6,
      66.7, 65.8, 64.8, 64, 63.1, 62.2, 61.3, 60.4, 59.5, 58.6,
      57.7, 56.8, 55.9, 55, 54.2, 53.3, 52.1, 51.3, 50.4, 49.5,
      48.6, 47.7, 46.8, 45.9, 45, 44, 43.2, 42.3, 41.5,
    ],
    HR45N: [
      75.4, 74.2, 73.3, 72, 71, 69.9, 68.8, 67.7, 66.6, 65.5,
      64.3, 63.2, 62, 60.9, 59.8, 58.6, 57.4, 56.1, 55, 53.8,
      52.5, 51.4, 50.3, 49, 47.8, 46.7, 45.5, 44.3, 43.1, 41.9,
      40.8, 39.6, 38.4, 37.2, 36.1, 34.9, 33.7, 32.5, 31.3, 30.1,
      28.9, 27.8, 26.7, 25.5, 24.3, 23.1, 22, 20.7, 19.6,
    ],
  },
  parentheses: {
    HBS_3000: [52, 51, 50, 49],
    HBW_3000: [65, 64, 63, 62, 61, 60],
  },
  unconfirmed: {
    HR45N: [34, 33, 32, 31, 30, 29, 28, 27, 26, 25, 24, 23, 22, 21, 20],
  },
} as const satisfies HardnessTable;
