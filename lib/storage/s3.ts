import "server-only";
import type { Readable } from "node:stream";
import {
  AbortMultipartUploadCommand,
  CompleteMultipartUploadCommand,
  CopyObjectCommand,
  CreateBucketCommand,
  CreateMultipartUploadCommand,
  DeleteObjectCommand,
  GetObjectCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  PutBucketCorsCommand,
  PutObjectCommand,
  S3Client,
  S3ServiceException,
  UploadPartCommand,
} from "@aws-sdk/client-s3";
import { Upload } from "@aws-sdk/lib-storage";
import { getSignedUrl } from "@aws-sdk/s3-request-presigner";
import { env } from "@/lib/env";
import { PART_SIZE_BYTES, PRESIGNED_VALID_SECONDS } from "@/lib/uploads/constants";
import type { ObjectStore } from "./port";

function client(endpoint: string): S3Client {
  return new S3Client({
    endpoint,
    region: env().S3_REGION,
    forcePathStyle: env().S3_FORCE_PATH_STYLE,
    credentials: {
      accessKeyId: env().S3_ACCESS_KEY_ID,
      secretAccessKey: env().S3_SECRET_ACCESS_KEY,
    },
    // Otherwise a presigned PUT carries the checksum of an empty body.
    requestChecksumCalculation: "WHEN_REQUIRED",
    responseChecksumValidation: "WHEN_REQUIRED",
  });
}

const isMissing = (error: unknown) =>
  error instanceof S3ServiceException && error.$metadata.httpStatusCode === 404;

function s3Store(): ObjectStore {
  const Bucket = env().S3_BUCKET;
  const s3 = client(env().S3_ENDPOINT);
  const presigning = client(env().S3_PUBLIC_ENDPOINT);
  const expiresIn = PRESIGNED_VALID_SECONDS;

  const store: ObjectStore = {
    async put(Key, Body, ContentType) {
      await s3.send(new PutObjectCommand({ Bucket, Key, Body, ContentType }));
    },
    async putStream(Key, Body, ContentType) {
      await new Upload({
        client: s3,
        params: { Bucket, Key, Body, ContentType },
        partSize: PART_SIZE_BYTES,
      }).done();
    },
    async get(Key, range) {
      const Range = range && `bytes=${range.start}-${range.end}`;
      const out = await s3.send(new GetObjectCommand({ Bucket, Key, Range }));
      return {
        body: out.Body as Readable,
        info: {
          sizeBytes: out.ContentLength ?? 0,
          mediaType: out.ContentType ?? "application/octet-stream",
          etag: out.ETag ?? "",
        },
      };
    },
    async getBytes(Key) {
      const out = await s3.send(new GetObjectCommand({ Bucket, Key }));
      if (!out.Body) throw new Error(`${Key} has no body`);
      return Buffer.from(await out.Body.transformToByteArray());
    },
    async head(Key) {
      try {
        const out = await s3.send(new HeadObjectCommand({ Bucket, Key }));
        return {
          sizeBytes: out.ContentLength ?? 0,
          mediaType: out.ContentType ?? "application/octet-stream",
          etag: out.ETag ?? "",
        };
      } catch (error) {
        if (isMissing(error)) return null;
        throw error;
      }
    },
    async remove(Key) {
      await s3.send(new DeleteObjectCommand({ Bucket, Key }));
    },
    async copy(fromKey, Key) {
      await s3.send(
        new CopyObjectCommand({ Bucket, Key, CopySource: `${Bucket}/${encodeURI(fromKey)}` }),
      );
    },
    presignPut(Key, ContentType, ContentLength) {
      return getSignedUrl(
        presigning,
        new PutObjectCommand({ Bucket, Key, ContentType, ContentLength }),
        {
          expiresIn,
          signableHeaders: new Set(["content-type", "content-length"]),
        },
      );
    },
    presignPart(Key, UploadId, PartNumber) {
      return getSignedUrl(
        presigning,
        new UploadPartCommand({ Bucket, Key, UploadId, PartNumber }),
        { expiresIn },
      );
    },
    async startParts(Key, ContentType) {
      const out = await s3.send(new CreateMultipartUploadCommand({ Bucket, Key, ContentType }));
      if (!out.UploadId) throw new Error("the store gave no upload id");
      return out.UploadId;
    },
    async finishParts(Key, UploadId, parts) {
      await s3.send(
        new CompleteMultipartUploadCommand({
          Bucket,
          Key,
          UploadId,
          MultipartUpload: {
            Parts: parts.map((part) => ({ PartNumber: part.partNumber, ETag: part.etag })),
          },
        }),
      );
    },
    async abortParts(Key, UploadId) {
      try {
        await s3.send(new AbortMultipartUploadCommand({ Bucket, Key, UploadId }));
      } catch (error) {
        if (!isMissing(error)) throw error;
      }
    },
    async isUp() {
      await s3.send(new HeadBucketCommand({ Bucket }));
      return true;
    },
    async prepare(allowedOrigin) {
      try {
        await s3.send(new HeadBucketCommand({ Bucket }));
      } catch (error) {
        if (!isMissing(error)) throw error;
        await s3.send(new CreateBucketCommand({ Bucket }));
      }
      await s3.send(
        new PutBucketCorsCommand({
          Bucket,
          CORSConfiguration: {
            CORSRules: [
              {
                AllowedOrigins: [allowedOrigin],
                AllowedMethods: ["PUT", "GET"],
                AllowedHeaders: ["content-type"],
                ExposeHeaders: ["ETag"],
                MaxAgeSeconds: 3600,
              },
            ],
          },
        }),
      );
    },
  };
  return store;
}

const kept = globalThis as typeof globalThis & { riverlineStore?: ObjectStore };

/** The object store of this installation, through the S3 protocol. */
export function objectStore(): ObjectStore {
  kept.riverlineStore ??= s3Store();
  return kept.riverlineStore;
}
