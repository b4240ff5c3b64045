import "server-only";
import { Readable } from "node:stream";
import { objectStore } from "@/lib/storage/s3";

type Answer = {
  key: string;
  mediaType: string;
  /** Name under which it is saved; absent for what a page shows. */
  saveAs?: string;
  cacheControl: string;
};

/** A name for Content-Disposition, plain and in UTF-8 (RFC 6266). */
function disposition(saveAs: string | undefined): string {
  if (saveAs === undefined) return "inline";
  const plain = saveAs.replace(/[^\x20-\x7e]|["\\]/g, "_");
  const encoded = encodeURIComponent(saveAs).replace(
    /['()*]/g,
    (mark) => `%${mark.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return `attachment; filename="${plain}"; filename*=UTF-8''${encoded}`;
}

/**
 * Streams an object that never changes from the store. The caller has asked the policy. Answers 304
 * to a browser that has it, which is asked each time the sign-in cookie differs.
 */
export async function storedFile(
  request: Request,
  { key, mediaType, saveAs, cacheControl }: Answer,
): Promise<Response> {
  const etag = `"${key}"`;
  const headers = { etag, "cache-control": cacheControl, vary: "Cookie" };
  if (request.headers.get("if-none-match") === etag) {
    return new Response(null, { status: 304, headers });
  }
  const { body, info } = await objectStore().get(key);
  return new Response(Readable.toWeb(body) as ReadableStream<Uint8Array>, {
    headers: {
      ...headers,
      "content-type": mediaType,
      "content-length": String(info.sizeBytes),
      "content-disposition": disposition(saveAs),
      // A file from outside must not run as a page of the portal.
      "content-security-policy": "sandbox; default-src 'none'",
    },
  });
}

/** For what is addressed by content that never changes. */
export const IMMUTABLE = "private, max-age=43200, immutable";
