import "server-only";
import { and, count, eq, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { caseQuestions } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { AppError, notFound } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { mailAboutCase, recipients } from "./case-mail";
import { moveCase } from "./move-case";
import { restateFieldReturn } from "./restate-field-return";
import { AnswerQuestionInput } from "./schemas";
import { writeCase } from "./write-case";

export type AnsweredQuestion = {
  /** Questions that still wait; at 0 the case is with the laboratory again. */
  stillOpen: number;
  /** Version of F1 that the answers made, or null where the field return stayed as it was. */
  version: number | null;
};

/**
 * Answers one question. With the last one the case goes back to the laboratory, and what was
 * changed in the field return meanwhile becomes its next version.
 * @throws AppError INVALID when the changed field return does not hold; CONFLICT when answered already
 */
export async function answerQuestion(actor: Actor, raw: unknown): Promise<AnsweredQuestion> {
  const input = parseInput(AnswerQuestionInput, raw);
  return writeCase(actor, "case.answer", input.caseId, async (tx, { row }) => {
    const question = await lockQuestion(tx, row.id, input.questionId);
    await tx
      .update(caseQuestions)
      .set({ answer: input.answer, answeredById: actor.id, answeredAt: new Date() })
      .where(eq(caseQuestions.id, question.id));
    await recordEvent(tx, {
      caseId: row.id,
      actor,
      action: "case.answer",
      subject: { kind: "question", id: question.id, label: row.number ?? "Draft" },
      before: { question: question.question, answer: null },
      after: { answer: input.answer },
    });
    const [open] = await tx
      .select({ n: count() })
      .from(caseQuestions)
      .where(and(eq(caseQuestions.caseId, row.id), isNull(caseQuestions.answeredAt)));
    const stillOpen = open?.n ?? 0;
    if (stillOpen > 0) return { stillOpen, version: null };
    const version = await restateFieldReturn(tx, actor, row.id);
    await moveCase(tx, actor, row, "answer");
    const asker = await recipients(tx, [question.askedById, row.leadId]);
    await mailAboutCase(tx, asker, row, "answered", {
      news: `${actor.name} answered. The case waits for you again.`,
      facts: [
        ["You asked", question.question],
        ["Answer", input.answer],
      ],
    });
    return { stillOpen, version };
  });
}

async function lockQuestion(tx: Transaction, caseId: string, questionId: string) {
  const [question] = await tx
    .select()
    .from(caseQuestions)
    .where(and(eq(caseQuestions.id, questionId), eq(caseQuestions.caseId, caseId)))
    .for("update");
  if (!question) throw notFound();
  if (question.answeredAt) {
    throw new AppError(
      "CONFLICT",
      "This question was answered in the meantime. Your words are kept here; load the page to see the answer.",
    );
  }
  return question;
}
