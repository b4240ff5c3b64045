import { writeCondition } from "./conditions";
import { StoreError, malformedXml, notImplemented } from "./errors";
import { deleteObject } from "./objects";
import { type Handler, bucketOf, keyOf, sendEmpty, sendXml } from "./operation";
import { readXmlBody } from "./small-body";
import { childText, childrenNamed } from "./xml";

const MAX_KEYS = 1000;

export const removeObject: Handler = async (context) => {
  const { store, request } = context;
  const key = keyOf(context);
  await deleteObject(store, bucketOf(context), key, writeCondition(request, key));
  sendEmpty(context, 204);
};

export const removeObjects: Handler = async (context) => {
  const { store, request, signed } = context;
  const bucket = bucketOf(context);
  if (
    request.header("content-md5") === undefined &&
    !request.amzNames().some((name) => name.startsWith("x-amz-checksum-")) &&
    request.header("x-amz-trailer") === undefined
  ) {
    throw new StoreError(400, "InvalidRequest", "Content-MD5 or a checksum must be given.");
  }
  const root = await readXmlBody(request, signed, store.temporaryPath(), "Delete");
  const listed = root ? childrenNamed(root, "Object") : [];
  if (!root || listed.length === 0 || listed.length > MAX_KEYS) throw malformedXml();
  const keys = listed.map((element) => {
    const extra = element.children.find((child) => child.name !== "Key");
    if (extra) throw notImplemented(`${extra.name} when deleting several objects`);
    const key = childText(element, "Key");
    if (!key) throw malformedXml();
    return key;
  });
  for (const key of keys) await deleteObject(store, bucket, key, () => undefined);
  const quiet = childText(root, "Quiet") === "true";
  sendXml(context, "DeleteResult", quiet ? [] : keys.map((key) => ["Deleted", [["Key", key]]]));
};
