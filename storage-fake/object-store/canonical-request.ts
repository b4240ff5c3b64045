import { createHash, createHmac } from "node:crypto";
import type { StoreRequest } from "./request";

export function sha256Hex(data: string | Buffer): string {
  return createHash("sha256").update(data).digest("hex");
}

export function hmac(key: string | Buffer, text: string): Buffer {
  return createHmac("sha256", key).update(text).digest();
}

/** RFC 3986 encoding with the unreserved set of Signature Version 4. */
function encode(text: string): string {
  return encodeURIComponent(text).replace(
    /[!'()*]/g,
    (character) => `%${character.charCodeAt(0).toString(16).toUpperCase()}`,
  );
}

function canonicalPath(rawPath: string): string {
  return rawPath
    .split("/")
    .map((segment) => encode(decodeURIComponent(segment)))
    .join("/");
}

function canonicalQuery(query: StoreRequest["query"]): string {
  const byCode = (a: string, b: string) => (a < b ? -1 : a > b ? 1 : 0);
  return query
    .filter(([name]) => name !== "X-Amz-Signature")
    .map(([name, value]) => [encode(name), encode(value)] as const)
    .sort((a, b) => byCode(a[0], b[0]) || byCode(a[1], b[1]))
    .map(([name, value]) => `${name}=${value}`)
    .join("&");
}

/**
 * SHA-256 of the canonical request of Signature Version 4 for S3.
 * Source: "Create a signed AWS API request" in the AWS General Reference; S3 encodes the path once
 * and does not normalise it.
 */
export function canonicalRequestHash(
  request: StoreRequest,
  signedHeaders: string[],
  payloadHash: string,
): string {
  const headers = signedHeaders.map((name) => {
    const value = request.incoming.headers[name];
    const text = Array.isArray(value) ? value.join(",") : (value ?? "");
    return `${name}:${text.trim().replace(/ +/g, " ")}\n`;
  });
  const canonical = [
    request.method,
    canonicalPath(request.rawPath),
    canonicalQuery(request.query),
    headers.join(""),
    signedHeaders.join(";"),
    payloadHash,
  ].join("\n");
  // Node hands header bytes over as Latin-1, so this gives back the bytes that were sent.
  return sha256Hex(Buffer.from(canonical, "latin1"));
}
