import { createHash, type Hash } from "node:crypto";
import { Transform, type TransformCallback } from "node:stream";
import { hmac, sha256Hex } from "./canonical-request";
import { StoreError } from "./errors";
import type { VerifiedSignature } from "./signature";

const MAX_LINE_BYTES = 4096;
const MAX_CHUNK_BYTES = 1024 ** 3;

export type ChunkForm = "unsigned-trailer" | "signed" | "signed-trailer";

/** The form of an `aws-chunked` body by its `x-amz-content-sha256` word; null for a plain body. */
export function chunkForm(payloadHash: string): ChunkForm | null {
  if (payloadHash === "STREAMING-UNSIGNED-PAYLOAD-TRAILER") return "unsigned-trailer";
  if (payloadHash === "STREAMING-AWS4-HMAC-SHA256-PAYLOAD") return "signed";
  if (payloadHash === "STREAMING-AWS4-HMAC-SHA256-PAYLOAD-TRAILER") return "signed-trailer";
  return null;
}

function broken(message: string): StoreError {
  return new StoreError(400, "IncompleteBody", message);
}

/**
 * Takes the framing off an `aws-chunked` body and checks the signature of each chunk and of the
 * trailer. The decoded bytes go on as they come; a wrong chunk ends the stream with an error, so
 * the reader must not keep what it got until the end was reached.
 */
export class ChunkedBody extends Transform {
  readonly trailers = new Map<string, string>();
  private state: "size" | "data" | "data-end" | "trailer" = "size";
  private line = "";
  private remaining = 0;
  private chunkHash: Hash | null = null;
  private claimed = "";
  private previous: string;
  private trailerSignature = "";

  constructor(
    private readonly form: ChunkForm,
    private readonly signed: VerifiedSignature,
  ) {
    super();
    this.previous = signed.signature;
  }

  override _transform(input: Buffer, _encoding: BufferEncoding, done: TransformCallback): void {
    try {
      this.consume(input);
      done();
    } catch (error) {
      done(error instanceof Error ? error : new Error(String(error)));
    }
  }

  override _flush(done: TransformCallback): void {
    try {
      if (this.state !== "trailer") throw broken("The body ended before its last chunk.");
      if (this.line !== "") this.endLine();
      if (this.form === "signed-trailer") this.checkTrailer();
      done();
    } catch (error) {
      done(error instanceof Error ? error : new Error(String(error)));
    }
  }

  private consume(input: Buffer): void {
    let offset = 0;
    while (offset < input.length) {
      if (this.state === "data") {
        const piece = input.subarray(offset, offset + this.remaining);
        this.chunkHash?.update(piece);
        this.push(piece);
        offset += piece.length;
        this.remaining -= piece.length;
        if (this.remaining === 0) this.endChunk("data-end");
        continue;
      }
      const newline = input.indexOf(10, offset);
      const stop = newline < 0 ? input.length : newline;
      this.line += input.toString("latin1", offset, stop);
      if (this.line.length > MAX_LINE_BYTES) throw broken("A chunk header is too long.");
      offset = stop + 1;
      if (newline >= 0) this.endLine();
    }
  }

  private endLine(): void {
    const line = this.line.replace(/\r$/, "");
    this.line = "";
    if (this.state === "size") this.beginChunk(line);
    else if (this.state === "data-end") {
      if (line !== "") throw broken("A chunk is longer than its header says.");
      this.state = "size";
    } else if (line !== "") {
      const colon = line.indexOf(":");
      if (colon < 1) throw broken("A trailer line has no name.");
      const name = line.slice(0, colon).trim().toLowerCase();
      const value = line.slice(colon + 1).trim();
      if (name === "x-amz-trailer-signature") this.trailerSignature = value;
      else this.trailers.set(name, value);
    }
  }

  private beginChunk(line: string): void {
    const found = /^([0-9a-f]{1,8})(?:;chunk-signature=([0-9a-f]{64}))?$/i.exec(line);
    if (!found) throw broken("A chunk header is not a length in hexadecimal.");
    this.remaining = Number.parseInt(found[1] ?? "", 16);
    if (this.remaining > MAX_CHUNK_BYTES) throw broken("A chunk is longer than 1 GiB.");
    this.claimed = found[2] ?? "";
    this.chunkHash = this.form === "unsigned-trailer" ? null : createHash("sha256");
    if (this.remaining === 0) this.endChunk("trailer");
    else this.state = "data";
  }

  private endChunk(next: "data-end" | "trailer"): void {
    if (this.chunkHash) {
      const { amzDate, scope, signingKey } = this.signed;
      const toSign = [
        "AWS4-HMAC-SHA256-PAYLOAD",
        amzDate,
        scope,
        this.previous,
        sha256Hex(""),
        this.chunkHash.digest("hex"),
      ].join("\n");
      this.previous = hmac(signingKey, toSign).toString("hex");
      this.chunkHash = null;
      if (this.previous !== this.claimed) throw this.mismatch("chunk");
    }
    this.state = next;
  }

  private checkTrailer(): void {
    const { amzDate, scope, signingKey } = this.signed;
    const text = [...this.trailers].map(([name, value]) => `${name}:${value}\n`).join("");
    const toSign = ["AWS4-HMAC-SHA256-TRAILER", amzDate, scope, this.previous, sha256Hex(text)];
    const expected = hmac(signingKey, toSign.join("\n")).toString("hex");
    if (expected !== this.trailerSignature) throw this.mismatch("trailer");
  }

  private mismatch(part: string): StoreError {
    return new StoreError(
      403,
      "SignatureDoesNotMatch",
      `The signature of a ${part} does not fit its content.`,
    );
  }
}
