import "server-only";
import { Readable } from "node:stream";

/** `attachment; filename=…` with the name in both forms, so that any letters come through (RFC 6266). */
export function contentDisposition(kind: "attachment" | "inline", fileName: string): string {
  const plain = fileName.replace(/[^\x20-\x7e]|["\\]/g, "_");
  const encoded = encodeURIComponent(fileName).replace(
    /['()*]/g,
    (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return `${kind}; filename="${plain}"; filename*=UTF-8''${encoded}`;
}

/** A file from the store, streamed. */
export function streamResponse(body: Readable, headers: Record<string, string>): Response {
  return new Response(Readable.toWeb(body) as ReadableStream<Uint8Array>, {
    headers: {
      "x-content-type-options": "nosniff",
      "content-security-policy": "default-src 'none'; sandbox",
      ...headers,
    },
  });
}
