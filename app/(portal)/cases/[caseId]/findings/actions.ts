"use server";

import { revalidatePath } from "next/cache";
import { answerNote } from "@/lib/findings/answer-note";
import { leaveNote } from "@/lib/findings/leave-note";
import { AnswerNoteInput, LeaveNoteInput, ReturnNoteInput } from "@/lib/findings/note-schemas";
import { returnNote } from "@/lib/findings/return-note";
import { action } from "@/lib/http/action";
import { routes } from "@/lib/routes";

const refresh = (caseId: string) => revalidatePath(routes.case(caseId), "layout");

export const leaveReaderNote = action(
  { permission: "findings.leaveNote", input: LeaveNoteInput },
  async (actor, input) => {
    const note = await leaveNote(actor, input);
    refresh(input.caseId);
    return note;
  },
);

export const answerReaderNote = action(
  { permission: "findings.answerNote", input: AnswerNoteInput },
  async (actor, input) => {
    await answerNote(actor, input);
    refresh(input.caseId);
  },
);

export const returnReaderNote = action(
  { permission: "findings.returnNote", input: ReturnNoteInput },
  async (actor, input) => {
    await returnNote(actor, input);
    refresh(input.caseId);
  },
);
