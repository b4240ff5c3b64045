import "server-only";
import type { Readable } from "node:stream";

export type ObjectInfo = { sizeBytes: number; mediaType: string; etag: string };
export type CompletedPart = { partNumber: number; etag: string };

/** What Riverline asks of an object store. Keys are paths with forward slashes. */
export type ObjectStore = {
  put(key: string, body: Buffer | Uint8Array, mediaType: string): Promise<void>;
  /** For bodies that do not fit in memory. */
  putStream(key: string, body: Readable, mediaType: string): Promise<void>;
  /** @throws when there is no such object */
  get(
    key: string,
    range?: { start: number; end: number },
  ): Promise<{ body: Readable; info: ObjectInfo }>;
  getBytes(key: string): Promise<Buffer>;
  head(key: string): Promise<ObjectInfo | null>;
  remove(key: string): Promise<void>;
  copy(fromKey: string, toKey: string): Promise<void>;
  /** Addresses a browser may use for a short while. */
  presignPut(key: string, mediaType: string, sizeBytes: number): Promise<string>;
  presignPart(key: string, uploadId: string, partNumber: number): Promise<string>;
  startParts(key: string, mediaType: string): Promise<string>;
  finishParts(key: string, uploadId: string, parts: readonly CompletedPart[]): Promise<void>;
  abortParts(key: string, uploadId: string): Promise<void>;
  /** Whether the store answers, for the health page. */
  isUp(): Promise<boolean>;
  /** Makes the bucket and its cross-origin rule when they are missing. */
  prepare(allowedOrigin: string): Promise<void>;
};
