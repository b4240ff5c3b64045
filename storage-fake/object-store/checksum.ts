import { createHash } from "node:crypto";
import { crc32 } from "node:zlib";
import { StoreError, notImplemented } from "./errors";
import type { StoreRequest } from "./request";

export type ChecksumAlgorithm = "crc32" | "sha1" | "sha256";

export interface Checksum {
  algorithm: ChecksumAlgorithm;
  /** Base64; of a multipart object the checksum of the parts' checksums, with `-N`. */
  value: string;
}

/** The checksum that a body must have; `value` is null while it is still to come in the trailer. */
export interface ExpectedChecksum {
  algorithm: ChecksumAlgorithm;
  value: string | null;
}

export interface RunningDigest {
  update(bytes: Buffer): void;
  base64(): string;
}

const HEADER = /^x-amz-checksum-(crc32|crc32c|crc64nvme|sha1|sha256)$/;

export function checksumAlgorithm(name: string): ChecksumAlgorithm {
  const lower = name.toLowerCase();
  if (lower === "crc32" || lower === "sha1" || lower === "sha256") return lower;
  throw notImplemented(`the checksum ${name}`);
}

export function runningDigest(algorithm: ChecksumAlgorithm): RunningDigest {
  if (algorithm !== "crc32") {
    const hash = createHash(algorithm);
    return { update: (bytes) => void hash.update(bytes), base64: () => hash.digest("base64") };
  }
  let state = 0;
  return {
    update: (bytes) => void (state = crc32(bytes, state)),
    base64() {
      const bytes = Buffer.alloc(4);
      bytes.writeUInt32BE(state);
      return bytes.toString("base64");
    },
  };
}

/** @throws StoreError 400 when more than one checksum is named, 501 for one not computed here. */
export function expectedChecksum(request: StoreRequest): ExpectedChecksum | null {
  const trailer = request.header("x-amz-trailer");
  const expected: ExpectedChecksum[] = request
    .amzNames()
    .map((name) => HEADER.exec(name)?.[1])
    .filter((name) => name !== undefined)
    .map((name) => ({
      algorithm: checksumAlgorithm(name),
      value: request.header(`x-amz-checksum-${name}`) ?? "",
    }));
  if (trailer !== undefined) {
    const named = HEADER.exec(trailer.trim().toLowerCase())?.[1];
    if (named === undefined) throw notImplemented(`the trailer ${trailer}`);
    expected.push({ algorithm: checksumAlgorithm(named), value: null });
  }
  if (expected.length > 1) {
    throw new StoreError(400, "InvalidRequest", "A request may carry only one checksum.");
  }
  return expected[0] ?? null;
}

/** Composite checksum of a multipart object: the digest of the parts' digests. */
export function compositeChecksum(algorithm: ChecksumAlgorithm, parts: string[]): Checksum {
  const digest = runningDigest(algorithm);
  for (const part of parts) digest.update(Buffer.from(part, "base64"));
  return { algorithm, value: `${digest.base64()}-${parts.length}` };
}

/** Name of the XML element that carries a checksum, for example `ChecksumSHA256`. */
export function checksumElement(algorithm: ChecksumAlgorithm): string {
  return `Checksum${algorithm.toUpperCase()}`;
}
