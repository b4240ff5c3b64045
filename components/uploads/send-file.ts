import type { UploadPurpose } from "@/lib/uploads/constants";
import type { PartAddress, UploadDetails, UploadStatus, UploadTicket } from "@/lib/uploads/schemas";
import { routes } from "@/lib/routes";
import { askServer } from "./ask-server";
import { hashFile, hashFirstPart } from "./hash-file";
import { putBytes } from "./put-bytes";
import { tryAgain } from "./try-again";

export type SendRequest = {
  caseId: string;
  purpose: UploadPurpose;
  file: File;
  details: UploadDetails;
  signal: AbortSignal;
  onStarted: (started: { uploadId: string; keepsParts: boolean }) => void;
  onProgress: (sentBytes: number) => void;
};

const PARTS_AT_ONCE = 3;

type Parts = Extract<UploadTicket["way"], { kind: "parts" }>;

/** The ticket for a file: a new one, or that of the same file where it stopped. */
async function start({ caseId, purpose, file, details, signal }: SendRequest) {
  const firstPartSha256 = await hashFirstPart(file, signal);
  const body = {
    caseId,
    purpose,
    fileName: file.name,
    sizeBytes: file.size,
    mediaType: file.type,
    lastModified: file.lastModified,
    firstPartSha256,
    details,
  };
  return () => askServer<UploadTicket>(routes.api.uploads(), { method: "POST", body, signal });
}

async function sendParts(request: SendRequest, uploadId: string, way: Parts): Promise<void> {
  const { file, onProgress } = request;
  // When one part fails for good, the others stop with it.
  const failing = new AbortController();
  const signal = AbortSignal.any([request.signal, failing.signal]);
  const size = way.partSizeBytes;
  const bytesOf = (part: number) => file.slice((part - 1) * size, part * size);
  const sent = new Map<number, number>(way.alreadySent.map((part) => [part, bytesOf(part).size]));
  const tell = () => onProgress([...sent.values()].reduce((sum, bytes) => sum + bytes, 0));
  tell();
  const left = Array.from({ length: Math.ceil(file.size / size) }, (_, i) => i + 1)
    .filter((part) => !sent.has(part))
    .values();
  const addresses = new Map(way.parts.map((part) => [part.partNumber, part.url]));
  const report = (body: { done?: unknown[]; want?: number[] }) =>
    askServer<{ parts: PartAddress[] }>(routes.api.uploadParts(uploadId), {
      method: "POST",
      body,
      signal,
    });

  const sendPart = async (partNumber: number): Promise<string> => {
    let url = addresses.get(partNumber);
    // An address is used once: a try that failed may have failed because it was too old.
    addresses.delete(partNumber);
    url ??= (await report({ want: [partNumber] })).parts[0]?.url;
    if (!url) throw new Error(`no address for part ${partNumber}`);
    return putBytes(url, bytesOf(partNumber), {
      signal,
      onProgress: (bytes) => {
        sent.set(partNumber, bytes);
        tell();
      },
    });
  };
  const lane = async () => {
    for (const partNumber of left) {
      const etag = await tryAgain(signal, () => sendPart(partNumber));
      const sizeBytes = bytesOf(partNumber).size;
      await tryAgain(signal, () => report({ done: [{ partNumber, etag, sizeBytes }] }));
      sent.set(partNumber, sizeBytes);
      tell();
    }
  };
  const lanes = Array.from({ length: PARTS_AT_ONCE }, lane);
  try {
    await Promise.all(lanes);
  } catch (error) {
    failing.abort(error);
    await Promise.allSettled(lanes);
    throw error;
  }
}

/**
 * Sends a file to the store and asks the portal to look into it. Started again with the same file,
 * it goes on after the parts that have arrived.
 * @throws Refused, NoAnswer, or the reason of `signal`
 */
export async function sendFile(request: SendRequest): Promise<UploadStatus> {
  const { file, signal, onStarted, onProgress } = request;
  const ask = await start(request);
  const ticket = await tryAgain(signal, ask);
  const { uploadId, way } = ticket;
  onStarted({ uploadId, keepsParts: way.kind === "parts" });
  if (way.kind === "parts") {
    await sendParts(request, uploadId, way);
  } else {
    let url: string | null = way.url;
    await tryAgain(signal, async () => {
      const fresh: UploadTicket = url === null ? await ask() : ticket;
      const address = fresh.way.kind === "whole" ? fresh.way.url : way.url;
      url = null;
      await putBytes(address, file, { mediaType: way.mediaType, signal, onProgress });
    });
  }
  const sha256 = await hashFile(file, signal);
  return tryAgain(signal, () =>
    askServer<UploadStatus>(routes.api.uploadFinish(uploadId), {
      method: "POST",
      body: { sha256 },
      signal,
    }),
  );
}
