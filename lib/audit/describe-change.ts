import { formatRange } from "@/lib/format/numbers";
import { ANSWER_KIND_NAMES, type Answer, draftAnswer } from "@/lib/intake/answers";
import { type FieldKey, fieldByKey, isFieldKey } from "@/lib/intake/fields";
import { valueText } from "@/lib/intake/show-answer";
import { fieldLabel, fieldText } from "./change-words";

/** One field that an entry changed, in words; null where there was nothing. */
export type ChangeLine = { label: string; before: string | null; after: string | null };
/** What the ids in an entry stand for: people, records and reports. */
export type Names = ReadonlyMap<string, string>;

const ID = /^[a-z]+_[0-9a-z]{24}$/;
/** Parts of an entry that only hold its fields together. */
const FRAMES = new Set(["content", "details", "settings"]);

type Cell = { label: string; raw: unknown; text: string | null };
type Fields = Map<string, Cell>;

/** What changed, field by field, in the words of the screens; fields that stayed are left out. */
export function describeChange(before: unknown, after: unknown, names: Names): ChangeLine[] {
  const left = fieldsOf(before, names);
  const right = fieldsOf(after, names);
  return [...new Set([...left.keys(), ...right.keys()])].flatMap((path) => {
    const [was, is] = [left.get(path), right.get(path)];
    const isSame = JSON.stringify(was?.raw ?? null) === JSON.stringify(is?.raw ?? null);
    const line = {
      label: is?.label ?? was?.label ?? path,
      before: was?.text ?? null,
      after: is?.text ?? null,
    };
    return isSame || (line.before === null && line.after === null) ? [] : [line];
  });
}

/** Every id an entry speaks of. */
export function idsIn(value: unknown): string[] {
  if (typeof value === "string") return ID.test(value) ? [value] : [];
  return isObject(value) ? Object.values(value).flatMap(idsIn) : [];
}

const isObject = (value: unknown): value is object => typeof value === "object" && value !== null;

function fieldsOf(value: unknown, names: Names): Fields {
  if (value === null || value === undefined) return new Map();
  if (!isObject(value) || Array.isArray(value))
    return new Map([["value", { label: "Value", raw: value, text: plainText(value, names) }]]);
  return new Map(
    Object.entries(value).flatMap(([name, member]): [string, Cell][] => {
      if (FRAMES.has(name) && isObject(member)) return [...fieldsOf(member, names)];
      if (name === "answers" && isObject(member)) return Object.entries(member).map(answerCell);
      const shown = isObject(member) ? null : plainText(member, names);
      const text = shown === null ? shapeText(member, names) : fieldText(name, shown);
      return [[name, { label: fieldLabel(name), raw: member, text }]];
    }),
  );
}

function answerCell([key, raw]: [string, unknown]): [string, Cell] {
  if (!isFieldKey(key)) return [key, { label: key, raw, text: JSON.stringify(raw) }];
  return [`answer ${key}`, { label: fieldByKey(key).label, raw, text: answerText(key, raw) }];
}

function answerText(key: FieldKey, raw: unknown): string | null {
  const field = fieldByKey(key);
  const read = draftAnswer(field.kind).safeParse(raw);
  if (!read.success) return null;
  const answer: Answer = read.data;
  if (answer.kind === "value") return valueText(field, answer) || null;
  return answer.kind === "unknown"
    ? `${ANSWER_KIND_NAMES.unknown}: ${answer.why}`
    : ANSWER_KIND_NAMES[answer.kind];
}

function plainText(value: unknown, names: Names): string | null {
  if (value === null || value === undefined || value === "") return null;
  if (typeof value === "boolean") return value ? "yes" : "no";
  if (typeof value === "string") return names.get(value) ?? value;
  return isObject(value) ? shapeText(value, names) : String(value);
}

/** Lists, ranges and drawn shapes in short; anything else as it is kept. */
function shapeText(value: unknown, names: Names): string | null {
  if (!isObject(value)) return null;
  if (Array.isArray(value) && value.every((member) => !isObject(member)))
    return value.map((member) => plainText(member, names)).join(", ") || null;
  if ("min" in value && "max" in value) {
    const unit = "scale" in value ? String(value.scale) : "mm";
    return formatRange(numberOrNull(value.min), numberOrNull(value.max), unit);
  }
  const points = pointCount(value);
  if (points === 0) return JSON.stringify(value);
  const count = points === 1 ? "1 point" : `${points} points`;
  return "tool" in value ? `${fieldText("tool", String(value.tool))}, ${count}` : count;
}

const numberOrNull = (value: unknown) => (typeof value === "number" ? value : null);

function pointCount(value: unknown): number {
  if (!isObject(value)) return 0;
  if (Array.isArray(value) && value.length === 2 && value.every((n) => typeof n === "number"))
    return 1;
  return Object.values(value).reduce((sum: number, member) => sum + pointCount(member), 0);
}
