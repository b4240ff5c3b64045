import { eq } from "drizzle-orm";
import sharp from "sharp";
import { beforeAll, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { jobs, uploads } from "@/db/schema";
import { sha256Hex } from "@/lib/canonical-json";
import { takeInImageJob } from "@/lib/images/take-in-image-job";
import { objectStore } from "@/lib/storage/s3";
import { cancelUpload } from "@/lib/uploads/cancel-upload";
import { PART_SIZE_BYTES, UNFINISHED_KEPT_DAYS } from "@/lib/uploads/constants";
import { finishUpload } from "@/lib/uploads/finish-upload";
import { getUpload, listUnfinished } from "@/lib/uploads/get-upload";
import { reportParts } from "@/lib/uploads/report-parts";
import type { UploadTicket } from "@/lib/uploads/schemas";
import { startUpload } from "@/lib/uploads/start-upload";
import { tidyUploadsJob } from "@/lib/uploads/tidy-uploads-job";
import { aCase } from "../../helpers/cases";
import { asInvestigator } from "../../helpers/people";
import { put, sendParts, startInput, uploadRow } from "../../helpers/send-file";

/** An uncompressed picture of three parts. */
let bytes: Buffer;
beforeAll(async () => {
  const [width, height] = [3000, 2000];
  const raw = Buffer.alloc(width * height * 3);
  for (let i = 0; i < raw.byteLength; i += 1) raw[i] = (i * 7) % 253;
  bytes = await sharp(raw, { raw: { width, height, channels: 3 } })
    .tiff({ compression: "none" })
    .toBuffer();
});

function partsOf(ticket: UploadTicket) {
  if (ticket.way.kind !== "parts") throw new Error("a large file goes in parts");
  return ticket.way;
}
const begin = async (caseId: string) =>
  startUpload(await asInvestigator(), startInput({ caseId, fileName: "large.tif", bytes }));

describe("a file in parts", () => {
  it("goes on after the parts that arrived, and is whole at the end", async () => {
    const [actor, caseId] = [await asInvestigator(), await aCase()];
    const first = await begin(caseId);
    const way = partsOf(first);
    expect(way).toMatchObject({ partSizeBytes: PART_SIZE_BYTES, alreadySent: [] });
    expect(way.parts).toHaveLength(3);
    await sendParts(actor, first.uploadId, bytes, way.parts.slice(1, 2));
    const [left] = await listUnfinished(actor, { caseId, purpose: "image" });
    expect(left).toMatchObject({ state: "sending", sentBytes: PART_SIZE_BYTES });

    const sha256 = sha256Hex(bytes);
    await expect(finishUpload(actor, first.uploadId, { sha256 })).rejects.toMatchObject({
      code: "INVALID",
      message: expect.stringMatching(/2 of 3 parts are missing.*are kept\. Carry on\./) as string,
    });

    const again = await begin(caseId);
    expect(again.uploadId).toBe(first.uploadId);
    expect(partsOf(again).alreadySent).toEqual([2]);
    expect(partsOf(again).parts.map((part) => part.partNumber)).toEqual([1, 3]);
    await sendParts(actor, again.uploadId, bytes, partsOf(again).parts);
    expect(await finishUpload(actor, again.uploadId, { sha256 })).toMatchObject({ state: "sent" });
    await takeInImageJob.run({ uploadId: again.uploadId });
    expect(await getUpload(actor, again.uploadId)).toMatchObject({
      state: "taken",
      imageLabel: "IM-01",
    });
  });

  it("with another first part is another upload", async () => {
    const caseId = await aCase();
    const first = await begin(caseId);
    const input = startInput({ caseId, fileName: "large.tif", bytes });
    const other = await startUpload(await asInvestigator(), {
      ...input,
      firstPartSha256: sha256Hex("other"),
    });
    expect(other.uploadId).not.toBe(first.uploadId);
  });

  it("ends once when the store had put it together and the answer was lost", async () => {
    const [actor, caseId] = [await asInvestigator(), await aCase()];
    const ticket = await begin(caseId);
    await sendParts(actor, ticket.uploadId, bytes, partsOf(ticket).parts);
    const row = await uploadRow(ticket.uploadId);
    const done = partsOf(await begin(caseId)).alreadySent;
    expect(done).toEqual([1, 2, 3]);
    const { parts } = await reportParts(actor, ticket.uploadId, { want: [3] });
    const etag = await put(parts[0]?.url ?? "", bytes.subarray(2 * PART_SIZE_BYTES));
    const sizeBytes = bytes.byteLength - 2 * PART_SIZE_BYTES;
    await reportParts(actor, ticket.uploadId, { done: [{ partNumber: 3, etag, sizeBytes }] });
    const sha256 = sha256Hex(bytes);
    expect(await finishUpload(actor, ticket.uploadId, { sha256 })).toMatchObject({ state: "sent" });
    // As if the last step in the database had not been reached.
    await database().update(uploads).set({ state: "sending" }).where(eq(uploads.id, row.id));
    expect(await finishUpload(actor, ticket.uploadId, { sha256 })).toMatchObject({ state: "sent" });
  });

  it("takes no part of another size than agreed", async () => {
    const [actor, caseId] = [await asInvestigator(), await aCase()];
    const { uploadId } = await begin(caseId);
    for (const part of [
      { partNumber: 1, etag: '"x"', sizeBytes: 10 },
      { partNumber: 4, etag: '"x"', sizeBytes: 10 },
    ]) {
      await expect(reportParts(actor, uploadId, { done: [part] })).rejects.toMatchObject({
        code: "INVALID",
      });
    }
  });

  it("cancelled, leaves nothing in the store and takes no more parts", async () => {
    const [actor, caseId] = [await asInvestigator(), await aCase()];
    const ticket = await begin(caseId);
    await sendParts(actor, ticket.uploadId, bytes, partsOf(ticket).parts.slice(0, 1));
    await cancelUpload(actor, ticket.uploadId);
    await cancelUpload(actor, ticket.uploadId);
    expect(await listUnfinished(actor, { caseId, purpose: "image" })).toEqual([]);
    const part = partsOf(ticket).parts[1];
    await expect(put(part?.url ?? "", bytes.subarray(0, 1000))).rejects.toThrow("404");
    await expect(
      finishUpload(actor, ticket.uploadId, { sha256: sha256Hex(bytes) }),
    ).rejects.toMatchObject({ code: "CONFLICT" });
    expect((await begin(caseId)).uploadId).not.toBe(ticket.uploadId);
  });
});

describe("tidying", () => {
  it("gives up what nobody went on with, leaves the rest, and asks for itself again", async () => {
    const old = await begin(await aCase());
    const fresh = await begin(await aCase());
    const stuck = await begin(await aCase());
    const daysAgo = (days: number) => new Date(Date.now() - days * 86_400_000);
    const set = (id: string, change: Partial<typeof uploads.$inferInsert>) =>
      database().update(uploads).set(change).where(eq(uploads.id, id));
    await set(old.uploadId, { changedAt: daysAgo(UNFINISHED_KEPT_DAYS + 1) });
    await set(fresh.uploadId, { changedAt: daysAgo(UNFINISHED_KEPT_DAYS - 1) });
    await set(stuck.uploadId, { state: "sent", changedAt: daysAgo(2) });
    await tidyUploadsJob.run({});
    expect((await uploadRow(old.uploadId)).state).toBe("cancelled");
    expect((await uploadRow(fresh.uploadId)).state).toBe("sending");
    expect(await uploadRow(stuck.uploadId)).toMatchObject({
      state: "refused",
      refusal: expect.stringContaining("within a day") as string,
    });
    const part = partsOf(old).parts[0];
    await expect(put(part?.url ?? "", bytes.subarray(0, 1000))).rejects.toThrow("404");
    expect(await objectStore().head((await uploadRow(old.uploadId)).key)).toBeNull();
    const tomorrow = daysAgo(-1).toISOString().slice(0, 10);
    const next = await database()
      .select()
      .from(jobs)
      .where(eq(jobs.uniqueKey, `upload-tidy-${tomorrow}`));
    expect(next).toHaveLength(1);
  });
});
