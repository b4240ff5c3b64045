import { type FileHandle, open } from "node:fs/promises";
import { pipeline } from "node:stream/promises";
import { checksumElement } from "./checksum";
import { readCondition } from "./conditions";
import { isMissing } from "./disk";
import { preconditionFailed } from "./errors";
import { sendObjectHeaders } from "./object-headers";
import { type StoredObject, dataPath, getObject } from "./objects";
import { type Context, type Handler, bucketOf, keyOf } from "./operation";
import { parseRange } from "./range";
import type { Bucket } from "./store";

/** Opens the data of an object; an overwrite between the two reads is met by reading again. */
async function openObject(
  bucket: Bucket,
  key: string,
): Promise<{ object: StoredObject; handle: FileHandle }> {
  for (let attempt = 1; ; attempt += 1) {
    const object = await getObject(bucket, key);
    try {
      return { object, handle: await open(dataPath(bucket, object), "r") };
    } catch (error) {
      if (!isMissing(error) || attempt === 5) throw error;
    }
  }
}

/** Status and headers of a read. Null when the answer has no body and was sent. */
function beginAnswer(
  { request }: Context,
  object: StoredObject,
): { first: number; last: number } | null {
  const { response } = request;
  const condition = readCondition(request, object);
  if (condition === "failed") throw preconditionFailed();
  const range = conditionalRange(request.header("if-range"), object)
    ? parseRange(request.header("range"), object.size)
    : null;
  sendObjectHeaders(request, response, object);
  if (condition === "not-modified") {
    response.writeHead(304).end();
    return null;
  }
  if (request.header("x-amz-checksum-mode") === "ENABLED" && object.checksum && !range) {
    const { algorithm, value } = object.checksum;
    response.setHeader(`x-amz-checksum-${algorithm}`, value);
    response.setHeader("x-amz-checksum-type", value.includes("-") ? "COMPOSITE" : "FULL_OBJECT");
  }
  const { first, last } = range ?? { first: 0, last: object.size - 1 };
  response.statusCode = range ? 206 : 200;
  response.setHeader("Content-Length", last - first + 1);
  if (range) response.setHeader("Content-Range", `bytes ${first}-${last}/${object.size}`);
  return { first, last };
}

function conditionalRange(ifRange: string | undefined, object: StoredObject): boolean {
  return ifRange === undefined || ifRange === `"${object.etag}"`;
}

export const headObject: Handler = async (context) => {
  const object = await getObject(bucketOf(context), keyOf(context));
  if (beginAnswer(context, object)) context.request.response.end();
};

export const readObject: Handler = async (context) => {
  const { object, handle } = await openObject(bucketOf(context), keyOf(context));
  try {
    const span = beginAnswer(context, object);
    if (!span) return;
    if (span.last < span.first) {
      context.request.response.end();
      return;
    }
    const bytes = handle.createReadStream({ start: span.first, end: span.last, autoClose: false });
    await pipeline(bytes, context.request.response);
  } finally {
    await handle.close();
  }
};

/** Headers that tell a writer the checksum that was verified and kept. */
export function sendChecksum({ request }: Context, object: Pick<StoredObject, "checksum">): void {
  if (!object.checksum) return;
  const { algorithm, value } = object.checksum;
  request.response.setHeader(`x-amz-checksum-${algorithm}`, value);
}

export function checksumNode(object: Pick<StoredObject, "checksum">): [string, string][] {
  if (!object.checksum) return [];
  return [[checksumElement(object.checksum.algorithm), object.checksum.value]];
}
