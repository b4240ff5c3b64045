import { randomBytes } from "node:crypto";
import { mkdtemp, rm } from "node:fs/promises";
import os from "node:os";
import path from "node:path";
import {
  CreateBucketCommand,
  DeleteBucketCommand,
  DeleteObjectsCommand,
  ListObjectsV2Command,
  S3Client,
  type S3ClientConfig,
} from "@aws-sdk/client-s3";
import { type Started, endProcess, startProcess } from "./start-process";

/** The store under test: ours on a free port, or the one that CONTRACT_S3_ENDPOINT names. */
export interface ContractStore {
  endpoint: string;
  credentials: { accessKeyId: string; secretAccessKey: string };
  /** Bucket of this run, empty at the start. */
  bucket: string;
  client: S3Client;
  clientWith(config: S3ClientConfig): S3Client;
  /** Folder of our own store; null for a foreign one. */
  folder: string | null;
  killAndRestart(): Promise<void>;
  close(): Promise<void>;
}

const MAIN = "storage-fake/main.ts";

async function emptyBucket(client: S3Client, bucket: string): Promise<void> {
  for (;;) {
    const { Contents } = await client.send(new ListObjectsV2Command({ Bucket: bucket }));
    if (!Contents?.length) return;
    const Objects = Contents.map(({ Key }) => ({ Key }));
    await client.send(new DeleteObjectsCommand({ Bucket: bucket, Delete: { Objects } }));
  }
}

export async function openContractStore(): Promise<ContractStore> {
  const foreign = process.env.CONTRACT_S3_ENDPOINT;
  const credentials = {
    accessKeyId: (foreign && process.env.CONTRACT_S3_ACCESS_KEY_ID) || "contract-key",
    secretAccessKey: (foreign && process.env.CONTRACT_S3_SECRET_ACCESS_KEY) || "contract-secret",
  };
  const folder = foreign ? null : await mkdtemp(path.join(os.tmpdir(), "object-store-"));
  const start = (port: string) =>
    startProcess(MAIN, ["--folder", folder ?? "", "--port", port], {
      S3_ACCESS_KEY_ID: credentials.accessKeyId,
      S3_SECRET_ACCESS_KEY: credentials.secretAccessKey,
    });
  let started: Started | null = foreign ? null : await start("0");
  const endpoint = foreign ?? started?.line.split(" ").at(-1) ?? "";
  const clientWith = (config: S3ClientConfig) =>
    new S3Client({
      endpoint,
      region: process.env.CONTRACT_S3_REGION ?? "us-east-1",
      credentials,
      forcePathStyle: true,
      requestChecksumCalculation: "WHEN_REQUIRED",
      responseChecksumValidation: "WHEN_REQUIRED",
      ...config,
    });
  const client = clientWith({});
  const bucket = `contract-${randomBytes(6).toString("hex")}`;
  await client.send(new CreateBucketCommand({ Bucket: bucket }));

  return {
    endpoint,
    credentials,
    bucket,
    client,
    clientWith,
    folder,
    async killAndRestart() {
      if (!started) return;
      await endProcess(started, "SIGKILL");
      started = await start(new URL(endpoint).port);
    },
    async close() {
      await emptyBucket(client, bucket);
      await client.send(new DeleteBucketCommand({ Bucket: bucket }));
      client.destroy();
      if (started) await endProcess(started);
      if (folder) await rm(folder, { recursive: true });
    },
  };
}
