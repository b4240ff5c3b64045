import { type Answer, type Answers, isBlank } from "./answers";
import { type Field, FIELDS } from "./fields";

export type OpenAnswer = { field: Field; answer: Exclude<Answer, { kind: "value" }> };

/** What the sender does not know or still awaits, so that a gap is never read as "none". */
export function openAnswers(answers: Answers): OpenAnswer[] {
  return FIELDS.flatMap((field) => {
    const answer = answers[field.key];
    return answer && (answer.kind === "unknown" || answer.kind === "awaiting")
      ? [{ field, answer }]
      : [];
  });
}

/** Fields whose answers differ between two states of a field return. */
export function changedFields(before: Answers, after: Answers): Field[] {
  const told = (field: Field, answers: Answers) => {
    const answer = answers[field.key];
    return isBlank(field.kind, answer) ? "" : JSON.stringify(answer);
  };
  return FIELDS.filter((field) => told(field, before) !== told(field, after));
}
