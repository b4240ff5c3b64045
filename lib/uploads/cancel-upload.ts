import "server-only";
import { eq } from "drizzle-orm";
import { uploadParts, uploads } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { AppError, notFound } from "@/lib/errors";
import { objectStore } from "@/lib/storage/s3";
import { findUpload, ownUpload, UPLOAD_ACTION } from "./find-upload";

/**
 * Gives up a file that is being sent, or puts the notice of a refused one away.
 * @throws AppError CONFLICT when it was sent already
 */
export async function cancelUpload(actor: Actor, uploadId: string): Promise<void> {
  const seen = await ownUpload(actor, uploadId);
  await writeCase(actor, UPLOAD_ACTION[seen.purpose], seen.caseId, async (tx) => {
    const upload = await findUpload(tx, uploadId, "lock");
    if (!upload) throw notFound();
    if (upload.state === "cancelled") return;
    if (upload.state !== "sending" && upload.state !== "refused") {
      throw new AppError(
        "CONFLICT",
        `${upload.fileName} was sent already, so it cannot be cancelled. It is kept. Withdraw the picture once it is there.`,
      );
    }
    await tx
      .update(uploads)
      .set({ state: "cancelled", changedAt: new Date() })
      .where(eq(uploads.id, uploadId));
    await tx.delete(uploadParts).where(eq(uploadParts.uploadId, uploadId));
    await recordEvent(tx, {
      caseId: upload.caseId,
      actor,
      action: UPLOAD_ACTION[upload.purpose],
      subject: { kind: "upload", id: uploadId, label: upload.fileName },
      before: { state: upload.state },
      after: { state: "cancelled" },
    });
  });
  const store = objectStore();
  if (seen.s3UploadId !== null) await store.abortParts(seen.key, seen.s3UploadId);
  await store.remove(seen.key);
}
