import { formatDate } from "@/lib/format/dates";
import { formatQuantity, formatRange } from "@/lib/format/numbers";
import { NO_BREAK_SPACE } from "@/lib/format/marks";
import { HARDENING_PROCESS_NAMES, HARDENING_PROCESSES } from "@/lib/traverses/constants";
import { type Answer, valueAs } from "./answers";
import { PIECE_KIND_NAMES, PIECE_KINDS } from "./constants";
import type { FieldDefinition } from "./field-types";
import { oneNumber } from "./one-number";

const numberOf = (typed: string, unit: string) => {
  const read = oneNumber(typed, unit);
  return read.ok ? read.value : null;
};

const decimalsTyped = (typed: string) => typed.split(/[.,]/)[1]?.replace(/\D.*$/, "").length ?? 0;

/** Places as typed, so that "2.50" stays "2.50". */
function places(...typed: string[]) {
  return typed.some((text) => /e/i.test(text))
    ? {}
    : { decimals: Math.max(...typed.map(decimalsTyped)) };
}

/** A stated range, ready to print: "900 to 1100 MPa", "at least 560 HV1". */
export function rangeText(min: string, max: string, unit: string): string {
  return formatRange(numberOf(min, unit), numberOf(max, unit), unit, places(min, max));
}

const labelOf = (choices: readonly { value: string; label: string }[], value: string) =>
  choices.find((choice) => choice.value === value)?.label ?? value;

/** The value of an answer as one text, ready to print; what was typed where it is no number. */
export function valueText(field: FieldDefinition, answer: Answer | undefined): string {
  switch (field.kind) {
    case "text":
    case "longText":
      return valueAs("text", answer).trim();
    case "number": {
      const typed = valueAs("number", answer);
      const value = numberOf(typed, field.unit);
      return value === null ? typed : formatQuantity(value, field.unit, places(typed));
    }
    case "count": {
      const typed = valueAs("count", answer);
      const value = numberOf(typed, "");
      return value === null ? typed : formatQuantity(value, "");
    }
    case "range": {
      const { min, max } = valueAs("range", answer);
      return rangeText(min, max, field.unit);
    }
    case "choice":
      return labelOf(field.choices, valueAs("choice", answer));
    case "choices":
      return valueAs("choices", answer)
        .map((value) => labelOf(field.choices, value))
        .join(", ");
    case "date":
      return formatDate(valueAs("date", answer));
    case "moment": {
      const { date, time, zone } = valueAs("moment", answer);
      const clock = time === "" ? ", time not given" : `${NO_BREAK_SPACE}${time} (${zone})`;
      return `${formatDate(date)}${clock}`;
    }
    case "hardness": {
      const { scale, min, max, location } = valueAs("hardness", answer);
      return [rangeText(min, max, scale), location.trim()].filter(Boolean).join(", ");
    }
    case "caseDepth": {
      const { process, definition, min, max } = valueAs("caseDepth", answer);
      const known = HARDENING_PROCESSES.find((name) => name === process);
      const name = known ? HARDENING_PROCESS_NAMES[known] : process;
      return `${definition} ${rangeText(min, max, "mm")}, ${name.toLowerCase()}`;
    }
    case "pieces":
      return valueAs("pieces", answer).map(pieceText).join("; ");
    case "caseNumbers":
      return valueAs("caseNumbers", answer).join(", ");
  }
}

/** "2 × Shaft half, gear side (failed part or half), rusted" */
export function pieceText(piece: {
  name: string;
  kind: string;
  quantity: string;
  condition: string;
}): string {
  const kind = PIECE_KINDS.find((name) => name === piece.kind);
  const what = kind ? ` (${PIECE_KIND_NAMES[kind].toLowerCase()})` : "";
  const note = piece.condition.trim() === "" ? "" : `, ${piece.condition.trim()}`;
  return `${piece.quantity}${NO_BREAK_SPACE}× ${piece.name.trim()}${what}${note}`;
}
