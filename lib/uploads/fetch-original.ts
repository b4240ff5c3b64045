import "server-only";
import { createHash } from "node:crypto";
import { createWriteStream } from "node:fs";
import { Transform } from "node:stream";
import { pipeline } from "node:stream/promises";
import { objectStore } from "@/lib/storage/s3";
import type { UploadRow } from "./find-upload";
import { FileRefusal } from "./file-refusal";

/** Where the original of an upload is kept for good. No address for writing to it is ever given. */
export const originalKey = (uploadId: string) => `originals/${uploadId}`;

/**
 * Copies what arrived to where nobody can write, and brings it to `file` while hashing it. What is
 * checked is the copy, since the browser's address stays good for a few minutes.
 * @throws FileRefusal when it is not what the browser said it had sent
 */
export async function fetchOriginal(upload: UploadRow, file: string): Promise<{ sha256: string }> {
  const store = objectStore();
  const key = originalKey(upload.id);
  // Once copied it is never copied again: what arrives later under the same address is not looked at.
  if ((await store.head(key)) === null) await store.copy(upload.key, key);
  const hash = createHash("sha256");
  let size = 0;
  const tap = new Transform({
    transform(chunk: Buffer, _encoding, done) {
      hash.update(chunk);
      size += chunk.byteLength;
      done(null, chunk);
    },
  });
  const { body } = await store.get(key);
  await pipeline(body, tap, createWriteStream(file));
  const sha256 = hash.digest("hex");
  if (size !== upload.sizeBytes || sha256 !== upload.claimedSha256) {
    throw new FileRefusal(
      `${upload.fileName} changed on its way: its SHA-256 here is not the one it had with you. It was not kept. Send it again.`,
    );
  }
  return { sha256 };
}

/** Takes away what arrived, once the original is kept or refused. */
export async function clearArrival(upload: UploadRow, isKept: boolean): Promise<void> {
  await objectStore().remove(upload.key);
  if (!isKept) await objectStore().remove(originalKey(upload.id));
}
