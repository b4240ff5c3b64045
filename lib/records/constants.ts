/** Kinds of record that can be cited. Everything a report can rest on is one of these. */
export const RECORD_KINDS = [
  "field_return",
  "item",
  "image",
  "calibration",
  "mark",
  "traverse",
  "hardness_result",
  "strength_statement",
  "mechanism",
  "second_reading",
] as const;
export type RecordKind = (typeof RECORD_KINDS)[number];

export const RECORD_KIND_NAMES: Record<RecordKind, string> = {
  field_return: "Field return",
  item: "Item",
  image: "Picture",
  calibration: "Scale",
  mark: "Mark",
  traverse: "Readings",
  hardness_result: "Hardness",
  strength_statement: "Strength",
  mechanism: "Mechanism",
  second_reading: "Reading",
};

/** Letters in front of the number of a label that people use: E1, IM-01, T2. */
export const LABEL_PREFIX: Record<Exclude<RecordKind, "mark" | "item">, string> = {
  field_return: "F",
  image: "IM-",
  calibration: "S",
  traverse: "T",
  hardness_result: "R",
  strength_statement: "SS",
  mechanism: "W",
  second_reading: "SR",
};

export const RECORD_STATES = ["recorded", "checked", "void"] as const;
export type RecordState = (typeof RECORD_STATES)[number];

/** How a number came about. Each has its own shape wherever it is shown. */
export const VALUE_SOURCES = ["measured", "converted", "estimated", "stated"] as const;
export type ValueSource = (typeof VALUE_SOURCES)[number];

/** One quotable field of a record version. `text` is the value as it is printed, unit included. */
export type CitableValue = {
  label: string;
  text: string;
  value: number | null;
  unit: string | null;
  expandedUncertainty: number | null;
  source: ValueSource;
};
export type CitableValues = Record<string, CitableValue>;
