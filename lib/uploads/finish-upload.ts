import "server-only";
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { uploads } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { AppError, notFound } from "@/lib/errors";
import { formatBytes } from "@/lib/format/numbers";
import { parseInput } from "@/lib/http/parse-input";
import { enqueue } from "@/lib/jobs/queue";
import { objectStore } from "@/lib/storage/s3";
import {
  findUpload,
  ownUpload,
  partCount,
  partsOf,
  UPLOAD_ACTION,
  type UploadRow,
} from "./find-upload";
import { getUpload } from "./get-upload";
import { FinishUploadInput, type UploadStatus } from "./schemas";

/** Puts the parts together; answers again the same when that was done before. */
async function joinParts(upload: UploadRow): Promise<void> {
  if (upload.s3UploadId === null) return;
  const store = objectStore();
  const parts = await partsOf(database(), upload.id);
  const missing = partCount(upload) - parts.length;
  if (missing > 0) {
    throw new AppError(
      "INVALID",
      `${upload.fileName} is not here yet: ${missing} of ${partCount(upload)} parts are missing. The parts sent so far are kept. Carry on.`,
    );
  }
  try {
    await store.finishParts(upload.key, upload.s3UploadId, parts);
  } catch (cause) {
    const whole = await store.head(upload.key);
    if (whole?.sizeBytes !== upload.sizeBytes) throw cause;
  }
}

async function checkSize(upload: UploadRow): Promise<void> {
  const here = await objectStore().head(upload.key);
  if (here?.sizeBytes === upload.sizeBytes) return;
  throw new AppError(
    "INVALID",
    here
      ? `${upload.fileName} has ${formatBytes(here.sizeBytes)} here and ${formatBytes(upload.sizeBytes)} with you. Nothing was taken. Send it again.`
      : `${upload.fileName} has not arrived. Nothing was taken. Send it again.`,
  );
}

/**
 * Ends the sending of a file and asks for it to be looked into. Asked again with the same digest it
 * answers where the file stands, so a lost answer does no harm.
 * @throws AppError INVALID when bytes are missing; CONFLICT when it was cancelled or is another file
 */
export async function finishUpload(
  actor: Actor,
  uploadId: string,
  raw: unknown,
): Promise<UploadStatus> {
  const { sha256 } = parseInput(FinishUploadInput, raw);
  const seen = await ownUpload(actor, uploadId);
  if (seen.state === "sending") {
    await joinParts(seen);
    await checkSize(seen);
  }
  await writeCase(actor, UPLOAD_ACTION[seen.purpose], seen.caseId, async (tx) => {
    const upload = await findUpload(tx, uploadId, "lock");
    if (!upload) throw notFound();
    if (upload.state !== "sending") {
      if (upload.state !== "cancelled" && upload.claimedSha256 === sha256) return;
      throw new AppError(
        "CONFLICT",
        upload.state === "cancelled"
          ? `${upload.fileName} was cancelled in another window. Nothing of it is kept. Send it again if you want it.`
          : `${upload.fileName} was sent already, with other content. The first is kept. Send yours again under another name.`,
      );
    }
    const now = new Date();
    await tx
      .update(uploads)
      .set({ state: "sent", claimedSha256: sha256, changedAt: now, finishedAt: now })
      .where(eq(uploads.id, uploadId));
    await enqueue(tx, {
      kind: "image.take-in",
      payload: { uploadId },
      uniqueKey: `take-in-${uploadId}`,
    });
    await recordEvent(tx, {
      caseId: upload.caseId,
      actor,
      action: UPLOAD_ACTION[upload.purpose],
      subject: { kind: "upload", id: uploadId, label: upload.fileName },
      before: { state: "sending" },
      after: { state: "sent", sha256 },
    });
  });
  return getUpload(actor, uploadId);
}
