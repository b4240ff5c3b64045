import "server-only";
import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { reviewNotes } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { AppError, notFound } from "@/lib/errors";
import { findIssue } from "./find-issue";
import { noteLabel, type NoteReply, type NoteState } from "./constants";

const STATE_AFTER: Record<NoteReply["act"], NoteState> = {
  answered: "answered",
  done: "done",
  reopened: "open",
  withdrawn: "withdrawn",
};

/** Acts that fit a note in this state. */
const FITS: Record<NoteState, readonly NoteReply["act"][]> = {
  open: ["answered", "done", "withdrawn"],
  answered: ["answered", "done", "reopened", "withdrawn"],
  done: ["reopened", "withdrawn"],
  withdrawn: ["reopened"],
};

/**
 * Adds a reply to a note of the open issue and brings its state along; the caller has asked the
 * policy and holds the case.
 * @throws AppError CONFLICT when someone else settled it meanwhile
 */
export async function replyToNote(
  tx: Transaction,
  actor: Actor,
  action: "findings.answerNote" | "findings.returnNote",
  input: { caseId: string; noteId: string; act: NoteReply["act"]; words: string },
): Promise<void> {
  const issue = await findIssue(tx, input.caseId, "lock");
  if (!issue) throw notFound();
  const [note] = await tx
    .select()
    .from(reviewNotes)
    .where(and(eq(reviewNotes.id, input.noteId), eq(reviewNotes.issueId, issue.id)))
    .for("update");
  if (!note) throw notFound();
  if (!FITS[note.state].includes(input.act)) {
    throw new AppError(
      "CONFLICT",
      `Note ${note.number} is ${note.state} already. Nothing was changed; your words are kept here. Load the page again to see it.`,
    );
  }
  const reply: NoteReply = {
    act: input.act,
    words: input.words,
    byId: actor.id,
    by: actor.name,
    at: new Date().toISOString(),
  };
  const state = STATE_AFTER[input.act];
  await tx
    .update(reviewNotes)
    .set({ state, replies: [...note.replies, reply] })
    .where(eq(reviewNotes.id, note.id));
  await recordEvent(tx, {
    caseId: input.caseId,
    actor,
    action,
    subject: { kind: "review_note", id: note.id, label: noteLabel(note.number, issue.number) },
    before: { state: note.state },
    after: { state, words: input.words },
  });
}
