// Behaviour as the Amazon S3 API Reference describes it; CONTRACT_S3_ENDPOINT names another store.
import { createHash, randomBytes } from "node:crypto";
import { Readable } from "node:stream";
import {
  AbortMultipartUploadCommand,
  CompleteMultipartUploadCommand,
  CreateMultipartUploadCommand,
  GetObjectCommand,
  ListMultipartUploadsCommand,
  ListPartsCommand,
  UploadPartCommand,
} from "@aws-sdk/client-s3";
import { Upload } from "@aws-sdk/lib-storage";
import { getSignedUrl } from "@aws-sdk/s3-request-presigner";
import { afterAll, beforeAll, expect, it } from "vitest";
import { type ContractStore, openContractStore } from "./contract-store";
import { refusal } from "./refusal";

const MIB = 1024 ** 2;
const bytes = randomBytes(12 * MIB);
const pieces = [
  bytes.subarray(0, 5 * MIB),
  bytes.subarray(5 * MIB, 10 * MIB),
  bytes.subarray(10 * MIB),
];

let store: ContractStore;
beforeAll(async () => {
  store = await openContractStore();
});
afterAll(() => store.close());

async function begin(Key: string): Promise<{ Bucket: string; Key: string; UploadId: string }> {
  const { UploadId } = await store.client.send(
    new CreateMultipartUploadCommand({ Bucket: store.bucket, Key, ContentType: "image/tiff" }),
  );
  if (!UploadId) throw new Error("The store gave no upload id.");
  return { Bucket: store.bucket, Key, UploadId };
}

type Place = Awaited<ReturnType<typeof begin>>;

async function send(place: Place, PartNumber: number, Body: Buffer) {
  const { ETag } = await store.client.send(new UploadPartCommand({ ...place, PartNumber, Body }));
  return { PartNumber, ETag };
}

const complete = (place: Place, Parts: { PartNumber: number; ETag?: string }[], more = {}) =>
  store.client.send(
    new CompleteMultipartUploadCommand({ ...place, MultipartUpload: { Parts }, ...more }),
  );

async function readBack(Key: string): Promise<Buffer> {
  const { Body } = await store.client.send(new GetObjectCommand({ Bucket: store.bucket, Key }));
  return Buffer.from((await Body?.transformToByteArray()) ?? []);
}

const md5 = (data: Buffer) => createHash("md5").update(data).digest();

it("joins parts sent out of order, one of them twice", async () => {
  const place = await begin("joined");
  const third = await send(place, 3, pieces[2] ?? Buffer.alloc(0));
  await send(place, 1, Buffer.alloc(5 * MIB, 7));
  const first = await send(place, 1, pieces[0] ?? Buffer.alloc(0));
  const second = await send(place, 2, pieces[1] ?? Buffer.alloc(0));

  const page = await store.client.send(new ListPartsCommand({ ...place, MaxParts: 2 }));
  expect(page.Parts?.map(({ PartNumber, Size }) => [PartNumber, Size])).toEqual([
    [1, 5 * MIB],
    [2, 5 * MIB],
  ]);
  expect(page.IsTruncated).toBe(true);
  const rest = await store.client.send(
    new ListPartsCommand({ ...place, PartNumberMarker: page.NextPartNumberMarker }),
  );
  expect(rest.Parts?.map(({ PartNumber }) => PartNumber)).toEqual([3]);

  const { ETag } = await complete(place, [first, second, third]);
  expect(ETag).toBe(`"${md5(Buffer.concat(pieces.map(md5))).toString("hex")}-3"`);
  expect((await readBack("joined")).equals(bytes)).toBe(true);
  expect((await refusal(send(place, 4, Buffer.from("late")))).code).toBe("NoSuchUpload");
});

it("refuses lists that do not fit what arrived, and keeps the upload", async () => {
  const place = await begin("refused");
  const first = await send(place, 1, Buffer.alloc(5 * MIB));
  const small = await send(place, 2, Buffer.from("small"));
  const last = await send(place, 3, Buffer.from("last"));
  const code = async (parts: Parameters<typeof complete>[1]) =>
    (await refusal(complete(place, parts))).code;
  expect(await code([first, { PartNumber: 9, ETag: last.ETag }])).toBe("InvalidPart");
  expect(await code([{ PartNumber: 1, ETag: last.ETag }])).toBe("InvalidPart");
  expect(await code([last, first])).toBe("InvalidPartOrder");
  expect(await code([first, small, last])).toBe("EntityTooSmall");
  expect((await refusal(readBack("refused"))).status).toBe(404);
  await complete(place, [first, last]);
  const conditional = await begin("refused");
  const again = await send(conditional, 1, Buffer.from("again"));
  const answer = refusal(complete(conditional, [again], { IfNoneMatch: "*" }));
  expect((await answer).status).toBe(412);
  await store.client.send(new AbortMultipartUploadCommand(conditional));
});

it("lists open uploads and forgets aborted ones", async () => {
  const kept = await begin("open/a");
  const aborted = await begin("open/b");
  await send(aborted, 1, Buffer.from("part"));
  await store.client.send(new AbortMultipartUploadCommand(aborted));
  const { Uploads } = await store.client.send(
    new ListMultipartUploadsCommand({ Bucket: store.bucket, Prefix: "open/" }),
  );
  expect(Uploads?.map(({ Key, UploadId }) => [Key, UploadId])).toEqual([["open/a", kept.UploadId]]);
  expect((await refusal(complete(aborted, [{ PartNumber: 1 }]))).code).toBe("NoSuchUpload");
  await store.client.send(new AbortMultipartUploadCommand(kept));
});

it("takes parts by presigned address", async () => {
  const place = await begin("presigned-parts");
  const url = await getSignedUrl(store.client, new UploadPartCommand({ ...place, PartNumber: 1 }), {
    expiresIn: 60,
  });
  const answer = await fetch(url, { method: "PUT", body: new Uint8Array(bytes.subarray(0, MIB)) });
  expect(answer.status).toBe(200);
  await complete(place, [{ PartNumber: 1, ETag: answer.headers.get("etag") ?? "" }]);
  expect((await readBack("presigned-parts")).equals(bytes.subarray(0, MIB))).toBe(true);
});

it.each(["WHEN_REQUIRED", "WHEN_SUPPORTED"] as const)(
  "takes a streamed upload of unknown length with checksums %s",
  async (requestChecksumCalculation) => {
    const client = store.clientWith({ requestChecksumCalculation });
    const Key = `streamed/${requestChecksumCalculation}`;
    const Body = Readable.from(pieces);
    await new Upload({ client, params: { Bucket: store.bucket, Key, Body } }).done();
    client.destroy();
    expect((await readBack(Key)).equals(bytes)).toBe(true);
  },
);
