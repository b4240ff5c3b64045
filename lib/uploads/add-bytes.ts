import "server-only";
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { records, uploads } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { sha256Hex } from "@/lib/canonical-json";
import { AppError } from "@/lib/errors";
import { takeInImageJob } from "@/lib/images/take-in-image-job";
import { objectStore } from "@/lib/storage/s3";
import { PART_SIZE_BYTES } from "./constants";
import { findUpload, type UploadRow } from "./find-upload";
import { finishUpload } from "./finish-upload";
import type { UploadDetails } from "./schemas";
import { startUpload } from "./start-upload";

export type ImageBytes = {
  caseId: string;
  fileName: string;
  mediaType: string;
  bytes: Buffer;
  details: UploadDetails;
};

async function uploadOf(uploadId: string): Promise<UploadRow> {
  const upload = await findUpload(database(), uploadId);
  if (!upload) throw new Error(`upload ${uploadId} is gone`);
  return upload;
}

/** Sends bytes that are on the server already; they need no parts, however many there are. */
async function putWhole(upload: UploadRow, bytes: Buffer): Promise<void> {
  if (upload.s3UploadId !== null) {
    await objectStore().abortParts(upload.key, upload.s3UploadId);
    await database()
      .update(uploads)
      .set({ s3UploadId: null, partSizeBytes: null })
      .where(eq(uploads.id, upload.id));
  }
  await objectStore().put(upload.key, bytes, upload.claimedMediaType);
}

/** A worker may have the job in hand as well; whoever ends it, the picture is made once. */
async function takeInNow(uploadId: string): Promise<UploadRow> {
  try {
    await takeInImageJob.run({ uploadId });
  } catch (error) {
    const upload = await uploadOf(uploadId);
    if (upload.state !== "taken") throw error;
  }
  return uploadOf(uploadId);
}

/**
 * Adds a picture from bytes through the same steps as one sent by a browser, and waits until it is
 * ready to mark.
 * @throws AppError INVALID with the words of the refusal
 */
export async function addImageBytes(
  actor: Actor,
  { caseId, fileName, mediaType, bytes, details }: ImageBytes,
): Promise<{ imageId: string; label: string }> {
  const { uploadId } = await startUpload(actor, {
    caseId,
    purpose: "image",
    fileName,
    sizeBytes: bytes.byteLength,
    mediaType,
    lastModified: 0,
    firstPartSha256: sha256Hex(bytes.subarray(0, PART_SIZE_BYTES)),
    details,
  });
  await putWhole(await uploadOf(uploadId), bytes);
  await finishUpload(actor, uploadId, { sha256: sha256Hex(bytes) });
  const upload = await takeInNow(uploadId);
  if (upload.imageId === null) {
    throw new AppError("INVALID", upload.refusal ?? `${fileName} was not taken in.`);
  }
  const [record] = await database()
    .select({ label: records.label })
    .from(records)
    .where(eq(records.id, upload.imageId));
  if (!record) throw new Error(`picture ${upload.imageId} has no record`);
  return { imageId: upload.imageId, label: record.label };
}
