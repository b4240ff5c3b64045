import { createSHA256 } from "hash-wasm";
import { PART_SIZE_BYTES } from "@/lib/uploads/constants";

/** SHA-256 of a file in lower-case hexadecimal, read piece by piece so that any size fits in memory. */
export async function hashFile(file: Blob, signal: AbortSignal): Promise<string> {
  const hash = await createSHA256();
  hash.init();
  for (let at = 0; at < file.size; at += PART_SIZE_BYTES) {
    signal.throwIfAborted();
    hash.update(new Uint8Array(await file.slice(at, at + PART_SIZE_BYTES).arrayBuffer()));
  }
  return hash.digest("hex");
}

/** Of the first part only: tells whether a file that goes on is the one that was begun. */
export const hashFirstPart = (file: Blob, signal: AbortSignal) =>
  hashFile(file.slice(0, PART_SIZE_BYTES), signal);
