import type { ServerResponse } from "node:http";
import type { StoredObject } from "./objects";
import type { StoreRequest } from "./request";

const CONTENT_HEADERS = [
  "cache-control",
  "content-disposition",
  "content-encoding",
  "content-language",
  "content-type",
  "expires",
];

/** Headers that are kept with an object and given back with it. */
export function headersToKeep(request: StoreRequest): Record<string, string> {
  const kept: Record<string, string> = {};
  const metadata = request.amzNames().filter((name) => name.startsWith("x-amz-meta-"));
  for (const name of [...CONTENT_HEADERS, ...metadata]) {
    const value = request.header(name);
    if (value !== undefined) kept[name] = value;
  }
  // The framing of the transfer is no property of the object.
  const encodings = (kept["content-encoding"] ?? "")
    .split(",")
    .map((encoding) => encoding.trim())
    .filter((encoding) => encoding !== "" && encoding !== "aws-chunked");
  if (encodings.length > 0) kept["content-encoding"] = encodings.join(",");
  else delete kept["content-encoding"];
  kept["content-type"] ??= "binary/octet-stream";
  return kept;
}

/** Sets the headers of a GET or HEAD answer, `response-content-*` overrides included. */
export function sendObjectHeaders(
  request: StoreRequest,
  response: ServerResponse,
  object: StoredObject,
): void {
  for (const [name, value] of Object.entries(object.headers)) response.setHeader(name, value);
  for (const name of CONTENT_HEADERS) {
    const override = request.queryValue(`response-${name}`);
    // Header values are bytes: UTF-8 text goes out as the bytes it is made of.
    if (override !== undefined) {
      response.setHeader(name, Buffer.from(override, "utf8").toString("latin1"));
    }
  }
  response.setHeader("ETag", `"${object.etag}"`);
  response.setHeader("Last-Modified", new Date(object.lastModified).toUTCString());
  response.setHeader("Accept-Ranges", "bytes");
}
