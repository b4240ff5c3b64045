import "server-only";
import { objectStore } from "@/lib/storage/s3";
import { PART_BATCH } from "./constants";
import { partCount, type UploadPart, type UploadRow } from "./find-upload";
import type { PartAddress, UploadTicket } from "./schemas";

/** Addresses for some parts of an upload, good for a few minutes. */
export async function addressParts(
  upload: Pick<UploadRow, "key" | "s3UploadId">,
  partNumbers: readonly number[],
): Promise<PartAddress[]> {
  const { key, s3UploadId } = upload;
  if (s3UploadId === null) return [];
  return Promise.all(
    partNumbers.map(async (partNumber) => ({
      partNumber,
      url: await objectStore().presignPart(key, s3UploadId, partNumber),
    })),
  );
}

/** How to go on with an upload from where it stands. */
export async function ticketFor(
  upload: UploadRow,
  sent: readonly UploadPart[],
): Promise<UploadTicket> {
  if (upload.s3UploadId === null || upload.partSizeBytes === null) {
    const { key, claimedMediaType: mediaType, sizeBytes } = upload;
    const url = await objectStore().presignPut(key, mediaType, sizeBytes);
    return { uploadId: upload.id, way: { kind: "whole", url, mediaType } };
  }
  const alreadySent = sent.map((part) => part.partNumber);
  const has = new Set(alreadySent);
  const missing = Array.from({ length: partCount(upload) }, (_, i) => i + 1).filter(
    (partNumber) => !has.has(partNumber),
  );
  const parts = await addressParts(upload, missing.slice(0, PART_BATCH));
  return {
    uploadId: upload.id,
    way: { kind: "parts", partSizeBytes: upload.partSizeBytes, parts, alreadySent },
  };
}
