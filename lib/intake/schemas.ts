import { z } from "zod";
import { type Answers, draftAnswer } from "./answers";
import { checkForSending, checkNotPast } from "./check-answers";
import { FIELDS } from "./fields";

const ANSWERS = z.strictObject(
  Object.fromEntries(FIELDS.map((field) => [field.key, draftAnswer(field.kind).optional()])),
  "The field return has no such field.",
);

function isAnswers(value: object): value is Answers {
  return Object.keys(value).every((key) => Object.hasOwn(ANSWERS.shape, key));
}

/** Answers as a draft keeps them: the right shape, whatever was typed. */
export const draftAnswers = ANSWERS.transform((value, context): Answers => {
  if (isAnswers(value)) return value;
  context.addIssue({ code: "custom", message: "The field return has no such field." });
  return z.NEVER;
});

/**
 * Answers that can be sent: nothing that is asked for is blank, and every value holds. `first` is
 * the sending that opens the case; later ones do not ask again whether the wanted day lies ahead.
 */
export function sentAnswers(now: Date, first: boolean) {
  return draftAnswers.superRefine((answers, context) => {
    const problems = {
      ...(first ? checkNotPast(answers, now) : {}),
      ...checkForSending(answers, now),
    };
    for (const [key, message] of Object.entries(problems)) {
      context.addIssue({ code: "custom", path: [key], message });
    }
  });
}

/** Content of a field return once it is sent: the answers as typed. */
export const fieldReturnContent = z.object({ answers: draftAnswers });
export type FieldReturnContent = z.infer<typeof fieldReturnContent>;
