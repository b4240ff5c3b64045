import { createHmac } from "node:crypto";
import { describe, expect, it } from "vitest";
import { ChunkedBody, type ChunkForm } from "../../storage-fake/object-store/chunked-body";

// Worked example of "Signature calculations for the authorization header: transferring payload in
// multiple chunks", Amazon S3 API Reference: 66 560 bytes "a", chunks of 65 536 and 1 024 bytes.
const secret = "wJalrXUtnFEMI/K7MDENG/bPxRfiCYEXAMPLEKEY";
const scope = "20130524/us-east-1/s3/aws4_request";
const signingKey = scope
  .split("/")
  .reduce<Buffer>(
    (key, part) => createHmac("sha256", key).update(part).digest(),
    Buffer.from(`AWS4${secret}`),
  );
const seed = "4f232c4386841ef735655705268965c44a0e4690baa4adea153f7db9fa80a0a9";
const signatures = [
  "ad80c730a21e5b8d04586a2213dd63b9a0e99e0e2307b0ade35a65485a288648",
  "0055627c9e194cb4542bae2aa5492e3c1575bbb81b612b7d234b86a503ef5497",
  "b6c6ea8a5354eaf15b3cb7646744f4275b71ea724fed81ceb9323e279d449df9",
];
const published = [
  `10000;chunk-signature=${signatures[0]}\r\n${"a".repeat(65_536)}\r\n`,
  `400;chunk-signature=${signatures[1]}\r\n${"a".repeat(1024)}\r\n`,
  `0;chunk-signature=${signatures[2]}\r\n\r\n`,
].join("");

async function decode(form: ChunkForm, text: string, step = 1000) {
  const body = new ChunkedBody(form, {
    payloadHash: "",
    amzDate: "20130524T000000Z",
    scope,
    signingKey,
    signature: seed,
  });
  const feed = async () => {
    for (let at = 0; at < text.length; at += step) body.write(text.slice(at, at + step));
    body.end();
  };
  const chunks: Buffer[] = [];
  await Promise.all([
    feed(),
    (async () => {
      for await (const chunk of body) chunks.push(chunk);
    })(),
  ]);
  return { text: Buffer.concat(chunks).toString(), trailers: body.trailers };
}

describe("signed chunks", () => {
  it.each([7, 1000, 100_000])("takes the published example in steps of %i", async (step) => {
    const { text } = await decode("signed", published, step);
    expect(text).toBe("a".repeat(66_560));
  });

  it("refuses a changed byte, a changed order and a missing end", async () => {
    await expect(decode("signed", published.replace("aaaa\r\n0", "aaab\r\n0"))).rejects.toThrow(
      "signature of a chunk",
    );
    await expect(decode("signed", published.replace("ad80", "ad81"))).rejects.toThrow("chunk");
    await expect(decode("signed", published.slice(0, 66_000))).rejects.toThrow("last chunk");
  });
});

describe("unsigned chunks with a trailer", () => {
  const body = "5\r\nhello\r\n1\r\n!\r\n0\r\nx-amz-checksum-crc32:AAAA\r\n\r\n";

  it.each([1, 3, 100])("takes the framing off in steps of %i", async (step) => {
    const { text, trailers } = await decode("unsigned-trailer", body, step);
    expect(text).toBe("hello!");
    expect(trailers.get("x-amz-checksum-crc32")).toBe("AAAA");
  });

  it.each([
    ["a length that is no number", "five\r\nhello\r\n0\r\n\r\n"],
    ["a chunk longer than its length", "4\r\nhello\r\n0\r\n\r\n"],
    ["a missing last chunk", "5\r\nhello\r\n"],
  ])("refuses %s", async (_name, text) => {
    await expect(decode("unsigned-trailer", text)).rejects.toMatchObject({ status: 400 });
  });
});
