/** Name of the setting that lists the tables this laboratory has switched on. */
export const TABLES_SETTING = "hardness.tables";

/** Most values of one conversion request. */
export const CONVERT_VALUES_MAX = 10_000;
export const CONVERT_MAX_BYTES = 1024 * 1024;

export const TIER_NAMES = {
  A: "Compared cell by cell with several reprints",
  B: "Partly compared, the rest from memory but passing internal checks",
  C: "From memory only",
} as const;
