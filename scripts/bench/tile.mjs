import { GetObjectCommand, S3Client } from "@aws-sdk/client-s3";
import { getSignedUrl } from "@aws-sdk/s3-request-presigner";
import { askWell } from "./http-client.mjs";
import { inPairs, timeOf } from "./measure.mjs";

const TILE = "5120,5120,512,512/512,512/0/default.jpg";

function presigned(settings, key) {
  const store = new S3Client({
    endpoint: settings.S3_ENDPOINT,
    region: settings.S3_REGION,
    forcePathStyle: true,
    credentials: {
      accessKeyId: settings.S3_ACCESS_KEY_ID,
      secretAccessKey: settings.S3_SECRET_ACCESS_KEY,
    },
  });
  return getSignedUrl(store, new GetObjectCommand({ Bucket: settings.S3_BUCKET, Key: key }));
}

/** One tile through the portal, which asks who may see it, against the same object from the store. */
export async function measureTile(portal, { imageId, uploadId }) {
  const address = await presigned(portal.settings, `tiles/${uploadId}/${TILE}`);
  const asked = () =>
    askWell(`${portal.base}/api/iiif/${imageId}/${TILE}`, { headers: { cookie: portal.cookie } });
  const straight = () => askWell(address);
  if (!(await asked()).bytes.equals((await straight()).bytes)) {
    throw new Error("the portal and the store gave different tiles");
  }
  const found = await inPairs(
    { product: () => timeOf(asked), yardstick: () => timeOf(straight) },
    { pairs: 200, warmUps: 50 },
  );
  const what = "one tile asked of the portal, signed in and allowed";
  return { letter: "b", what, against: "the same object straight from the store", ...found };
}
