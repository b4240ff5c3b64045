import { link } from "node:fs/promises";
import { readCondition, writeCondition } from "./conditions";
import { StoreError, notImplemented, preconditionFailed } from "./errors";
import { checksumNode } from "./get-object";
import { headersToKeep } from "./object-headers";
import { commitObject, dataPath, getObject } from "./objects";
import { type Handler, bucketOf, keyOf, sendXml } from "./operation";

function parseSource(text: string): { bucket: string; key: string } {
  if (text.includes("?")) throw notImplemented("copying a version");
  let decoded: string;
  try {
    decoded = decodeURIComponent(text.replace(/^\//, ""));
  } catch (cause) {
    if (cause instanceof URIError) {
      throw new StoreError(400, "InvalidArgument", "The copy source cannot be decoded.");
    }
    throw cause;
  }
  const slash = decoded.indexOf("/");
  if (slash < 1 || slash === decoded.length - 1) {
    throw new StoreError(400, "InvalidArgument", "The copy source must be BUCKET/KEY.");
  }
  return { bucket: decoded.slice(0, slash), key: decoded.slice(slash + 1) };
}

export const copyObject: Handler = async (context) => {
  const { store, request } = context;
  const target = bucketOf(context);
  const key = keyOf(context);
  const place = parseSource(request.header("x-amz-copy-source") ?? "");
  const directive = request.header("x-amz-metadata-directive") ?? "COPY";
  if (directive !== "COPY" && directive !== "REPLACE") {
    throw new StoreError(400, "InvalidArgument", "The metadata directive is COPY or REPLACE.");
  }
  if (place.bucket === target.name && place.key === key && directive === "COPY") {
    throw new StoreError(400, "InvalidRequest", "A copy onto itself must replace the metadata.");
  }
  const sourceBucket = store.bucket(place.bucket);
  const temporary = store.temporaryPath();
  // Data files never change, so a second name for the same bytes is a copy. Under the source's
  // lock, so that no overwrite can take the file away in between.
  const source = await store.locks.run(`${place.bucket}/${place.key}`, async () => {
    const object = await getObject(sourceBucket, place.key);
    if (readCondition(request, object, "x-amz-copy-source-") !== "ok") throw preconditionFailed();
    await link(dataPath(sourceBucket, object), temporary);
    return object;
  });
  const copy = await commitObject(
    store,
    target,
    {
      key,
      size: source.size,
      etag: source.etag,
      headers: directive === "REPLACE" ? headersToKeep(request) : source.headers,
      ...(source.checksum ? { checksum: source.checksum } : {}),
    },
    temporary,
    writeCondition(request, key),
  );
  sendXml(context, "CopyObjectResult", [
    ["LastModified", copy.lastModified],
    ["ETag", `"${copy.etag}"`],
    ...checksumNode(copy),
  ]);
};
