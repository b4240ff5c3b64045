import { checksumAlgorithm } from "./checksum";
import { StoreError, notImplemented } from "./errors";
import { checksumNode, sendChecksum } from "./get-object";
import { compareKeys } from "./keys";
import {
  createUpload,
  getUpload,
  keepPart,
  listParts,
  openUploads,
  removeUpload,
} from "./multipart";
import { headersToKeep } from "./object-headers";
import { type Handler, bucketOf, keyOf, sendEmpty, sendXml, wholeNumber } from "./operation";
import { receiveBody } from "./receive-body";
import type { XmlNode } from "./xml";

const MAX_PART_NUMBER = 10_000;

export const beginUpload: Handler = async (context) => {
  const { store, request } = context;
  const bucket = bucketOf(context);
  const algorithm = request.header("x-amz-checksum-algorithm");
  const type = request.header("x-amz-checksum-type");
  if (type !== undefined && type !== "COMPOSITE") throw notImplemented(`the checksum type ${type}`);
  const upload = await createUpload(store, bucket, {
    key: keyOf(context),
    headers: headersToKeep(request),
    ...(algorithm === undefined ? {} : { checksumAlgorithm: checksumAlgorithm(algorithm) }),
  });
  sendXml(context, "InitiateMultipartUploadResult", [
    ["Bucket", bucket.name],
    ["Key", upload.key],
    ["UploadId", upload.id],
  ]);
};

export const uploadPart: Handler = async (context) => {
  const { store, request, signed } = context;
  const bucket = bucketOf(context);
  if (request.header("x-amz-copy-source") !== undefined) throw notImplemented("copying a part");
  const partNumber = Number(request.queryValue("partNumber"));
  if (!Number.isInteger(partNumber) || partNumber < 1 || partNumber > MAX_PART_NUMBER) {
    throw new StoreError(400, "InvalidArgument", "The part number must be from 1 to 10000.");
  }
  const { id } = await getUpload(bucket, request.queryValue("uploadId") ?? "", keyOf(context));
  const body = await receiveBody(request, signed, store.temporaryPath());
  const part = await keepPart(store, bucket, id, partNumber, body);
  request.response.setHeader("ETag", `"${part.etag}"`);
  sendChecksum(context, part);
  sendEmpty(context, 200);
};

export const abortUpload: Handler = async (context) => {
  const { store, request } = context;
  const bucket = bucketOf(context);
  const uploadId = request.queryValue("uploadId") ?? "";
  await store.locks.run(uploadId, async () => {
    await getUpload(bucket, uploadId, keyOf(context));
    await removeUpload(bucket, uploadId);
  });
  sendEmpty(context, 204);
};

export const showParts: Handler = async (context) => {
  const bucket = bucketOf(context);
  const uploadId = context.request.queryValue("uploadId") ?? "";
  const upload = await getUpload(bucket, uploadId, keyOf(context));
  const bounds = { fallback: 1000, least: 0, most: 1000 };
  const limit = wholeNumber(context, "max-parts", bounds);
  const after = wholeNumber(context, "part-number-marker", { ...bounds, fallback: 0, most: 1e9 });
  const rest = (await listParts(bucket, uploadId)).filter((part) => part.partNumber > after);
  const shown = rest.slice(0, limit);
  sendXml(context, "ListPartsResult", [
    ["Bucket", bucket.name],
    ["Key", upload.key],
    ["UploadId", upload.id],
    ["PartNumberMarker", after],
    ["NextPartNumberMarker", shown.at(-1)?.partNumber ?? after],
    ["MaxParts", limit],
    ["IsTruncated", String(rest.length > shown.length)],
    ["StorageClass", "STANDARD"],
    ...shown.map((part): XmlNode => [
      "Part",
      [
        ["PartNumber", part.partNumber],
        ["LastModified", part.lastModified],
        ["ETag", `"${part.etag}"`],
        ["Size", part.size],
        ...checksumNode(part),
      ],
    ]),
  ]);
};

export const showUploads: Handler = async (context) => {
  const { request } = context;
  const bucket = bucketOf(context);
  const prefix = request.queryValue("prefix") ?? "";
  const keyMarker = request.queryValue("key-marker") ?? "";
  const idMarker = request.queryValue("upload-id-marker") ?? "";
  const limit = wholeNumber(context, "max-uploads", { fallback: 1000, least: 1, most: 1000 });
  const rest = (await openUploads(bucket))
    .filter((upload) => upload.key.startsWith(prefix))
    .sort((a, b) => compareKeys(a.key, b.key) || compareKeys(a.id, b.id))
    .filter((upload) => {
      const order = keyMarker === "" ? 1 : compareKeys(upload.key, keyMarker);
      return order > 0 || (order === 0 && idMarker !== "" && compareKeys(upload.id, idMarker) > 0);
    });
  const shown = rest.slice(0, limit);
  const last = shown.at(-1);
  const more = rest.length > shown.length;
  sendXml(context, "ListMultipartUploadsResult", [
    ["Bucket", bucket.name],
    ["Prefix", prefix],
    ["KeyMarker", keyMarker],
    ["UploadIdMarker", idMarker],
    ["NextKeyMarker", more ? (last?.key ?? "") : ""],
    ["NextUploadIdMarker", more ? (last?.id ?? "") : ""],
    ["MaxUploads", limit],
    ["IsTruncated", String(more)],
    ...shown.map((upload): XmlNode => [
      "Upload",
      [
        ["Key", upload.key],
        ["UploadId", upload.id],
        ["Initiated", upload.initiatedAt],
        ["StorageClass", "STANDARD"],
      ],
    ]),
  ]);
};
