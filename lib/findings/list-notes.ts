import "server-only";
import { and, asc, count, eq } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { people, reviewNotes } from "@/db/schema";
import type { ReviewNote } from "./constants";

/** Notes of the second reader on an issue, in the order they were left. The caller asked the policy. */
export async function listNotes(reader: Reader, issueId: string): Promise<ReviewNote[]> {
  const rows = await reader
    .select({ note: reviewNotes, by: people.name })
    .from(reviewNotes)
    .innerJoin(people, eq(people.id, reviewNotes.readerId))
    .where(eq(reviewNotes.issueId, issueId))
    .orderBy(asc(reviewNotes.number));
  return rows.map(({ note, by }) => ({
    id: note.id,
    number: note.number,
    section: note.section,
    passage: note.passage,
    figureId: note.figureId,
    kind: note.kind,
    severity: note.severity,
    words: note.words,
    state: note.state,
    by,
    at: note.madeAt.toISOString(),
    replies: note.replies,
  }));
}

/** Notes on an issue that nobody has settled. */
export async function countOpenNotes(reader: Reader, issueId: string): Promise<number> {
  const [row] = await reader
    .select({ open: count() })
    .from(reviewNotes)
    .where(and(eq(reviewNotes.issueId, issueId), eq(reviewNotes.state, "open")));
  return row?.open ?? 0;
}
