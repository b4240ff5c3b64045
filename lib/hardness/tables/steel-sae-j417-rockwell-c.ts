import type { HardnessTable } from "../hardness-table";

/** SAE J417, non-austenitic steel, Rockwell C range with tensile strength. */
export const steelSaeJ417RockwellC = {
  id: "steel-sae-j417-rockwell-c",
  title: "SAE J417, non-austenitic steel, Rockwell C range with tensile strength",
  standard: "SAE J417",
  tableNumber: "Rockwell C table",
  edition: "December 1983",
  materialGroup: "steel-nonaustenitic",
  holdsFor:
    "Carbon and alloy steels; austenitic, high-manganese, nickel-base and cold-worked material may not follow it.",
  keyScale: "HRC",
  tier: "A",
  enabledByDefault: true,
  source:
    "Values of SAE J417 (1983), compared with six catalogue and handbook reprints of one lineage: 977 of 980 comparisons agree, the rest are misprints of one reprint. The standard itself was not in hand.",
  checked: "2026-12-01",
  doubts: [],
  caution:
    "Rows from 18 to 0 HRC are printed in parentheses: they lie below the Rockwell C scale. A conversion is approximate: different tests measure different mixtures of properties. The converted value never replaces the measured one; report both, with this table.",
  columns: {
    HRC: [
      68, 67, 66, 65, 64, 63, 62, 61, 60, 59,
      58, 57, 56, 55, 54, 53, 52, 51, 50, 49,
      48, 47, 46, 45, 44, 43, 42, 41, 40, 39,
      38, 37, 36, 35, 34, 33, 32, 31, 30, 29,
      28, 27, 26, 25, 24, 23, 22, 21, 20, 18,
      16, 14, 12, 10, 8, 6, 4, 2, 0,
    ],
    HV: [
      940, 900, 865, 832, 800, 772, 746, 720, 697, 674,
      653, 633, 613, 595, 577, 560, 544, 528, 513, 498,
      484, 471, 458, 446, 434, 423, 412, 402, 392, 382,
      372, 363, 354, 345, 336, 327, 318, 310, 302, 294,
      286, 279, 272, 266, 260, 254, 248, 243, 238, 230,
      222, 213, 204, 196, 188, 180, 173, 166, 160,
    ],
    HBS_3000: [
      null, null, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, 500, 487, 475, 464,
      451, 442, 432, 421, 409, 400, 390, 381, 371, 362,
      353, 344, 336, 327, 319, 311, 301, 294, 286, 279,
      271, 264, 258, 253, 247, 243, 237, 231, 226, 219,
      212, 203, 194, 187, 179, 171, 165, 158, 152,
    ],
    HBW_3000: [
      null, null, null, 739, 722, 705, 688, 670, 654, 634,
      615, 595, 577, 560, 543, 525, 512, 496, 481, 469,
      455, 443, 432, 421, 409, 400, 390, 381, 371, 362,
      353, 344, 336, 327, 319, 311, 301, 294, 286, 279,
      271, 264, 258, 253, 247, 243, 237, 231, 226, 219,
      212, 203, 194, 187, 179, 171, 165, 158, 152,
    ],
    HRA: [
      85.6, 85, 84.5, 83.9, 83.4, 82.8, 82.3, 81.8, 81.2, 80.7,
      80.1, 79.6, 79, 78.5, 78, 77.4, 76.8, 76.3, 75.9, 75.2,
      74.7, 74.1, 73.6, 73.1, 72.5, 72, 71.5, 70.9, 70.4, 69.9,
      69.4, 68.9, 68.4, 67.9, 67.4, 66.8, 66.3, 65.8, 65.3, 64.7,
      64.3, 63.8, 63.3, 62.8, 62.4, 62, 61.5, 61, 60.5, null,
      null, null, null, null, null, null, null, null, null,
    ],
    HRD: [
      76.9, 76.1, 75.4, 74.5, 73.8, 73, 72.2, 71.5, 70.7, 69.9,
      69.2, 68.5, 67.7, 66.9, 66.1, 65.4, 64.6, 63.8, 63.1, 62.1,
      61.4, 60.8, 60, 59.2, 58.5, 57.7, 56.9, 56.2, 55.4, 54.6,
      53.8, 53.1, 52.3, 51.5, 50.8, 50, 49.2, 48.4, 47.7, 47,
      46.1, 45.2, 44.6, 43.8, 43.1, 42.1, 41.6, 40.9, 40.1, null,
      null, null, null, null, null, null, null, null, null,
    ],
    HRB: [
      null, null, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, null, null, null, null,
      null, null, null, null, null, null, null, null, null, null,
      null, null, 109, 108.5, 108, 107.5, 107, 106, 105.5, 104.5,
      104, 103, 102.5, 101.5, 101, 100, 99, 98.5, 97.8, 96.7,
      95.5, 93.9, 92.3, 90.7, 89.5, 87.1, 85.5, 83.5, 81.7,
    ],
    Rm_MPa: [
      null, null, null, null, null, null, null, null, null, null,
      null, null, null, 2075, 2015, 1950, 1880, 1820, 1760, 1695,
      1635, 1580, 1530, 1480, 1435, 1385, 1340, 1295, 1250, 1215,
      1180, 1160, 1115, 1080, 1055, 1025, 1000, 980, 950, 930,
      910, 880, 860, 840, 825, 805, 785, 770, 760, 730,
      705, 675, 650, 620, 600, 580, 550, 530, 515,
    ],
  },
  parentheses: {
    HRC: [18, 16, 14, 12, 10, 8, 6, 4, 2, 0],
    HBS_3000: [52, 51, 50, 49],
    HBW_3000: [65, 64, 63, 62, 61, 60, 59],
    HRB: [36, 35, 34, 33, 32, 31, 30, 29, 28, 27, 26, 25, 24],
  },
  unconfirmed: {
    HBW_3000: [39],
  },
} as const satisfies HardnessTable;
