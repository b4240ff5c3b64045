import type { z } from "zod";
import type { Answer } from "@/components/forms/use-action-form";
import type { AnswerNoteInput, LeaveNoteInput, ReturnNoteInput } from "@/lib/findings/note-schemas";

/** What the page can do with notes, and what this person may. */
export type NoteActs = {
  mayLeave: boolean;
  mayAnswer: boolean;
  leave: (input: z.input<typeof LeaveNoteInput>) => Promise<Answer<unknown>>;
  answer: (input: z.input<typeof AnswerNoteInput>) => Promise<Answer<unknown>>;
  giveBack: (input: z.input<typeof ReturnNoteInput>) => Promise<Answer<unknown>>;
};
