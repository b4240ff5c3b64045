import { createHash } from "node:crypto";
import { createWriteStream } from "node:fs";
import { pipeline } from "node:stream/promises";
import { type Checksum, expectedChecksum, runningDigest } from "./checksum";
import { ChunkedBody, chunkForm } from "./chunked-body";
import { removeIfThere } from "./disk";
import { StoreError, notImplemented } from "./errors";
import type { StoreRequest } from "./request";
import type { VerifiedSignature } from "./signature";

const MAX_BODY_BYTES = 5 * 1024 ** 3;

/** A body that lies complete and checked on the disk under a temporary name. */
export interface ReceivedBody {
  path: string;
  size: number;
  md5Hex: string;
  /** Present when the client asked for one. */
  checksum?: Checksum;
}

function badDigest(what: string): StoreError {
  return new StoreError(400, "BadDigest", `The ${what} does not fit the bytes that arrived.`);
}

function wrongLength(): StoreError {
  return new StoreError(400, "IncompleteBody", "The body has another length than was given.");
}

function declaredSize(request: StoreRequest, chunked: boolean): number {
  const text = request.header(chunked ? "x-amz-decoded-content-length" : "content-length");
  if (text === undefined || !/^\d{1,15}$/.test(text)) {
    throw new StoreError(411, "MissingContentLength", "The length of the body must be given.");
  }
  const size = Number(text);
  if (size > MAX_BODY_BYTES) {
    throw new StoreError(400, "EntityTooLarge", "One upload may have at most 5 GiB.");
  }
  return size;
}

function expectedMd5(request: StoreRequest): string | null {
  const text = request.header("content-md5");
  if (text === undefined) return null;
  const bytes = Buffer.from(text, "base64");
  if (bytes.length !== 16) {
    throw new StoreError(400, "InvalidDigest", "Content-MD5 is not 16 bytes in Base64.");
  }
  return bytes.toString("hex");
}

function expectedSha256(payloadHash: string): string | null {
  if (payloadHash === "UNSIGNED-PAYLOAD" || chunkForm(payloadHash)) return null;
  if (payloadHash.startsWith("STREAMING-")) throw notImplemented(`a body of form ${payloadHash}`);
  return payloadHash;
}

/**
 * Streams the body of a request to `path` (a new file), flushed to the disk, and checks length,
 * SHA-256 of the signature, Content-MD5 and checksum. Nothing stays at `path` after an error.
 *
 * @throws StoreError 400 when a length or digest does not fit, 403 for a wrong chunk signature.
 */
export async function receiveBody(
  request: StoreRequest,
  signed: VerifiedSignature,
  path: string,
): Promise<ReceivedBody> {
  const form = chunkForm(signed.payloadHash);
  const size = declaredSize(request, form !== null);
  const md5Wanted = expectedMd5(request);
  const sha256Wanted = expectedSha256(signed.payloadHash);
  const checksumWanted = expectedChecksum(request);
  const named = request.header("x-amz-sdk-checksum-algorithm");
  if (named !== undefined && named.toLowerCase() !== checksumWanted?.algorithm) {
    throw new StoreError(400, "InvalidRequest", `The ${named} checksum was named but not sent.`);
  }

  const md5 = createHash("md5");
  const sha256 = sha256Wanted === null ? null : createHash("sha256");
  const digest = checksumWanted && runningDigest(checksumWanted.algorithm);
  const decoder = form && new ChunkedBody(form, signed);
  let received = 0;
  async function* meter(source: AsyncIterable<Buffer>): AsyncGenerator<Buffer> {
    for await (const chunk of source) {
      received += chunk.length;
      if (received > size) throw wrongLength();
      md5.update(chunk);
      sha256?.update(chunk);
      digest?.update(chunk);
      yield chunk;
    }
  }

  request.beginBody();
  // The socket must outlive a refusal, or the client would see a reset instead of the reason.
  const body = request.incoming.iterator({ destroyOnReturn: false });
  const file = createWriteStream(path, { flags: "wx", flush: true });
  try {
    if (decoder) await pipeline(body, decoder, meter, file);
    else await pipeline(body, meter, file);

    if (received !== size) throw wrongLength();
    const md5Hex = md5.digest("hex");
    if (md5Wanted !== null && md5Wanted !== md5Hex) throw badDigest("Content-MD5");
    if (sha256 && sha256.digest("hex") !== sha256Wanted) {
      throw new StoreError(
        400,
        "XAmzContentSHA256Mismatch",
        "The header x-amz-content-sha256 does not fit the bytes that arrived.",
      );
    }
    if (!checksumWanted || !digest) return { path, size, md5Hex };
    const { algorithm } = checksumWanted;
    const value = digest.base64();
    const wanted = checksumWanted.value ?? decoder?.trailers.get(`x-amz-checksum-${algorithm}`);
    if (wanted !== value) throw badDigest(`${algorithm.toUpperCase()} checksum`);
    return { path, size, md5Hex, checksum: { algorithm, value } };
  } catch (error) {
    await removeIfThere(path);
    throw error;
  }
}
