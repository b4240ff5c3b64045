import "server-only";
import { eq, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { uploadParts, uploads } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { ownUpload, partBytes, partCount } from "./find-upload";
import { addressParts } from "./part-addresses";
import { type PartAddress, ReportPartsInput } from "./schemas";

/**
 * Notes which parts the store has taken, and gives fresh addresses for the parts wanted next.
 * The parts of a file are bookkeeping of its transfer; the file's own start and end are events.
 * @throws AppError CONFLICT when the file is no longer being sent
 */
export async function reportParts(
  actor: Actor,
  uploadId: string,
  raw: unknown,
): Promise<{ parts: PartAddress[] }> {
  const { done, want } = parseInput(ReportPartsInput, raw);
  const upload = await ownUpload(actor, uploadId);
  if (upload.state !== "sending" || upload.s3UploadId === null) {
    throw new AppError(
      "CONFLICT",
      `${upload.fileName} is not being sent in parts any more. Nothing was changed. Load the page again to see where it stands.`,
    );
  }
  const count = partCount(upload);
  for (const part of done) {
    if (part.partNumber > count || part.sizeBytes !== partBytes(upload, part.partNumber)) {
      throw new AppError(
        "INVALID",
        `Part ${part.partNumber} of ${upload.fileName} has not the size that was agreed. The parts before it are kept. Choose the file again to go on.`,
      );
    }
  }
  if (done.length > 0) {
    await database()
      .insert(uploadParts)
      .values(done.map((part) => ({ ...part, uploadId })))
      .onDuplicateKeyUpdate({ set: { etag: sql`values(${uploadParts.etag})` } });
    await database().update(uploads).set({ changedAt: new Date() }).where(eq(uploads.id, uploadId));
  }
  return {
    parts: await addressParts(
      upload,
      want.filter((partNumber) => partNumber <= count),
    ),
  };
}
