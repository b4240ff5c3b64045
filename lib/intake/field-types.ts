/**
 * must: the case rests on it, and the lead sees at once where it is not known; should: it is asked
 * of everyone; both are answered with a value or with why there is none. optional may stay empty.
 */
export type Need = "must" | "should" | "optional";

type Common = {
  key: string;
  label: string;
  need: Need;
  help?: string;
  /** Columns of twelve. */
  columns: number;
  /** Printed in the report where it is quoted; text fields only where they say so. */
  quoted?: true;
};

export type Choice = { value: string; label: string };

/** `least` and `most` include their ends; a number without `least` may be negative. */
type NumberLimits = { unit: string; least?: number; most?: number };

export type FieldDefinition =
  | (Common & { kind: "text"; mono?: true; suggestions?: readonly string[]; most?: number })
  | (Common & { kind: "longText" })
  | (Common & NumberLimits & { kind: "number" })
  | (Common & { kind: "count" })
  | (Common & NumberLimits & { kind: "range" })
  | (Common & { kind: "choice"; choices: readonly Choice[] })
  | (Common & { kind: "choices"; choices: readonly Choice[] })
  | (Common & { kind: "date" })
  | (Common & { kind: "moment" })
  | (Common & { kind: "hardness" })
  | (Common & { kind: "caseDepth" })
  | (Common & { kind: "pieces" })
  | (Common & { kind: "caseNumbers" });

export type FieldKind = FieldDefinition["kind"];
export type FieldOf<K extends FieldKind> = Extract<FieldDefinition, { kind: K }>;

export type SectionDefinition = {
  key: string;
  title: string;
  note: string;
  groups: readonly { title: string | null; fields: readonly FieldDefinition[] }[];
};

export const YES_NO: readonly Choice[] = [
  { value: "yes", label: "Yes" },
  { value: "no", label: "No" },
];
