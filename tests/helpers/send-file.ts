import { database } from "@/db/client";
import type { Actor } from "@/lib/auth/actor";
import { sha256Hex } from "@/lib/canonical-json";
import { takeInImageJob } from "@/lib/images/take-in-image-job";
import { PART_SIZE_BYTES, type UploadPurpose } from "@/lib/uploads/constants";
import { findUpload, type UploadRow } from "@/lib/uploads/find-upload";
import { finishUpload } from "@/lib/uploads/finish-upload";
import { reportParts } from "@/lib/uploads/report-parts";
import type { PartAddress, UploadDetails } from "@/lib/uploads/schemas";
import { startUpload } from "@/lib/uploads/start-upload";

export type SentFile = {
  caseId: string;
  fileName: string;
  bytes: Buffer;
  purpose?: UploadPurpose;
  details?: UploadDetails;
};

export function startInput({ caseId, fileName, bytes, purpose = "image", details }: SentFile) {
  return {
    caseId,
    purpose,
    fileName,
    sizeBytes: bytes.byteLength,
    mediaType: "application/octet-stream",
    lastModified: 1_700_000_000_000,
    firstPartSha256: sha256Hex(bytes.subarray(0, PART_SIZE_BYTES)),
    details: details ?? { technique: "stereo" as const },
  };
}

export async function put(url: string, body: Uint8Array, mediaType?: string): Promise<string> {
  const answer = await fetch(url, {
    method: "PUT",
    body: new Uint8Array(body),
    ...(mediaType && { headers: { "content-type": mediaType } }),
  });
  if (!answer.ok) throw new Error(`the store said ${answer.status}: ${await answer.text()}`);
  return answer.headers.get("etag") ?? "";
}

export const partOf = (bytes: Buffer, partNumber: number) =>
  bytes.subarray((partNumber - 1) * PART_SIZE_BYTES, partNumber * PART_SIZE_BYTES);

/** Sends some parts as a browser does, and tells the portal. */
export async function sendParts(
  actor: Actor,
  uploadId: string,
  bytes: Buffer,
  parts: readonly PartAddress[],
): Promise<void> {
  for (const { partNumber, url } of parts) {
    const part = partOf(bytes, partNumber);
    const etag = await put(url, part);
    await reportParts(actor, uploadId, {
      done: [{ partNumber, etag, sizeBytes: part.byteLength }],
      want: [],
    });
  }
}

/** Sends a whole file the way a browser does, up to the moment when it is to be looked into. */
export async function sendFile(actor: Actor, file: SentFile): Promise<string> {
  const ticket = await startUpload(actor, startInput(file));
  if (ticket.way.kind === "whole") await put(ticket.way.url, file.bytes, ticket.way.mediaType);
  else await sendParts(actor, ticket.uploadId, file.bytes, ticket.way.parts);
  await finishUpload(actor, ticket.uploadId, { sha256: sha256Hex(file.bytes) });
  return ticket.uploadId;
}

export async function uploadRow(uploadId: string): Promise<UploadRow> {
  const upload = await findUpload(database(), uploadId);
  if (!upload) throw new Error(`there is no upload ${uploadId}`);
  return upload;
}

/** Sends a file and looks into it. */
export async function sendAndTakeIn(actor: Actor, file: SentFile): Promise<UploadRow> {
  const uploadId = await sendFile(actor, file);
  await takeInImageJob.run({ uploadId });
  return uploadRow(uploadId);
}
