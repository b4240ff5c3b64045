import "server-only";
import { eq, max } from "drizzle-orm";
import { reviewNotes } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { newId } from "@/lib/new-id";
import { documentTree } from "./document-structure";
import { findIssue } from "./find-issue";
import { noteLabel } from "./constants";
import { LeaveNoteInput } from "./note-schemas";
import { findFigure, findPassage, sectionTexts } from "./passages";

/**
 * Leaves a note of the second reader at a place in the text: a section, words of it, or a figure.
 * @throws AppError INVALID when the place is not in the text as it stands
 */
export async function leaveNote(actor: Actor, raw: unknown): Promise<{ number: number }> {
  const input = parseInput(LeaveNoteInput, raw);
  return writeCase(actor, "findings.leaveNote", input.caseId, async (tx) => {
    const issue = await findIssue(tx, input.caseId, "lock");
    if (!issue) throw new AppError("LOCKED", "There is no open issue to read.");
    const tree = documentTree(issue.document);
    if (input.passage !== "" && !findPassage(sectionTexts(tree), input.section, input.passage)) {
      throw new AppError("INVALID", undefined, {
        fields: { passage: "These words do not stand in this section as it is saved now." },
      });
    }
    if (input.figureId !== null && !findFigure(tree, input.figureId)) {
      throw new AppError("INVALID", "This figure does not stand in the findings any more.");
    }
    const [last] = await tx
      .select({ number: max(reviewNotes.number) })
      .from(reviewNotes)
      .where(eq(reviewNotes.issueId, issue.id));
    const { caseId: _caseId, ...note } = input;
    const row = {
      id: newId("note"),
      issueId: issue.id,
      number: (last?.number ?? 0) + 1,
      revision: issue.revision,
      readerId: actor.id,
      replies: [],
      ...note,
    };
    await tx.insert(reviewNotes).values(row);
    await recordEvent(tx, {
      caseId: input.caseId,
      actor,
      action: "findings.leaveNote",
      subject: { kind: "review_note", id: row.id, label: noteLabel(row.number, issue.number) },
      before: null,
      after: note,
    });
    return { number: row.number };
  });
}
