import { writeCondition } from "./conditions";
import { copyObject } from "./copy-object";
import { sendChecksum } from "./get-object";
import { headersToKeep } from "./object-headers";
import { commitObject, findObject } from "./objects";
import { type Handler, bucketOf, keyOf, sendEmpty } from "./operation";
import { receiveBody } from "./receive-body";

export const putObject: Handler = async (context) => {
  const { store, request, signed } = context;
  if (request.header("x-amz-copy-source") !== undefined) return copyObject(context);
  const bucket = bucketOf(context);
  const key = keyOf(context);
  const check = writeCondition(request, key);
  // Asked twice: here to spare a long upload, and again at the moment of the commit.
  check(await findObject(bucket, key));
  const body = await receiveBody(request, signed, store.temporaryPath());
  const object = await commitObject(
    store,
    bucket,
    {
      key,
      size: body.size,
      etag: body.md5Hex,
      headers: headersToKeep(request),
      ...(body.checksum ? { checksum: body.checksum } : {}),
    },
    body.path,
    check,
  );
  request.response.setHeader("ETag", `"${object.etag}"`);
  sendChecksum(context, object);
  sendEmpty(context, 200);
};
