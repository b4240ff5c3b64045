import { createHash } from "node:crypto";
import { createReadStream, createWriteStream } from "node:fs";
import { pipeline } from "node:stream/promises";
import { type Checksum, checksumElement, compositeChecksum } from "./checksum";
import { writeCondition } from "./conditions";
import { removeIfThere } from "./disk";
import { StoreError, malformedXml } from "./errors";
import { checksumNode } from "./get-object";
import { type Part, type Upload, getUpload, listParts, partPath, removeUpload } from "./multipart";
import { commitObject } from "./objects";
import { type Handler, bucketOf, keyOf, sendXml } from "./operation";
import { readXmlBody } from "./small-body";
import type { Bucket } from "./store";
import { type XmlElement, childText, childrenNamed } from "./xml";

const MIN_PART_BYTES = 5 * 1024 ** 2;

/** The parts that the client names, each found among those that arrived, unchanged. */
function chooseParts(root: XmlElement, arrived: Part[]): Part[] {
  const byNumber = new Map(arrived.map((part) => [part.partNumber, part]));
  const chosen = childrenNamed(root, "Part").map((element) => {
    const part = byNumber.get(Number(childText(element, "PartNumber")));
    const etag = childText(element, "ETag")?.trim().replace(/^"|"$/g, "");
    const sum = part?.checksum;
    const named = sum && childText(element, checksumElement(sum.algorithm));
    if (!part || part.etag !== etag || (named !== undefined && named !== sum?.value)) {
      throw new StoreError(
        400,
        "InvalidPart",
        `Part ${childText(element, "PartNumber") ?? "?"} did not arrive or has other content.`,
      );
    }
    return part;
  });
  if (chosen.length === 0) throw malformedXml();
  chosen.reduce((before, part) => {
    if (before.partNumber >= part.partNumber) {
      throw new StoreError(400, "InvalidPartOrder", "The parts must be listed in rising order.");
    }
    return part;
  });
  const small = chosen.slice(0, -1).find((part) => part.size < MIN_PART_BYTES);
  if (small) {
    throw new StoreError(
      400,
      "EntityTooSmall",
      `Part ${small.partNumber} is below 5 MiB and not the last.`,
    );
  }
  return chosen;
}

async function joinParts(bucket: Bucket, upload: Upload, parts: Part[], target: string) {
  async function* bytes(): AsyncGenerator<Buffer> {
    for (const part of parts) {
      const file = partPath(bucket, upload.id, part);
      for await (const chunk of createReadStream(file, { highWaterMark: 1024 ** 2 })) yield chunk;
    }
  }
  try {
    await pipeline(bytes, createWriteStream(target, { flags: "wx", flush: true }));
  } catch (error) {
    await removeIfThere(target);
    throw error;
  }
}

function checksumOfParts(upload: Upload, parts: Part[]): Checksum | undefined {
  const algorithm = upload.checksumAlgorithm;
  if (!algorithm) return undefined;
  const values = parts.map((part) => {
    if (part.checksum?.algorithm !== algorithm) {
      throw new StoreError(
        400,
        "InvalidPart",
        `Part ${part.partNumber} came without its checksum.`,
      );
    }
    return part.checksum.value;
  });
  return compositeChecksum(algorithm, values);
}

export const completeUpload: Handler = async (context) => {
  const { store, request, signed } = context;
  const bucket = bucketOf(context);
  const key = keyOf(context);
  const uploadId = request.queryValue("uploadId") ?? "";
  await getUpload(bucket, uploadId, key);
  const root = await readXmlBody(request, signed, store.temporaryPath(), "CompleteMultipartUpload");
  if (!root) throw malformedXml();

  const object = await store.locks.run(uploadId, async () => {
    const upload = await getUpload(bucket, uploadId, key);
    const parts = chooseParts(root, await listParts(bucket, uploadId));
    const checksum = checksumOfParts(upload, parts);
    const md5 = createHash("md5");
    for (const part of parts) md5.update(Buffer.from(part.etag, "hex"));
    const temporary = store.temporaryPath();
    await joinParts(bucket, upload, parts, temporary);
    const made = await commitObject(
      store,
      bucket,
      {
        key,
        size: parts.reduce((sum, part) => sum + part.size, 0),
        etag: `${md5.digest("hex")}-${parts.length}`,
        headers: upload.headers,
        ...(checksum ? { checksum } : {}),
      },
      temporary,
      writeCondition(request, key),
    );
    await removeUpload(bucket, uploadId);
    return made;
  });
  sendXml(context, "CompleteMultipartUploadResult", [
    ["Location", `/${bucket.name}/${encodeURIComponent(key)}`],
    ["Bucket", bucket.name],
    ["Key", key],
    ["ETag", `"${object.etag}"`],
    ...checksumNode(object),
  ]);
};
