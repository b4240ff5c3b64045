import { z } from "zod";
import { DRAFT_TEXT_MAX, PIECES_MAX } from "./constants";
import type { FieldKind } from "./field-types";
import type { FieldKey } from "./fields";

/** What is typed into a field, kept as typed: a draft loses nothing, not even a wrong number. */
const typed = z
  .string()
  .max(DRAFT_TEXT_MAX, `This is longer than ${DRAFT_TEXT_MAX} characters. Nothing of it was cut.`);

const VALUE_SCHEMAS = {
  text: typed,
  longText: typed,
  number: typed,
  count: typed,
  range: z.object({ min: typed, max: typed }),
  choice: typed,
  choices: z.array(typed).max(50),
  date: typed,
  moment: z.object({ date: typed, time: typed, zone: typed }),
  hardness: z.object({ scale: typed, min: typed, max: typed, location: typed }),
  caseDepth: z.object({ process: typed, definition: typed, min: typed, max: typed }),
  pieces: z
    .array(z.object({ name: typed, kind: typed, quantity: typed, condition: typed }))
    .max(PIECES_MAX, `At most ${PIECES_MAX} pieces. Group the smaller ones.`),
  caseNumbers: z.array(typed).max(50),
} as const satisfies Record<FieldKind, z.ZodType>;

type Values = { [K in FieldKind]: z.infer<(typeof VALUE_SCHEMAS)[K]> };
export type ValueOf<K extends FieldKind> = Values[K];
export type AnyValue = Values[FieldKind];
export type Piece = Values["pieces"][number];

export type Answer =
  | { kind: "value"; value: AnyValue }
  | { kind: "not_applicable" }
  | { kind: "unknown"; why: string }
  | { kind: "awaiting"; of?: string };
export type AnswerKind = Answer["kind"];
export type Answers = Partial<Record<FieldKey, Answer>>;

export const ANSWER_KIND_NAMES: Record<AnswerKind, string> = {
  value: "A value",
  not_applicable: "Does not apply",
  unknown: "Not known",
  awaiting: "Asked, answer awaited",
};

/** Answer to one field, as a draft keeps it. */
export function draftAnswer(kind: FieldKind) {
  return z.discriminatedUnion("kind", [
    z.object({ kind: z.literal("value"), value: VALUE_SCHEMAS[kind] }),
    z.object({ kind: z.literal("not_applicable") }),
    z.object({ kind: z.literal("unknown"), why: typed }),
    z.object({ kind: z.literal("awaiting"), of: typed.optional() }),
  ]);
}

const EMPTY: Values = {
  text: "",
  longText: "",
  number: "",
  count: "",
  range: { min: "", max: "" },
  choice: "",
  choices: [],
  date: "",
  moment: { date: "", time: "", zone: "" },
  hardness: { scale: "", min: "", max: "", location: "" },
  caseDepth: { process: "", definition: "", min: "", max: "" },
  pieces: [],
  caseNumbers: [],
};

function reader<K extends FieldKind>(kind: K, schema: z.ZodType<Values[K]>) {
  return (value: unknown): Values[K] => {
    const read = schema.safeParse(value);
    return read.success ? read.data : EMPTY[kind];
  };
}

const READERS: { [K in FieldKind]: (value: unknown) => Values[K] } = {
  text: reader("text", VALUE_SCHEMAS.text),
  longText: reader("longText", VALUE_SCHEMAS.longText),
  number: reader("number", VALUE_SCHEMAS.number),
  count: reader("count", VALUE_SCHEMAS.count),
  range: reader("range", VALUE_SCHEMAS.range),
  choice: reader("choice", VALUE_SCHEMAS.choice),
  choices: reader("choices", VALUE_SCHEMAS.choices),
  date: reader("date", VALUE_SCHEMAS.date),
  moment: reader("moment", VALUE_SCHEMAS.moment),
  hardness: reader("hardness", VALUE_SCHEMAS.hardness),
  caseDepth: reader("caseDepth", VALUE_SCHEMAS.caseDepth),
  pieces: reader("pieces", VALUE_SCHEMAS.pieces),
  caseNumbers: reader("caseNumbers", VALUE_SCHEMAS.caseNumbers),
};

/** The value of an answer in the shape of its field; empty where the answer is none. */
export function valueAs<K extends FieldKind>(kind: K, answer: Answer | undefined): ValueOf<K> {
  return READERS[kind](answer?.kind === "value" ? answer.value : undefined);
}

/** Nothing typed or chosen. A zone alone, or a process alone, is no answer. */
export function isBlank(kind: FieldKind, answer: Answer | undefined): boolean {
  if (!answer) return true;
  if (answer.kind !== "value") return false;
  const value = answer.value;
  if (typeof value === "string") return value.trim() === "";
  if (Array.isArray(value)) return value.length === 0;
  if (kind === "moment") {
    const { date, time } = valueAs("moment", answer);
    return date === "" && time === "";
  }
  return Object.values(value).every((part) => part.trim() === "");
}
