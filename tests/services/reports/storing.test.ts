import { eq } from "drizzle-orm";
import { afterEach, beforeAll, beforeEach, describe, expect, it, vi } from "vitest";
import { database } from "@/db/client";
import { cases, jobs, storedObjects } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { sha256Hex } from "@/lib/canonical-json";
import { signReport } from "@/lib/reports/sign-report";
import { storeReportJob } from "@/lib/reports/store-report-job";
import { objectStore } from "@/lib/storage/s3";
import { aSignableCase, leadSignedIn, signature, theIssue } from "../../helpers/signable-case";

let lead: Actor;
let signInId: string;
beforeAll(async () => {
  ({ lead, signInId } = await leadSignedIn());
});

let caseId = "";
let issueId = "";
beforeEach(async () => {
  caseId = await aSignableCase();
  await signReport(lead, signInId, await signature(caseId));
  issueId = (await theIssue(caseId)).id;
});
afterEach(() => {
  vi.restoreAllMocks();
});

const store = () => storeReportJob.run({ issueId });
const filesOf = () =>
  database().select().from(storedObjects).where(eq(storedObjects.caseId, caseId));
const stateOf = async () =>
  (await database().select({ state: cases.state }).from(cases).where(eq(cases.id, caseId)))[0]
    ?.state;
const newsOf = async () =>
  (await database().select().from(jobs)).filter((job) =>
    job.uniqueKey?.startsWith(`released:${issueId}:`),
  );

describe("storing a signed report", () => {
  it("goes on after it was killed between the store and the database, with the same bytes", async () => {
    const put = vi.spyOn(objectStore(), "put");
    vi.spyOn(objectStore(), "getBytes").mockRejectedValueOnce(new Error("killed"));
    await expect(store()).rejects.toThrow("killed");
    expect(await stateOf()).toBe("signed");
    expect(await filesOf()).toEqual([]);
    expect(await newsOf()).toEqual([]);

    await store();
    expect(put.mock.calls[1]?.[0]).toBe(put.mock.calls[0]?.[0]);
    expect(await stateOf()).toBe("released");
    expect(await filesOf()).toHaveLength(1);
  });

  it("does not release a report whose stored bytes are not the ones it sent", async () => {
    vi.spyOn(objectStore(), "getBytes").mockResolvedValueOnce(Buffer.from("%PDF-1.7 another"));
    await expect(store()).rejects.toThrow("is not what was sent");
    expect(await stateOf()).toBe("signed");
    expect((await theIssue(caseId)).releasedAt).toBeNull();
    expect(await filesOf()).toEqual([]);
  });

  it("releases once, and tells each person once, when two workers hold the job", async () => {
    await Promise.all([store(), store()]);
    const files = await filesOf();
    expect(files).toHaveLength(1);
    const [file] = files;
    expect(sha256Hex(await objectStore().getBytes(file?.key ?? ""))).toBe(file?.sha256);
    const told = await newsOf();
    expect(told).toHaveLength(3);
    expect(JSON.stringify(told)).not.toContain("%PDF");
  });
});
