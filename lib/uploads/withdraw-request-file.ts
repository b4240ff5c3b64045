import "server-only";
import { and, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { requestFiles, storedObjects } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { notFound } from "@/lib/errors";

/** Takes a paper off a field return. The file itself stays in the store, as it was part of the case. */
export async function withdrawRequestFile(actor: Actor, fileId: string): Promise<void> {
  const [file] = await database()
    .select({ caseId: requestFiles.caseId, fileName: storedObjects.fileName })
    .from(requestFiles)
    .innerJoin(storedObjects, eq(storedObjects.id, requestFiles.objectId))
    .where(eq(requestFiles.id, fileId));
  if (!file) throw notFound();
  await writeCase(actor, "case.addRequestFile", file.caseId, async (tx) => {
    const [result] = await tx
      .update(requestFiles)
      .set({ isWithdrawn: true })
      .where(and(eq(requestFiles.id, fileId), eq(requestFiles.isWithdrawn, false)));
    // Taken off in another window: there is nothing left to do or to note.
    if (result.affectedRows === 0) return;
    await recordEvent(tx, {
      caseId: file.caseId,
      actor,
      action: "case.addRequestFile",
      subject: { kind: "request_file", id: fileId, label: file.fileName },
      before: { isWithdrawn: false },
      after: { isWithdrawn: true },
    });
  });
}
