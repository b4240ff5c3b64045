import { HARDENING_PROCESSES } from "@/lib/traverses/constants";
import { isDay, isTimeOfDay, isTimeZone } from "./moment";
import { type Answer, valueAs } from "./answers";
import {
  CASE_NUMBER_PATTERN,
  DEPTH_DEFINITIONS,
  LONG_TEXT_MAX,
  PIECE_KINDS,
  REQUIRED_HARDNESS_SCALES,
  TEXT_MAX,
} from "./constants";
import type { FieldDefinition } from "./field-types";
import { oneNumber, quoted } from "./one-number";

type Limits = { unit: string; least?: number; most?: number };
type Says = string | null;

const includes = (list: readonly string[], value: string) => list.includes(value);

function checkText(text: string, most: number): Says {
  return text.length <= most
    ? null
    : `This holds ${most} characters. You typed ${text.length}. Nothing was cut; shorten it.`;
}

function checkNumber(typed: string, { unit, least, most }: Limits): Says {
  const read = oneNumber(typed, unit);
  if (!read.ok) return read.says;
  const space = unit === "" ? "" : ` ${unit}`;
  if (least !== undefined && read.value < least)
    return `This cannot be below ${least}${space}. You typed ${quoted(typed)}.`;
  if (most !== undefined && read.value > most)
    return `This cannot be above ${most}${space}. You typed ${quoted(typed)}.`;
  return null;
}

/** A range with one end open is a limit; both ends empty is none. */
function checkRange(min: string, max: string, limits: Limits, isNeeded = true): Says {
  if (min.trim() === "" && max.trim() === "") return isNeeded ? "Give at least one end." : null;
  for (const end of [min, max]) {
    const says = end.trim() === "" ? null : checkNumber(end, limits);
    if (says) return says;
  }
  const low = oneNumber(min, limits.unit);
  const high = oneNumber(max, limits.unit);
  return low.ok && high.ok && low.value > high.value
    ? `The lower end, ${quoted(min)}, is above the upper end, ${quoted(max)}.`
    : null;
}

function checkCount(typed: string): Says {
  const read = oneNumber(typed);
  if (!read.ok) return read.says;
  return Number.isSafeInteger(read.value) && read.value >= 0
    ? null
    : `This needs a whole number, 0 or more. You typed ${quoted(typed)}.`;
}

function checkMoment(answer: Answer): Says {
  const { date, time, zone } = valueAs("moment", answer);
  if (!isDay(date)) return "Give the day.";
  if (time !== "" && !isTimeOfDay(time))
    return `Give the time as 14:20. You typed ${quoted(time)}.`;
  return isTimeZone(zone) ? null : "Choose the time zone.";
}

function checkHardness(answer: Answer): Says {
  const { scale, min, max, location } = valueAs("hardness", answer);
  if (!includes(REQUIRED_HARDNESS_SCALES, scale))
    return "Choose the scale that the drawing names. A hardness without a scale says nothing.";
  const says = checkRange(min, max, { unit: scale, least: 0 });
  if (says) return says;
  return location.trim() === "" ? "Say where on the part it holds." : checkText(location, TEXT_MAX);
}

function checkCaseDepth(answer: Answer): Says {
  const { process, definition, min, max } = valueAs("caseDepth", answer);
  if (!includes(HARDENING_PROCESSES, process)) return "Choose the process.";
  if (!includes(DEPTH_DEFINITIONS, definition))
    return "Choose what the depth means: SHD, CHD, NHD or total. A depth without it cannot be checked.";
  const says = checkRange(min, max, { unit: "mm" });
  if (says) return says;
  const tooSmall = [min, max].some((end) => {
    const read = oneNumber(end, "mm");
    return read.ok && read.value <= 0;
  });
  return tooSmall ? "A depth has to be above 0 mm." : null;
}

function checkPieces(answer: Answer): Says {
  const pieces = valueAs("pieces", answer);
  for (const [index, piece] of pieces.entries()) {
    const row = `Piece ${index + 1}`;
    if (piece.name.trim() === "") return `${row} needs a name.`;
    if (!includes(PIECE_KINDS, piece.kind)) return `${row}: choose what it is.`;
    const says =
      checkText(piece.name, TEXT_MAX) ??
      checkText(piece.condition, TEXT_MAX) ??
      checkCount(piece.quantity);
    if (says) return `${row}: ${says}`;
  }
  return null;
}

/** What is wrong with a value, in one sentence, or null. `answer` holds a value that is not blank. */
export function checkValue(field: FieldDefinition, answer: Answer): Says {
  switch (field.kind) {
    case "text":
      return checkText(valueAs("text", answer), field.most ?? TEXT_MAX);
    case "longText":
      return checkText(valueAs("longText", answer), LONG_TEXT_MAX);
    case "number":
      return checkNumber(valueAs("number", answer), field);
    case "count":
      return checkCount(valueAs("count", answer));
    case "range": {
      const { min, max } = valueAs("range", answer);
      return checkRange(min, max, field);
    }
    case "choice": {
      const chosen = valueAs("choice", answer);
      return field.choices.some(({ value }) => value === chosen) ? null : "Choose one of these.";
    }
    case "choices": {
      const known = field.choices.map(({ value }) => value);
      return valueAs("choices", answer).every((value) => known.includes(value))
        ? null
        : "Choose from these.";
    }
    case "date":
      return isDay(valueAs("date", answer)) ? null : "Give the day.";
    case "moment":
      return checkMoment(answer);
    case "hardness":
      return checkHardness(answer);
    case "caseDepth":
      return checkCaseDepth(answer);
    case "pieces":
      return checkPieces(answer);
    case "caseNumbers": {
      const wrong = valueAs("caseNumbers", answer).find((n) => !CASE_NUMBER_PATTERN.test(n));
      return wrong === undefined ? null : `${quoted(wrong)} is not a case number.`;
    }
  }
}
