import "server-only";
import { and, asc, eq } from "drizzle-orm";
import { database, type Reader } from "@/db/client";
import { uploadParts, uploads } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import type { Action } from "@/lib/auth/policy";
import { getCase } from "@/lib/cases/get-case";
import { notFound } from "@/lib/errors";
import type { UploadPurpose } from "./constants";

export type UploadRow = typeof uploads.$inferSelect;
export type UploadPart = { partNumber: number; etag: string; sizeBytes: number };

/** The rule of the policy that sending a file for this purpose falls under. */
export const UPLOAD_ACTION = {
  image: "image.add",
  request_file: "case.addRequestFile",
} as const satisfies Record<UploadPurpose, Action>;

export async function findUpload(
  reader: Reader,
  uploadId: string,
  lock: "lock" | "read" = "read",
): Promise<UploadRow | null> {
  const query = reader.select().from(uploads).where(eq(uploads.id, uploadId));
  const [row] = lock === "lock" ? await query.for("update") : await query;
  return row ?? null;
}

/**
 * An upload of this person's own, after asking the policy whether they may still send it.
 * @throws AppError NOT_FOUND for somebody else's, NOT_ALLOWED, LOCKED
 */
export async function ownUpload(actor: Actor, uploadId: string): Promise<UploadRow> {
  const upload = await findUpload(database(), uploadId);
  if (!upload || upload.byId !== actor.id) throw notFound();
  await getCase(actor, UPLOAD_ACTION[upload.purpose], upload.caseId);
  return upload;
}

/** Parts that the store has, in their order. */
export async function partsOf(reader: Reader, uploadId: string): Promise<UploadPart[]> {
  return reader
    .select({
      partNumber: uploadParts.partNumber,
      etag: uploadParts.etag,
      sizeBytes: uploadParts.sizeBytes,
    })
    .from(uploadParts)
    .where(and(eq(uploadParts.uploadId, uploadId)))
    .orderBy(asc(uploadParts.partNumber));
}

export function partCount(upload: Pick<UploadRow, "sizeBytes" | "partSizeBytes">): number {
  return upload.partSizeBytes === null ? 1 : Math.ceil(upload.sizeBytes / upload.partSizeBytes);
}

/** Bytes of a part; the last one is what is left. */
export function partBytes(
  upload: Pick<UploadRow, "sizeBytes" | "partSizeBytes">,
  partNumber: number,
): number {
  const size = upload.partSizeBytes ?? upload.sizeBytes;
  return Math.min(size, upload.sizeBytes - (partNumber - 1) * size);
}
