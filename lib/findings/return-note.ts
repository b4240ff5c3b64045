import "server-only";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { parseInput } from "@/lib/http/parse-input";
import { ReturnNoteInput } from "./note-schemas";
import { replyToNote } from "./reply-to-note";

/** Opens a note again that its answer does not settle, or withdraws it; only the second reader. */
export async function returnNote(actor: Actor, raw: unknown): Promise<void> {
  const input = parseInput(ReturnNoteInput, raw);
  await writeCase(actor, "findings.returnNote", input.caseId, (tx) =>
    replyToNote(tx, actor, "findings.returnNote", input),
  );
}
