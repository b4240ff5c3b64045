import "server-only";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { parseInput } from "@/lib/http/parse-input";
import { AnswerNoteInput } from "./note-schemas";
import { replyToNote } from "./reply-to-note";

/** Answers a note of the second reader, or says that the text was changed as it asks. */
export async function answerNote(actor: Actor, raw: unknown): Promise<void> {
  const input = parseInput(AnswerNoteInput, raw);
  await writeCase(actor, "findings.answerNote", input.caseId, (tx) =>
    replyToNote(tx, actor, "findings.answerNote", input),
  );
}
