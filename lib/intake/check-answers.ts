import { LABORATORY_TIME_ZONE } from "@/lib/format/dates";
import { type Answers, isBlank, valueAs } from "./answers";
import { checkValue } from "./check-value";
import { LONG_TEXT_MAX } from "./constants";
import { type Field, type FieldKey, FIELDS } from "./fields";
import { dayIn, instantOf, isDay } from "./moment";
import { oneNumber } from "./one-number";

export type Problems = Partial<Record<FieldKey, string>>;

export const BLANK_SAYS =
  "Answer this, or choose “Does not apply”, “Not known” or “Asked, answer awaited”.";

/** What is wrong with one answer by itself, or null. A blank one is only wrong on sending. */
export function checkAnswer(field: Field, answers: Answers): string | null {
  const answer = answers[field.key];
  if (!answer || isBlank(field.kind, answer)) return null;
  switch (answer.kind) {
    case "value":
      return checkValue(field, answer);
    case "unknown":
      if (answer.why.trim() === "") return "Say why it is not known.";
      return answer.why.length > LONG_TEXT_MAX
        ? `This holds ${LONG_TEXT_MAX} characters. You typed ${answer.why.length}. Nothing was cut; shorten it.`
        : null;
    case "not_applicable":
    case "awaiting":
      return null;
  }
}

/** Answers that contradict one another or the calendar. */
export function checkTogether(answers: Answers, now: Date): Problems {
  const problems: Problems = {};
  const found = valueAs("moment", answers.foundAt);
  const isFoundGiven = isDay(found.date);
  if (isFoundGiven && found.zone !== "" && instantOf(found.date, found.time, found.zone) > now) {
    problems.foundAt = "This lies in the future.";
  }
  const count = (key: "quantityFailed" | "quantityInstalled" | "quantitySound") => {
    const read = oneNumber(valueAs("count", answers[key]));
    return read.ok ? read.value : null;
  };
  const [failed, installed, sound] = [
    count("quantityFailed"),
    count("quantityInstalled"),
    count("quantitySound"),
  ];
  if (failed !== null && installed !== null && failed > installed) {
    problems.quantityFailed = `${failed} failed is more than the ${installed} in service. Count the failed ones in.`;
  } else if (
    failed !== null &&
    installed !== null &&
    sound !== null &&
    failed + sound > installed
  ) {
    problems.quantitySound = `${failed} failed and ${sound} sound are more than the ${installed} in service.`;
  }
  if (failed === 0) problems.quantityFailed = "At least one has to have failed.";
  const needed = valueAs("date", answers.neededBy);
  if (isDay(needed) && isFoundGiven && needed < found.date) {
    problems.neededBy = "This lies before the day it was found.";
  }
  return problems;
}

/** A date that has passed is asked again only when the field return is first sent. */
export function checkNotPast(answers: Answers, now: Date): Problems {
  const needed = valueAs("date", answers.neededBy);
  return isDay(needed) && needed < dayIn(LABORATORY_TIME_ZONE, now)
    ? { neededBy: "This day has passed." }
    : {};
}

/** Everything that keeps a field return from being sent, one sentence for each field. */
export function checkForSending(answers: Answers, now: Date): Problems {
  const problems = checkTogether(answers, now);
  for (const field of FIELDS) {
    const says =
      field.need !== "optional" && isBlank(field.kind, answers[field.key])
        ? BLANK_SAYS
        : checkAnswer(field, answers);
    if (says) problems[field.key] = says;
  }
  return problems;
}
