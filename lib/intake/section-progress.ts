import { type Answers, isBlank } from "./answers";
import { BLANK_SAYS, type Problems } from "./check-answers";
import { fieldsOf, type Section } from "./fields";

export type SectionProgress = {
  answered: number;
  /** Fields that may not stay empty. */
  asked: number;
  /** Answers that are there and do not hold. */
  toCorrect: number;
  state: "untouched" | "under-way" | "complete" | "needs-attention";
};

/** How far a section is: a blank answer is work left, a wrong one needs attention. */
export function sectionProgress(
  section: Section,
  answers: Answers,
  problems: Problems,
): SectionProgress {
  const fields = fieldsOf(section);
  const askedFields = fields.filter((field) => field.need !== "optional");
  const answered = askedFields.filter((field) => !isBlank(field.kind, answers[field.key])).length;
  const touched = fields.some((field) => !isBlank(field.kind, answers[field.key]));
  const toCorrect = fields.filter((field) => {
    const says = problems[field.key];
    return says !== undefined && says !== BLANK_SAYS;
  }).length;
  const state =
    toCorrect > 0
      ? "needs-attention"
      : answered === askedFields.length
        ? "complete"
        : touched
          ? "under-way"
          : "untouched";
  return { answered, asked: askedFields.length, toCorrect, state };
}
