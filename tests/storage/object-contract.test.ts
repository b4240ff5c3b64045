// Behaviour as the Amazon S3 API Reference describes it. With CONTRACT_S3_ENDPOINT,
// CONTRACT_S3_ACCESS_KEY_ID and CONTRACT_S3_SECRET_ACCESS_KEY the same tests ask another store.
import { createHash, randomBytes } from "node:crypto";
import { Readable } from "node:stream";
import {
  CopyObjectCommand,
  DeleteObjectCommand,
  DeleteObjectsCommand,
  GetObjectCommand,
  GetObjectRetentionCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  ListBucketsCommand,
  ListObjectsV2Command,
  PutObjectCommand,
  PutObjectRetentionCommand,
} from "@aws-sdk/client-s3";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { type ContractStore, openContractStore } from "./contract-store";
import { refusal } from "./refusal";

let store: ContractStore;
beforeAll(async () => {
  store = await openContractStore();
});
afterAll(() => store.close());

const put = (Key: string, Body: string | Uint8Array, more = {}) =>
  store.client.send(new PutObjectCommand({ Bucket: store.bucket, Key, Body, ...more }));
const get = (Key: string, more = {}) =>
  store.client.send(new GetObjectCommand({ Bucket: store.bucket, Key, ...more }));
const read = async (Key: string, more = {}) =>
  Buffer.from((await (await get(Key, more)).Body?.transformToByteArray()) ?? []);
const base64 = (algorithm: string, data: string) =>
  createHash(algorithm).update(data).digest("base64");

describe("put, get, head, delete", () => {
  it("gives back bytes, headers and metadata", async () => {
    const bytes = randomBytes(300_000);
    const answer = await put("plain/one", bytes, {
      ContentType: "image/tiff",
      CacheControl: "no-store",
      ContentDisposition: 'inline; filename="a.tif"',
      Metadata: { origin: "rig 4" },
    });
    expect(answer.ETag).toBe(`"${createHash("md5").update(bytes).digest("hex")}"`);
    expect((await read("plain/one")).equals(bytes)).toBe(true);
    const head = await store.client.send(
      new HeadObjectCommand({ Bucket: store.bucket, Key: "plain/one" }),
    );
    expect(head).toMatchObject({
      ContentLength: 300_000,
      ContentType: "image/tiff",
      CacheControl: "no-store",
      ContentDisposition: 'inline; filename="a.tif"',
      Metadata: { origin: "rig 4" },
      ETag: answer.ETag,
    });
  });

  it("keeps an empty object", async () => {
    await put("plain/empty", "");
    expect((await read("plain/empty")).length).toBe(0);
  });

  it("answers 404 for what is not there, and deletes without complaint", async () => {
    expect(await refusal(get("plain/none"))).toEqual({ status: 404, code: "NoSuchKey" });
    const head = new HeadObjectCommand({ Bucket: store.bucket, Key: "plain/none" });
    expect((await refusal(store.client.send(head))).status).toBe(404);
    await put("plain/gone", "x");
    for (let round = 0; round < 2; round += 1) {
      const Key = "plain/gone";
      await store.client.send(new DeleteObjectCommand({ Bucket: store.bucket, Key }));
    }
    expect((await refusal(get("plain/gone"))).status).toBe(404);
  });

  it("knows its buckets", async () => {
    await store.client.send(new HeadBucketCommand({ Bucket: store.bucket }));
    const missing = new HeadBucketCommand({ Bucket: `${store.bucket}-none` });
    expect((await refusal(store.client.send(missing))).status).toBe(404);
    const { Buckets } = await store.client.send(new ListBucketsCommand({}));
    expect(Buckets?.map(({ Name }) => Name)).toContain(store.bucket);
  });

  it.each(["a b+c&d=e?f#g", "ü/Größe µm.tif", "x//y", "../../etc/passwd", "~!*'()", "100%25"])(
    "takes the key %s as it is",
    async (name) => {
      const key = `odd/${name}`;
      await put(key, key);
      expect((await read(key)).toString()).toBe(key);
      const { Contents } = await store.client.send(
        new ListObjectsV2Command({ Bucket: store.bucket, Prefix: key }),
      );
      expect(Contents?.map(({ Key }) => Key)).toEqual([key]);
    },
  );

  it("overwrites as a whole while it is read", async () => {
    const [old, young] = [Buffer.alloc(200_000, 1), Buffer.alloc(150_000, 2)];
    await put("plain/race", old);
    const reads = Array.from({ length: 20 }, () => read("plain/race"));
    const [, ...found] = await Promise.all([put("plain/race", young), ...reads]);
    for (const bytes of found) expect(bytes.equals(old) || bytes.equals(young)).toBe(true);
    expect((await read("plain/race")).equals(young)).toBe(true);
  });
});

describe("ranges, conditions, overrides", () => {
  beforeAll(() => put("range/digits", "0123456789abcdefghij"));

  it.each([
    ["bytes=10-12", "abc", "bytes 10-12/20"],
    ["bytes=17-", "hij", "bytes 17-19/20"],
    ["bytes=-2", "ij", "bytes 18-19/20"],
    ["bytes=18-99", "ij", "bytes 18-19/20"],
  ])("reads %s", async (Range, text, ContentRange) => {
    const answer = await get("range/digits", { Range });
    expect(answer.$metadata.httpStatusCode).toBe(206);
    expect(answer.ContentRange).toBe(ContentRange);
    expect(await answer.Body?.transformToString()).toBe(text);
  });

  it("refuses a range outside the object", async () => {
    const outside = await refusal(get("range/digits", { Range: "bytes=20-30" }));
    expect(outside).toEqual({ status: 416, code: "InvalidRange" });
  });

  it("answers conditional reads", async () => {
    const { ETag, LastModified } = await get("range/digits");
    const status = async (more: object) => (await refusal(get("range/digits", more))).status;
    expect(await status({ IfNoneMatch: ETag })).toBe(304);
    expect(await status({ IfModifiedSince: LastModified })).toBe(304);
    expect(await status({ IfMatch: '"another"' })).toBe(412);
    expect(await status({ IfUnmodifiedSince: new Date(0) })).toBe(412);
    expect((await read("range/digits", { IfMatch: ETag })).length).toBe(20);
    expect((await read("range/digits", { IfNoneMatch: '"another"' })).length).toBe(20);
  });

  it("answers conditional writes", async () => {
    const first = await put("range/once", "1", { IfNoneMatch: "*" });
    expect((await refusal(put("range/once", "2", { IfNoneMatch: "*" }))).status).toBe(412);
    expect((await refusal(put("range/once", "2", { IfMatch: '"another"' }))).status).toBe(412);
    expect((await read("range/once")).toString()).toBe("1");
    await put("range/once", "3", { IfMatch: first.ETag });
    expect((await read("range/once")).toString()).toBe("3");
  });

  it("lets one of many simultaneous first writers through", async () => {
    const answers = await Promise.allSettled(
      Array.from({ length: 8 }, (_, n) => put("range/first", `${n}`, { IfNoneMatch: "*" })),
    );
    expect(answers.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  });

  it("overrides the headers of an answer", async () => {
    const answer = await get("range/digits", {
      ResponseContentType: "text/plain",
      ResponseContentDisposition: "attachment; filename*=UTF-8''Gr%C3%B6%C3%9Fe.txt",
    });
    expect(answer.ContentType).toBe("text/plain");
    expect(answer.ContentDisposition).toBe("attachment; filename*=UTF-8''Gr%C3%B6%C3%9Fe.txt");
  });
});

describe("digests", () => {
  it.each([
    ["MD5", { ContentMD5: base64("md5", "other") }],
    ["SHA-256", { ChecksumSHA256: base64("sha256", "other") }],
    ["CRC32", { ChecksumCRC32: "AAAAAA==" }],
  ])("refuses a wrong %s and keeps nothing", async (_name, digest) => {
    expect(await refusal(put("digest/wrong", "content", digest))).toMatchObject({ status: 400 });
    expect((await refusal(get("digest/wrong"))).status).toBe(404);
  });

  it("keeps a right SHA-256 and gives it back when asked", async () => {
    const ChecksumSHA256 = base64("sha256", "content");
    await put("digest/right", "content", { ChecksumSHA256, ContentMD5: base64("md5", "content") });
    const answer = await get("digest/right", { ChecksumMode: "ENABLED" });
    expect(answer.ChecksumSHA256).toBe(ChecksumSHA256);
  });

  // "123456789" has the CRC-32 CBF43926: check value of the RevEng catalogue of CRC algorithms.
  it("computes CRC32 as published", async () => {
    const answer = await put("digest/crc", "123456789", { ChecksumAlgorithm: "CRC32" });
    expect(answer.ChecksumCRC32).toBe(Buffer.from("cbf43926", "hex").toString("base64"));
  });

  it("takes the framing off a streamed body", async () => {
    const client = store.clientWith({
      requestChecksumCalculation: "WHEN_SUPPORTED",
      responseChecksumValidation: "WHEN_SUPPORTED",
    });
    const bytes = randomBytes(300_000);
    await client.send(
      new PutObjectCommand({
        Bucket: store.bucket,
        Key: "digest/stream",
        Body: Readable.from([bytes.subarray(0, 70_001), bytes.subarray(70_001)]),
        ContentLength: bytes.length,
      }),
    );
    client.destroy();
    expect((await read("digest/stream")).equals(bytes)).toBe(true);
    const head = await get("digest/stream");
    expect(head.ContentEncoding).toBeUndefined();
  });
});

describe("copy, delete many, list", () => {
  it("copies with its own or with new metadata", async () => {
    await put("copy/from ü", "content", { ContentType: "text/plain", Metadata: { a: "1" } });
    const copy = (Key: string, more = {}) => {
      const CopySource = `${store.bucket}/${encodeURIComponent("copy/from ü")}`;
      return store.client.send(
        new CopyObjectCommand({ Bucket: store.bucket, Key, CopySource, ...more }),
      );
    };
    await copy("copy/same");
    await copy("copy/new", { MetadataDirective: "REPLACE", ContentType: "image/png" });
    await put("copy/from ü", "changed");
    expect((await read("copy/same")).toString()).toBe("content");
    expect(await get("copy/same")).toMatchObject({
      ContentType: "text/plain",
      Metadata: { a: "1" },
    });
    expect(await get("copy/new")).toMatchObject({ ContentType: "image/png", Metadata: {} });
    expect((await refusal(copy("copy/no", { CopySourceIfMatch: '"other"' }))).status).toBe(412);
  });

  it("lists by prefix, delimiter and page", async () => {
    const keys = ["a", "b/1", "b/2", "b/c/1", "d", "e/1", "é", "\u{1F529}"].map(
      (key) => `l/${key}`,
    );
    await Promise.all(keys.map((key) => put(key, key)));
    const list = (more = {}) =>
      store.client.send(new ListObjectsV2Command({ Bucket: store.bucket, Prefix: "l/", ...more }));
    expect((await list()).Contents?.map(({ Key }) => Key)).toEqual(keys);

    const found: string[] = [];
    let ContinuationToken: string | undefined;
    do {
      const page = await list({ Delimiter: "/", MaxKeys: 2, ContinuationToken });
      expect(page.KeyCount).toBeLessThanOrEqual(2);
      for (const { Key } of page.Contents ?? []) found.push(Key ?? "");
      for (const { Prefix } of page.CommonPrefixes ?? []) found.push(Prefix ?? "");
      ContinuationToken = page.NextContinuationToken;
    } while (ContinuationToken);
    expect(found).toEqual(["l/a", "l/b/", "l/d", "l/e/", "l/é", "l/\u{1F529}"]);
    const later = await list({ StartAfter: "l/b/2" });
    expect(later.Contents?.[0]?.Key).toBe("l/b/c/1");

    const Objects = keys.slice(0, 4).map((Key) => ({ Key }));
    await store.client.send(
      new DeleteObjectsCommand({ Bucket: store.bucket, Delete: { Objects } }),
    );
    expect((await list()).Contents?.map(({ Key }) => Key)).toEqual(keys.slice(4));
  });
});

describe.skipIf(process.env.CONTRACT_S3_ENDPOINT)("what this store does not make", () => {
  it("is refused with 501 and changes nothing", async () => {
    await put("retention/object", "content");
    const place = { Bucket: store.bucket, Key: "retention/object" };
    const Retention = { Mode: "GOVERNANCE", RetainUntilDate: new Date() } as const;
    const client = store.clientWith({ maxAttempts: 1 });
    const asked = [
      () => client.send(new PutObjectRetentionCommand({ ...place, Retention })),
      () => client.send(new GetObjectRetentionCommand(place)),
      () => client.send(new PutObjectCommand({ ...place, Body: "x", ACL: "public-read" })),
      () => client.send(new GetObjectCommand({ ...place, VersionId: "1" })),
    ];
    for (const ask of asked) {
      expect(await refusal(ask())).toEqual({ status: 501, code: "NotImplemented" });
    }
    client.destroy();
    expect((await read("retention/object")).toString()).toBe("content");
  });
});
