import { z } from "zod";
import { isDay } from "@/lib/intake/moment";
import { draftAnswers } from "@/lib/intake/schemas";
import { HOLD_KINDS, PRIORITIES } from "./constants";

export const REASON_MAX = 2000;
export const QUESTION_MAX = 1000;
export const ANSWER_MAX = 4000;
export const QUESTIONS_AT_ONCE_MAX = 10;

const tooLong = (most: number) =>
  `This holds ${most} characters. Nothing was cut; shorten what you typed.`;

const caseId = z.string().max(40);
const personId = z.string().min(1, "Choose a person.").max(40);
const words = (says: string, most = REASON_MAX) =>
  z.string().trim().min(1, says).max(most, tooLong(most));
const day = z.string().refine(isDay, "Give the day.");

export const CreateDraftInput = z.object({
  /** Client the case belongs to; people of a client leave it out. */
  organisationId: z.string().max(40).optional(),
  answers: draftAnswers.optional(),
});

export const SaveDraftInput = z.object({
  caseId,
  /** Revision of the draft that the person saw. */
  revision: z.number().int(),
  answers: draftAnswers,
});

export const SubmitCaseInput = z.object({ caseId, revision: z.number().int() });

/** The people of a case, its priority and its date. */
const assignment = z.object({
  priority: z.enum(PRIORITIES, "Choose a priority."),
  leadId: personId,
  investigatorId: personId,
  /** Null until one is named; the findings cannot be read without. */
  secondReaderId: personId.nullable(),
  technicianIds: z.array(personId).max(20, "At most 20 technicians."),
  dueOn: day,
});
export type Assignment = z.infer<typeof assignment>;

/** As it stood when the person opened it; null where nobody was named yet. */
const seenAssignment = z.object({
  priority: z.enum(PRIORITIES).nullable(),
  leadId: personId.nullable(),
  investigatorId: personId.nullable(),
  secondReaderId: personId.nullable(),
  technicianIds: z.array(personId),
  dueOn: day.nullable(),
});
export type SeenAssignment = z.infer<typeof seenAssignment>;

export const AcceptCaseInput = assignment.extend({
  caseId,
  impartialityStatement: words(
    "Say that nobody named here owns the design, the process or the supplier.",
  ),
  /** The lead has looked at earlier returns of the same drawing. */
  earlierReturnsSeen: z.literal(true, "Look at the earlier returns of this drawing first."),
});

export const AssignPeopleInput = assignment.extend({
  caseId,
  /** What the person saw before; another state in between is a conflict. */
  seen: seenAssignment.optional(),
});

export const AskBackInput = z.object({
  caseId,
  questions: z
    .array(words("Write the question.", QUESTION_MAX))
    .min(1, "Write at least one question.")
    .max(QUESTIONS_AT_ONCE_MAX, `At most ${QUESTIONS_AT_ONCE_MAX} questions at once.`),
});

export const AnswerQuestionInput = z.object({
  caseId,
  questionId: z.string().max(40),
  answer: words("Write the answer.", ANSWER_MAX),
});

export const DeclineCaseInput = z.object({
  caseId,
  reason: words("Say why; the requester reads it."),
});
export const CancelCaseInput = z.object({ caseId, reason: words("Say why.") });

export const HoldCaseInput = z.object({
  caseId,
  kind: z.enum(HOLD_KINDS, "Choose the kind of hold."),
  reason: words("Say why."),
});

export const ClearHoldInput = z.object({
  caseId,
  holdId: z.string().max(40),
  reason: words("Say why it can go on."),
  /** Who allowed it, by name and paper; needed for a legal hold. */
  authority: z.string().trim().max(REASON_MAX, tooLong(REASON_MAX)).optional(),
});
