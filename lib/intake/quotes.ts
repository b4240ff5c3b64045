import type { CitableValue, CitableValues } from "@/lib/records/constants";
import { formatHardness } from "@/lib/format/hardness";
import { type Answers, isBlank, valueAs } from "./answers";
import { type Field, FIELDS } from "./fields";
import { limitHardness } from "./limit-hardness";
import { oneNumber } from "./one-number";
import { rangeText, valueText } from "./show-answer";

const stated = (label: string, text: string, value: number | null, unit: string | null) =>
  ({
    label,
    text,
    value,
    unit,
    expandedUncertainty: null,
    source: "stated",
  }) satisfies CitableValue;

function quoteOf(field: Field, answers: Answers): CitableValue | null {
  const answer = answers[field.key];
  if (answer?.kind !== "value" || isBlank(field.kind, answer)) return null;
  const text = valueText(field, answer);
  switch (field.kind) {
    case "number": {
      const read = oneNumber(valueAs("number", answer), field.unit);
      return read.ok ? stated(field.label, text, read.value, field.unit) : null;
    }
    case "count": {
      const read = oneNumber(valueAs("count", answer));
      return read.ok ? stated(field.label, text, read.value, null) : null;
    }
    case "range":
      return stated(field.label, text, null, field.unit);
    case "hardness": {
      const { scale, min, max } = valueAs("hardness", answer);
      return stated(field.label, rangeText(min, max, scale), null, scale);
    }
    case "caseDepth": {
      const { definition, min, max } = valueAs("caseDepth", answer);
      return stated(`${field.label} (${definition})`, rangeText(min, max, "mm"), null, "mm");
    }
    case "date":
    case "moment":
      return stated(field.label, text, null, null);
    default:
      return field.quoted ? stated(field.label, text, null, null) : null;
  }
}

/** The stated values that findings can cite, by field. */
export function fieldReturnQuotes(answers: Answers): CitableValues {
  const quotes: CitableValues = {};
  for (const field of FIELDS) {
    const quote = quoteOf(field, answers);
    if (quote) quotes[field.key] = quote;
  }
  const limit = limitHardness(answers);
  if (limit && limit.limitHv !== null) {
    const text = formatHardness({ value: limit.limitHv, scale: limit.scale });
    quotes.limitHardness = stated("Limit hardness", text, limit.limitHv, limit.scale);
  }
  return quotes;
}
