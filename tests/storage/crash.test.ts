import { randomBytes } from "node:crypto";
import { readdir, writeFile } from "node:fs/promises";
import path from "node:path";
import {
  CompleteMultipartUploadCommand,
  CreateMultipartUploadCommand,
  GetObjectCommand,
  ListObjectsV2Command,
  PutObjectCommand,
  UploadPartCommand,
} from "@aws-sdk/client-s3";
import { getSignedUrl } from "@aws-sdk/s3-request-presigner";
import { request } from "node:http";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { type ContractStore, openContractStore } from "./contract-store";
import { startProcess } from "./start-process";

describe.skipIf(process.env.CONTRACT_S3_ENDPOINT)("a store that is killed", () => {
  let store: ContractStore;
  let folder: string;
  beforeAll(async () => {
    store = await openContractStore();
    folder = store.folder ?? "";
  });
  afterAll(() => store.close());

  async function files(): Promise<string[]> {
    const entries = await readdir(folder, { recursive: true, withFileTypes: true });
    return entries.filter((entry) => entry.isFile()).map((entry) => entry.name);
  }

  async function read(Key: string): Promise<string> {
    const { Body } = await store.client.send(new GetObjectCommand({ Bucket: store.bucket, Key }));
    return (await Body?.transformToString()) ?? "";
  }

  it("keeps what was acknowledged, drops what was half-written, and goes on with an upload", async () => {
    const place = { Bucket: store.bucket, Key: "object" };
    await store.client.send(new PutObjectCommand({ ...place, Body: "acknowledged" }));
    const parts = { Bucket: store.bucket, Key: "parts" };
    const { UploadId } = await store.client.send(new CreateMultipartUploadCommand(parts));
    const { ETag } = await store.client.send(
      new UploadPartCommand({ ...parts, UploadId, PartNumber: 1, Body: "part" }),
    );
    const before = (await files()).sort();

    const url = await getSignedUrl(store.client, new PutObjectCommand(place));
    const half = request(url, { method: "PUT", headers: { "content-length": 1_000_000 } });
    const broken = new Promise((resolve) => half.once("error", resolve));
    half.write(randomBytes(400_000));
    await expect.poll(async () => (await files()).length).toBeGreaterThan(before.length);
    await store.killAndRestart();
    await broken;

    expect((await files()).sort()).toEqual(before);
    expect(await read("object")).toBe("acknowledged");
    await store.client.send(
      new CompleteMultipartUploadCommand({
        ...parts,
        UploadId,
        MultipartUpload: { Parts: [{ PartNumber: 1, ETag }] },
      }),
    );
    expect(await read("parts")).toBe("part");
  });

  it("sweeps data that no sidecar names and still lists its keys", async () => {
    const objects = path.join(folder, "buckets", store.bucket, "objects");
    const [shard = ""] = await readdir(objects);
    const [sidecar = ""] = (await readdir(path.join(objects, shard))).filter((name) =>
      name.endsWith(".json"),
    );
    const before = (await files()).length;
    await writeFile(path.join(objects, shard, sidecar.replace(".json", ".orphan")), "orphan");
    await store.killAndRestart();
    expect(await files()).toHaveLength(before);
    const { Contents } = await store.client.send(
      new ListObjectsV2Command({ Bucket: store.bucket }),
    );
    expect(Contents?.map(({ Key }) => Key)).toEqual(["object", "parts"]);
  });

  it("cleans up after a client that breaks off", async () => {
    const before = (await files()).length;
    const place = { Bucket: store.bucket, Key: "object" };
    const url = await getSignedUrl(store.client, new PutObjectCommand(place));
    const half = request(url, { method: "PUT", headers: { "content-length": 1_000_000 } });
    half.once("error", () => undefined);
    half.write(randomBytes(400_000));
    await expect.poll(async () => (await files()).length).toBeGreaterThan(before);
    half.destroy();
    await expect.poll(async () => (await files()).length).toBe(before);
    expect(await read("object")).toBe("acknowledged");
  });

  it("lets no second store work on its folder, and starts only with keys", async () => {
    const keys = { S3_ACCESS_KEY_ID: "a", S3_SECRET_ACCESS_KEY: "b" };
    await expect(
      startProcess("storage-fake/main.ts", ["--folder", folder, "--port", "0"], keys),
    ).rejects.toThrow("already running on the folder");
    const none = { S3_ACCESS_KEY_ID: "", S3_SECRET_ACCESS_KEY: "" };
    await expect(
      startProcess("storage-fake/main.ts", ["--folder", folder, "--port", "0"], none),
    ).rejects.toThrow("S3_ACCESS_KEY_ID");
  });

  it("answers its health path without a signature", async () => {
    const answer = await fetch(`${store.endpoint}/_fake/health`);
    expect(await answer.json()).toEqual({ status: "ok" });
  });
});
