// Signature Version 4 as the AWS documentation describes it; CONTRACT_S3_ENDPOINT names another store.
import { request as httpRequest } from "node:http";
import {
  DeleteBucketCorsCommand,
  GetBucketCorsCommand,
  GetObjectCommand,
  PutBucketCorsCommand,
  PutObjectCommand,
  S3Client,
} from "@aws-sdk/client-s3";
import { getSignedUrl } from "@aws-sdk/s3-request-presigner";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { type ContractStore, openContractStore } from "./contract-store";
import { refusal } from "./refusal";

let store: ContractStore;
let place: { Bucket: string; Key: string };
beforeAll(async () => {
  store = await openContractStore();
  place = { Bucket: store.bucket, Key: "signed/object one.txt" };
  await store.client.send(new PutObjectCommand({ ...place, Body: "content" }));
});
afterAll(() => store.close());

async function readWith(client: S3Client) {
  const answer = await refusal(client.send(new GetObjectCommand(place)));
  client.destroy();
  return answer;
}

const address = (expiresIn = 60) =>
  getSignedUrl(store.client, new GetObjectCommand(place), { expiresIn });

describe("signed headers", () => {
  it("refuses a wrong secret and an unknown key", async () => {
    const { accessKeyId } = store.credentials;
    const wrong = store.clientWith({ credentials: { accessKeyId, secretAccessKey: "wrong" } });
    expect(await readWith(wrong)).toEqual({ status: 403, code: "SignatureDoesNotMatch" });
    const unknown = store.clientWith({
      credentials: { accessKeyId: "unknown", secretAccessKey: "wrong" },
    });
    expect(await readWith(unknown)).toEqual({ status: 403, code: "InvalidAccessKeyId" });
  });

  it("refuses a clock that is 20 minutes off", async () => {
    // The client would mend its clock from the answer and try again.
    const late = store.clientWith({ systemClockOffset: -20 * 60_000, maxAttempts: 1 });
    expect(await readWith(late)).toEqual({ status: 403, code: "RequestTimeTooSkewed" });
  });

  it("refuses a body other than the signed one", async () => {
    const client = store.clientWith({});
    client.middlewareStack.add(
      (next) => (args) => {
        if (typeof args.request === "object" && args.request && "body" in args.request) {
          args.request.body = "CONTENT";
        }
        return next(args);
      },
      { step: "finalizeRequest", priority: "low" },
    );
    const Key = "signed/changed";
    const put = client.send(new PutObjectCommand({ ...place, Key, Body: "content" }));
    expect(await refusal(put)).toMatchObject({ status: 400 });
    client.destroy();
  });

  it("refuses anonymous requests", async () => {
    for (const method of ["GET", "PUT", "DELETE", "HEAD"]) {
      const url = `${store.endpoint}/${store.bucket}/signed/object%20one.txt`;
      expect((await fetch(url, { method })).status).toBe(403);
    }
    expect((await fetch(`${store.endpoint}/${store.bucket}?list-type=2`)).status).toBe(403);
  });
});

describe("presigned addresses", () => {
  it("reads, and refuses a changed address", async () => {
    const url = await address();
    expect(await (await fetch(url)).text()).toBe("content");
    const changes = [
      url.replace("one.txt", "two.txt"),
      url.replace("X-Amz-Expires=60", "X-Amz-Expires=600"),
      `${url}&response-content-type=text%2Fhtml`,
    ];
    for (const changed of changes) expect((await fetch(changed)).status).toBe(403);
    expect((await fetch(url, { method: "DELETE" })).status).toBe(403);
    const extra = await fetch(url, { headers: { "x-amz-meta-a": "1" } });
    expect(extra.status).toBe(403);
  });

  it("ends when its time is over", async () => {
    const url = await address(1);
    await new Promise((resolve) => setTimeout(resolve, 2100));
    const answer = await fetch(url);
    expect(answer.status).toBe(403);
    expect(await answer.text()).toContain("expired");
  });

  it("writes only what was agreed", async () => {
    const Key = "signed/put";
    const url = await getSignedUrl(
      store.client,
      new PutObjectCommand({ ...place, Key, ContentType: "image/png", ContentLength: 4 }),
      { expiresIn: 60, signableHeaders: new Set(["content-type", "content-length"]) },
    );
    expect(new URL(url).searchParams.get("x-amz-checksum-crc32")).toBeNull();
    const put = (type: string, body: string) =>
      fetch(url, { method: "PUT", headers: { "content-type": type }, body });
    expect((await put("text/html", "four")).status).toBe(403);
    expect((await put("image/png", "longer")).status).toBe(403);
    expect((await put("image/png", "four")).status).toBe(200);
    const { ContentType } = await store.client.send(new GetObjectCommand({ ...place, Key }));
    expect(ContentType).toBe("image/png");
  });
});

describe("requests from a browser", () => {
  const origin = "http://bench.example:3000";
  const preflight = (method: string, from = origin) =>
    fetch(`${store.endpoint}/${store.bucket}/signed/put`, {
      method: "OPTIONS",
      headers: {
        Origin: from,
        "Access-Control-Request-Method": method,
        "Access-Control-Request-Headers": "content-type",
      },
    });

  it("follow the rules of the bucket", async () => {
    expect((await preflight("PUT")).status).toBe(403);
    const rule = {
      AllowedOrigins: [origin],
      AllowedMethods: ["PUT", "GET"],
      AllowedHeaders: ["*"],
      ExposeHeaders: ["ETag"],
      MaxAgeSeconds: 600,
    };
    await store.client.send(
      new PutBucketCorsCommand({ Bucket: store.bucket, CORSConfiguration: { CORSRules: [rule] } }),
    );
    const { CORSRules } = await store.client.send(
      new GetBucketCorsCommand({ Bucket: store.bucket }),
    );
    expect(CORSRules).toEqual([rule]);

    const allowed = await preflight("PUT");
    expect(allowed.status).toBe(200);
    expect(allowed.headers.get("access-control-allow-origin")).toBe(origin);
    expect(allowed.headers.get("access-control-allow-headers")).toBe("content-type");
    expect((await preflight("DELETE")).status).toBe(403);
    expect((await preflight("PUT", "http://other.example")).status).toBe(403);

    const url = new URL(await address());
    const headers = await new Promise<NodeJS.Dict<string | string[]>>((resolve, reject) => {
      httpRequest(url, { headers: { Origin: origin } }, (answer) => {
        answer.resume();
        resolve(answer.headers);
      })
        .on("error", reject)
        .end();
    });
    expect(headers["access-control-allow-origin"]).toBe(origin);
    expect(headers["access-control-expose-headers"]).toBe("ETag");
    await store.client.send(new DeleteBucketCorsCommand({ Bucket: store.bucket }));
    expect((await preflight("PUT")).status).toBe(403);
  });
});
