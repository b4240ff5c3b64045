import { eq } from "drizzle-orm";
import sharp from "sharp";
import { describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { images, jobs, requestFiles, storedObjects } from "@/db/schema";
import { sha256Hex } from "@/lib/canonical-json";
import { takeInImageJob } from "@/lib/images/take-in-image-job";
import { objectStore } from "@/lib/storage/s3";
import { originalKey } from "@/lib/uploads/fetch-original";
import { finishUpload } from "@/lib/uploads/finish-upload";
import { getUpload, listUnfinished } from "@/lib/uploads/get-upload";
import { startUpload } from "@/lib/uploads/start-upload";
import { HTML, pngOf, SVG } from "../../helpers/bad-files";
import { aCase } from "../../helpers/cases";
import { asInvestigator, asRequester } from "../../helpers/people";
import { put, sendAndTakeIn, startInput, uploadRow } from "../../helpers/send-file";

const noise = (width: number, height: number) =>
  sharp({
    create: {
      width,
      height,
      channels: 3,
      background: "#888",
      noise: { type: "gaussian", mean: 128, sigma: 40 },
    },
  });
const half = (bytes: Buffer) => bytes.subarray(0, Math.floor(bytes.byteLength / 2));

type Bad = { what: string; fileName: string; bytes: () => Promise<Buffer> | Buffer; says: RegExp };
const BAD: Bad[] = [
  {
    what: "a drawing named as a picture",
    fileName: "face.png",
    bytes: () => SVG,
    says: /SVG drawing/,
  },
  {
    what: "a web page named as a picture",
    fileName: "face.png",
    bytes: () => HTML,
    says: /web page/,
  },
  {
    what: "text named as a picture",
    fileName: "face.tif",
    bytes: () => Buffer.from("not a picture at all"),
    says: /not a file of a known type/,
  },
  {
    what: "a PDF named as a picture",
    fileName: "face.jpg",
    bytes: () => Buffer.from("%PDF-1.7\n1 0 obj\n<<>>\nendobj\n%%EOF\n"),
    says: /PDF/,
  },
  {
    what: "one picture type under another's name",
    fileName: "face.jpg",
    bytes: () => noise(40, 30).png().toBuffer(),
    says: /holds a PNG under another type's name/,
  },
  {
    what: "a JPEG that ends too early",
    fileName: "face.jpg",
    bytes: async () => half(await noise(900, 700).jpeg().toBuffer()),
    says: /damaged or ends too early/,
  },
  {
    what: "a PNG that ends too early",
    fileName: "face.png",
    bytes: async () => half(await noise(900, 700).png().toBuffer()),
    says: /damaged or ends too early/,
  },
  {
    what: "a TIFF that ends too early",
    fileName: "face.tif",
    bytes: async () => half(await noise(900, 700).tiff({ compression: "none" }).toBuffer()),
    says: /damaged or ends too early|cannot be read/,
  },
  {
    what: "two gigapixels",
    fileName: "face.png",
    bytes: () => pngOf(50_000, 40_000, 1),
    says: /50 000 × 40 000 pixels.*At most 400 are taken/,
  },
  {
    what: "a small file that unpacks to 441 megapixels",
    fileName: "face.png",
    bytes: () => pngOf(21_000, 21_000, 21_000),
    says: /441 megapixels/,
  },
  {
    what: "samples of floating point",
    fileName: "face.tif",
    bytes: () => floatTiff(),
    says: /samples of type float/,
  },
];

/** A single-strip TIFF of 30 × 20 samples of 32 bit floating point (TIFF 6.0, sections 2 and 19). */
function floatTiff(): Buffer {
  const [width, height] = [30, 20];
  const entries: [tag: number, type: number, value: number][] = [
    [256, 3, width],
    [257, 3, height],
    [258, 3, 32],
    [259, 3, 1],
    [262, 3, 1],
    [273, 4, 8],
    [277, 3, 1],
    [278, 3, height],
    [279, 4, width * height * 4],
    [339, 3, 3],
  ];
  const at = 8 + width * height * 4;
  const file = Buffer.alloc(at + 2 + entries.length * 12 + 4);
  file.write("II", "latin1");
  file.writeUInt16LE(42, 2);
  file.writeUInt32LE(at, 4);
  file.writeUInt16LE(entries.length, at);
  for (const [i, [tag, type, value]] of entries.entries()) {
    const entry = at + 2 + i * 12;
    file.writeUInt16LE(tag, entry);
    file.writeUInt16LE(type, entry + 2);
    file.writeUInt32LE(1, entry + 4);
    file.writeUInt32LE(value, entry + 8);
  }
  return file;
}

async function picturesOf(caseId: string) {
  return database().select().from(images).where(eq(images.caseId, caseId));
}

describe("files that cannot be taken", () => {
  it.each(BAD)("$what: refused in words, and nothing of it kept", async (bad) => {
    const caseId = await aCase();
    const bytes = await bad.bytes();
    const actor = await asInvestigator();
    const upload = await sendAndTakeIn(actor, { caseId, fileName: bad.fileName, bytes });
    expect(upload.state).toBe("refused");
    const said = upload.refusal?.replaceAll(/[\u00a0\u2009\u202f]/g, " ");
    expect(said).toMatch(bad.says);
    expect(said).toMatch(/^face\..* It was not kept\. .*\.$/s);
    expect(await getUpload(actor, upload.id)).toMatchObject({
      state: "refused",
      refusal: upload.refusal,
    });
    expect(await picturesOf(caseId)).toEqual([]);
    expect(await objectStore().head(upload.key)).toBeNull();
    expect(await objectStore().head(originalKey(upload.id))).toBeNull();
  });

  it.each([
    ["empty.png", 0, "INVALID", /empty/],
    ["large.tif", 300 * 1024 * 1024 + 1, "TOO_LARGE", /At most 300 MB/],
    ["notes.txt", 10, "INVALID", /not named like a JPEG, PNG or TIFF picture/],
  ])("%s of %i bytes is refused before a byte is sent", async (fileName, sizeBytes, code, says) => {
    const input = startInput({ caseId: await aCase(), fileName, bytes: Buffer.from("x") });
    const refusal = startUpload(await asInvestigator(), { ...input, sizeBytes }).catch(
      (error: unknown) => error,
    );
    const error = await refusal;
    expect(error).toMatchObject({ code });
    const { message, fields } = error as { message: string; fields?: Record<string, string> };
    expect(`${message} ${Object.values(fields ?? {}).join(" ")}`).toMatch(says);
  });

  it("takes no file whose bytes are not those that the browser hashed", async () => {
    const actor = await asInvestigator();
    const bytes = await noise(30, 20).png().toBuffer();
    const caseId = await aCase();
    const input = startInput({ caseId, fileName: "face.png", bytes });
    const ticket = await startUpload(actor, input);
    if (ticket.way.kind !== "whole") throw new Error("a small file goes in one piece");
    await put(ticket.way.url, bytes, ticket.way.mediaType);
    await finishUpload(actor, ticket.uploadId, { sha256: sha256Hex("other bytes") });
    await takeInImageJob.run({ uploadId: ticket.uploadId });
    expect(await uploadRow(ticket.uploadId)).toMatchObject({
      state: "refused",
      refusal: expect.stringContaining("changed on its way") as string,
    });
    expect(await listUnfinished(actor, { caseId, purpose: "image" })).toHaveLength(1);
  });

  it("is told when it fails again and again", async () => {
    const actor = await asInvestigator();
    const bytes = await noise(30, 20).png().toBuffer();
    const input = startInput({ caseId: await aCase(), fileName: "face.png", bytes });
    const { uploadId, way } = await startUpload(actor, input);
    if (way.kind !== "whole") throw new Error("a small file goes in one piece");
    await put(way.url, bytes, way.mediaType);
    await finishUpload(actor, uploadId, { sha256: sha256Hex(bytes) });
    await takeInImageJob.givenUp?.({ uploadId });
    expect((await uploadRow(uploadId)).refusal).toMatch(/several times\. It was not kept\. Send/);
    const queued = await database()
      .select()
      .from(jobs)
      .where(eq(jobs.uniqueKey, `take-in-${uploadId}`));
    expect(queued).toHaveLength(1);
  });
});

describe("papers of a field return", () => {
  const send = async (fileName: string, bytes: Buffer) => {
    const caseId = await aCase({ state: "draft" });
    const upload = await sendAndTakeIn(await asRequester(), {
      caseId,
      fileName,
      bytes,
      purpose: "request_file",
      details: { caption: "as found" },
    });
    const kept = await database()
      .select({ caption: requestFiles.caption, sha256: storedObjects.sha256 })
      .from(requestFiles)
      .innerJoin(storedObjects, eq(storedObjects.id, requestFiles.objectId))
      .where(eq(requestFiles.caseId, caseId));
    return { upload, kept };
  };
  const PDF = Buffer.from("%PDF-1.7\n1 0 obj\n<<>>\nendobj\ntrailer\n<<>>\n%%EOF\n");

  it("keeps a PDF and a photograph as they came", async () => {
    const photograph = await noise(60, 40).jpeg().toBuffer();
    for (const [name, bytes] of [
      ["drawing.pdf", PDF],
      ["site.jpg", photograph],
    ] as const) {
      const { upload, kept } = await send(name, bytes);
      expect(upload).toMatchObject({ state: "taken", imageId: null });
      expect(kept).toEqual([{ caption: "as found", sha256: sha256Hex(bytes) }]);
    }
  });

  it("refuses a PDF and a photograph that end too early", async () => {
    const photograph = half(await noise(900, 700).jpeg().toBuffer());
    for (const [name, bytes] of [
      ["drawing.pdf", half(PDF)],
      ["site.jpg", photograph],
      ["site.png", HTML],
    ] as const) {
      const { upload, kept } = await send(name, bytes);
      expect(upload).toMatchObject({ state: "refused" });
      expect(upload.refusal).toMatch(/It was not kept\./);
      expect(kept).toEqual([]);
    }
  });
});
