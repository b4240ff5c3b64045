import type { IncomingMessage, ServerResponse } from "node:http";
import { StoreError } from "./errors";

const MAX_KEY_BYTES = 1024;

/** One request, taken apart but not yet trusted. */
export interface StoreRequest {
  incoming: IncomingMessage;
  response: ServerResponse;
  method: string;
  /** Path exactly as sent, still percent-encoded: the signature covers this form. */
  rawPath: string;
  query: [name: string, value: string][];
  bucket: string | null;
  key: string | null;
  presigned: boolean;
  /** A header, or the query parameter of the same `x-amz-` name in a presigned request. */
  header(name: string): string | undefined;
  /** Names of all `x-amz-` settings, from headers and presigned query alike. */
  amzNames(): string[];
  queryValue(name: string): string | undefined;
  /** Tells a client that waits for it (`Expect: 100-continue`) to send the body. */
  beginBody(): void;
}

function decode(part: string): string {
  try {
    return decodeURIComponent(part);
  } catch (cause) {
    if (cause instanceof URIError) {
      throw new StoreError(400, "InvalidURI", "The address holds a percent sign without a code.");
    }
    throw cause;
  }
}

function parseQuery(text: string): [string, string][] {
  return text
    .split("&")
    .filter((pair) => pair !== "")
    .map((pair) => {
      const equals = pair.indexOf("=");
      return equals < 0
        ? [decode(pair), ""]
        : [decode(pair.slice(0, equals)), decode(pair.slice(equals + 1))];
    });
}

function headerText(incoming: IncomingMessage, name: string): string | undefined {
  const value = incoming.headers[name];
  return Array.isArray(value) ? value.join(",") : value;
}

/** @throws StoreError 400 for an address that cannot be decoded or a key that is too long. */
export function readRequest(
  incoming: IncomingMessage,
  response: ServerResponse,
  waitsForContinue: boolean,
): StoreRequest {
  const url = incoming.url ?? "/";
  const mark = url.indexOf("?");
  const rawPath = mark < 0 ? url : url.slice(0, mark);
  if (!rawPath.startsWith("/")) {
    throw new StoreError(400, "InvalidURI", "The address must start with a slash.");
  }
  const query = parseQuery(mark < 0 ? "" : url.slice(mark + 1));
  const slash = rawPath.indexOf("/", 1);
  const bucket = decode(slash < 0 ? rawPath.slice(1) : rawPath.slice(1, slash));
  const key = slash < 0 ? "" : decode(rawPath.slice(slash + 1));
  if (Buffer.byteLength(key) > MAX_KEY_BYTES) {
    throw new StoreError(400, "KeyTooLongError", "A key may have at most 1024 bytes.");
  }
  const presigned = query.some(([name]) => name === "X-Amz-Signature");
  const inQuery = new Map(query.map(([name, value]) => [name.toLowerCase(), value]));
  let begun = false;

  return {
    incoming,
    response,
    method: incoming.method ?? "GET",
    rawPath,
    query,
    bucket: bucket === "" ? null : bucket,
    key: key === "" ? null : key,
    presigned,
    header(name) {
      const sent = headerText(incoming, name);
      if (sent !== undefined || !presigned || !name.startsWith("x-amz-")) return sent;
      return inQuery.get(name);
    },
    amzNames() {
      const names = Object.keys(incoming.headers);
      if (presigned) names.push(...inQuery.keys());
      return names.filter((name) => name.startsWith("x-amz-"));
    },
    queryValue: (name) => query.find(([found]) => found === name)?.[1],
    beginBody() {
      if (waitsForContinue && !begun) response.writeContinue();
      begun = true;
    },
  };
}
