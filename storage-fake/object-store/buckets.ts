import { corsRulesFromXml, corsRulesToXml } from "./cors";
import { StoreError, malformedXml } from "./errors";
import { type Handler, bucketOf, sendEmpty, sendXml } from "./operation";
import { readXmlBody } from "./small-body";

export const listBuckets: Handler = async (context) => {
  sendXml(context, "ListAllMyBucketsResult", [
    ["Owner", [["ID", "owner"]]],
    [
      "Buckets",
      context.store.allBuckets().map((bucket) => [
        "Bucket",
        [
          ["Name", bucket.name],
          ["CreationDate", bucket.createdAt],
        ],
      ]),
    ],
  ]);
};

export const createBucket: Handler = async (context) => {
  const { store, request, signed } = context;
  const name = request.bucket ?? "";
  // The body can only name a region, and there is one place here.
  await readXmlBody(request, signed, store.temporaryPath(), "CreateBucketConfiguration");
  await store.createBucket(name);
  request.response.setHeader("Location", `/${name}`);
  sendEmpty(context, 200);
};

export const headBucket: Handler = async (context) => {
  bucketOf(context);
  sendEmpty(context, 200);
};

export const deleteBucket: Handler = async (context) => {
  await context.store.deleteBucket(bucketOf(context).name);
  sendEmpty(context, 204);
};

export const putCors: Handler = async (context) => {
  const { store, request, signed } = context;
  const bucket = bucketOf(context);
  const root = await readXmlBody(request, signed, store.temporaryPath(), "CORSConfiguration");
  if (!root) throw malformedXml();
  await store.setCors(bucket.name, corsRulesFromXml(root));
  sendEmpty(context, 200);
};

export const getCors: Handler = async (context) => {
  const { cors } = bucketOf(context);
  if (cors.length === 0) {
    throw new StoreError(404, "NoSuchCORSConfiguration", "The bucket has no CORS rules.");
  }
  sendXml(context, "CORSConfiguration", corsRulesToXml(cors));
};

export const deleteCors: Handler = async (context) => {
  await context.store.setCors(bucketOf(context).name, []);
  sendEmpty(context, 204);
};
