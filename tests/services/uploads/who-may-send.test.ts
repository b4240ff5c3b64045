import { and, eq } from "drizzle-orm";
import sharp from "sharp";
import { beforeAll, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { auditEvents, images, jobs, uploads } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { sha256Hex } from "@/lib/canonical-json";
import type { CaseState } from "@/lib/cases/constants";
import { takeInImageJob } from "@/lib/images/take-in-image-job";
import { addImageBytes } from "@/lib/uploads/add-bytes";
import { finishUpload } from "@/lib/uploads/finish-upload";
import { getUpload } from "@/lib/uploads/get-upload";
import { startUpload } from "@/lib/uploads/start-upload";
import { aCase, setState } from "../../helpers/cases";
import {
  asAdministrator,
  asInvestigator,
  asLead,
  asOtherRequester,
  asRequester,
  asTechnician,
} from "../../helpers/people";
import { put, sendAndTakeIn, sendFile, startInput, uploadRow } from "../../helpers/send-file";

let bytes: Buffer;
beforeAll(async () => {
  bytes = await sharp({ create: { width: 40, height: 30, channels: 3, background: "#567" } })
    .png()
    .toBuffer();
});
const input = (caseId: string, purpose: "image" | "request_file" = "image") =>
  startInput({ caseId, fileName: "face.png", bytes, purpose });
const refusal = (work: Promise<unknown>) =>
  work.then(
    () => "done",
    (error: { code?: string }) => error.code,
  );

describe("who may send a file", () => {
  it.each<[string, () => Promise<Actor>, "image" | "request_file", CaseState, string]>([
    ["the client, a picture", asRequester, "image", "examining", "NOT_ALLOWED"],
    ["another client, a paper", asOtherRequester, "request_file", "submitted", "NOT_FOUND"],
    ["another client, a picture", asOtherRequester, "image", "examining", "NOT_FOUND"],
    ["an administrator", asAdministrator, "image", "examining", "NOT_ALLOWED"],
    ["the lead before acceptance", asLead, "image", "submitted", "LOCKED"],
    ["an investigator after signing", asInvestigator, "image", "signed", "LOCKED"],
    ["the client after release", asRequester, "request_file", "released", "LOCKED"],
  ])("not %s", async (_who, person, purpose, state, code) => {
    const caseId = await aCase({ state });
    expect(await refusal(startUpload(await person(), input(caseId, purpose)))).toBe(code);
    expect(await database().select().from(uploads).where(eq(uploads.caseId, caseId))).toEqual([]);
  });

  it("the technician of the case may, a picture; the client may, a paper", async () => {
    const caseId = await aCase();
    expect(await refusal(startUpload(await asTechnician(), input(caseId)))).toBe("done");
    expect(await refusal(startUpload(await asRequester(), input(caseId, "request_file")))).toBe(
      "done",
    );
  });

  it("nobody goes on with, ends or sees what another person sends", async () => {
    const caseId = await aCase();
    const { uploadId } = await startUpload(await asTechnician(), input(caseId));
    const other = await asInvestigator();
    const sha256 = sha256Hex(bytes);
    expect(await refusal(finishUpload(other, uploadId, { sha256 }))).toBe("NOT_FOUND");
    expect(await refusal(getUpload(other, uploadId))).toBe("NOT_FOUND");
  });

  it("a case signed while the file is checked takes it no more, and says so", async () => {
    const caseId = await aCase();
    const actor = await asInvestigator();
    const uploadId = await sendFile(actor, { caseId, fileName: "face.png", bytes });
    await setState(caseId, "signed");
    await takeInImageJob.run({ uploadId });
    expect(await uploadRow(uploadId)).toMatchObject({ state: "refused", imageId: null });
    expect((await uploadRow(uploadId)).refusal).toMatch(
      /came too late to be added\. The report is signed/,
    );
    expect(await database().select().from(images).where(eq(images.caseId, caseId))).toEqual([]);
  });
});

describe("twice at once", () => {
  it("the same file started in two windows is one upload", async () => {
    const caseId = await aCase();
    const actor = await asInvestigator();
    const tickets = await Promise.all([1, 2, 3].map(() => startUpload(actor, input(caseId))));
    expect(new Set(tickets.map((ticket) => ticket.uploadId)).size).toBe(1);
  });

  it("ended twice and looked into by two workers it is one picture", async () => {
    const caseId = await aCase();
    const actor = await asInvestigator();
    const { uploadId, way } = await startUpload(actor, input(caseId));
    if (way.kind !== "whole") throw new Error("a small file goes in one piece");
    await put(way.url, bytes, way.mediaType);
    const sha256 = sha256Hex(bytes);
    await Promise.all([1, 2].map(() => finishUpload(actor, uploadId, { sha256 })));
    const queued = await database()
      .select()
      .from(jobs)
      .where(eq(jobs.uniqueKey, `take-in-${uploadId}`));
    expect(queued).toHaveLength(1);
    // The loser may find the arrival gone and be run again by the queue; then it finds it done.
    await Promise.allSettled([1, 2].map(() => takeInImageJob.run({ uploadId })));
    await takeInImageJob.run({ uploadId });
    expect(await database().select().from(images).where(eq(images.caseId, caseId))).toHaveLength(1);
    expect(await uploadRow(uploadId)).toMatchObject({ state: "taken", refusal: null });
    const told = await database()
      .select()
      .from(auditEvents)
      .where(and(eq(auditEvents.chain, caseId), eq(auditEvents.action, "system.takeInImage")));
    expect(told).toHaveLength(1);
  });

  it("other content under an upload that was ended is a conflict", async () => {
    const actor = await asInvestigator();
    const { id } = await sendAndTakeIn(actor, {
      caseId: await aCase(),
      fileName: "face.png",
      bytes,
    });
    expect(await refusal(finishUpload(actor, id, { sha256: sha256Hex("other") }))).toBe("CONFLICT");
    expect(await refusal(finishUpload(actor, id, { sha256: sha256Hex(bytes) }))).toBe("done");
  });
});

describe("bytes that are on the server already", () => {
  it("become a picture in one call, above the size of parts too", async () => {
    const caseId = await aCase();
    const actor = await asInvestigator();
    const large = await sharp(Buffer.alloc(3000 * 2000 * 3, 90), {
      raw: { width: 3000, height: 2000, channels: 3 },
    })
      .tiff({ compression: "none" })
      .toBuffer();
    const details = { technique: "stereo" as const, caption: "Face", takenOn: "2026-11-20" };
    const sent = { caseId, mediaType: "image/tiff", details };
    expect(await addImageBytes(actor, { ...sent, fileName: "a.tif", bytes: large })).toMatchObject({
      label: "IM-01",
    });
    expect(await addImageBytes(actor, { ...sent, fileName: "b.png", bytes })).toMatchObject({
      label: "IM-02",
    });
    await expect(
      addImageBytes(actor, { ...sent, fileName: "c.png", bytes: Buffer.from("<html>") }),
    ).rejects.toMatchObject({ code: "INVALID" });
  });
});
