"use server";

import { revalidatePath } from "next/cache";
import { answerQuestion } from "@/lib/cases/answer-question";
import { AnswerQuestionInput, SubmitCaseInput } from "@/lib/cases/schemas";
import { submitCase } from "@/lib/cases/submit-case";
import { action } from "@/lib/http/action";
import { routes } from "@/lib/routes";

export const sendFieldReturn = action(
  { permission: "case.submit", input: SubmitCaseInput },
  async (actor, input) => {
    const sent = await submitCase(actor, input);
    revalidatePath(routes.case(input.caseId), "layout");
    return sent;
  },
);

export const sendAnswer = action(
  { permission: "case.answer", input: AnswerQuestionInput },
  async (actor, input) => {
    const answered = await answerQuestion(actor, input);
    revalidatePath(routes.case(input.caseId), "layout");
    return answered;
  },
);
