import {
  CreateBucketCommand,
  HeadBucketCommand,
  NotFound,
  PutBucketCorsCommand,
  S3Client,
} from "@aws-sdk/client-s3";
import { env } from "../lib/env";

/**
 * Makes the bucket in the local object store, and lets pages of the portal send their uploads to
 * it. For an S3 service elsewhere, whoever runs that service does the same once.
 */
const settings = env();
const client = new S3Client({
  endpoint: settings.S3_ENDPOINT,
  region: settings.S3_REGION,
  forcePathStyle: settings.S3_FORCE_PATH_STYLE,
  credentials: {
    accessKeyId: settings.S3_ACCESS_KEY_ID,
    secretAccessKey: settings.S3_SECRET_ACCESS_KEY,
  },
  requestChecksumCalculation: "WHEN_REQUIRED",
  responseChecksumValidation: "WHEN_REQUIRED",
});
const bucket = { Bucket: settings.S3_BUCKET };

try {
  await client.send(new HeadBucketCommand(bucket));
} catch (error) {
  if (!(error instanceof NotFound)) throw error;
  await client.send(new CreateBucketCommand(bucket));
}
await client.send(
  new PutBucketCorsCommand({
    ...bucket,
    CORSConfiguration: {
      CORSRules: [
        {
          AllowedOrigins: [new URL(settings.NEXTAUTH_URL).origin],
          AllowedMethods: ["GET", "PUT", "HEAD"],
          AllowedHeaders: ["*"],
          ExposeHeaders: ["ETag"],
          MaxAgeSeconds: 3600,
        },
      ],
    },
  }),
);
