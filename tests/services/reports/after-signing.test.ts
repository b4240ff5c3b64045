import { eq, inArray } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { auditEvents, recordVersions, records, reportIssues } from "@/db/schema";
import { AppError } from "@/lib/errors";
import { storeReportJob } from "@/lib/reports/store-report-job";
import { setState } from "../../helpers/cases";
import { aSignedCase } from "./signed-case";

let signed: Awaited<ReturnType<typeof aSignedCase>>;
beforeAll(async () => {
  signed = await aSignedCase();
});

/** Everything of the case that a write could touch. */
async function everything(): Promise<string> {
  const { caseId } = signed;
  const [events, kept, issues, versions] = await Promise.all([
    database().select().from(auditEvents).where(eq(auditEvents.chain, caseId)),
    database().select().from(records).where(eq(records.caseId, caseId)),
    database().select().from(reportIssues).where(eq(reportIssues.caseId, caseId)),
    database()
      .select({ id: recordVersions.id })
      .from(recordVersions)
      .innerJoin(records, eq(records.id, recordVersions.recordId))
      .where(eq(records.caseId, caseId)),
  ]);
  return JSON.stringify([events, kept, issues, versions]);
}

async function refuseAll(): Promise<void> {
  const before = await everything();
  for (const [name, verb] of Object.entries(signed.verbs)) {
    const error: unknown = await verb().then(
      () => null,
      (reason: unknown) => reason,
    );
    expect(error, `${name} was not refused`).toBeInstanceOf(AppError);
    expect(error, name).toMatchObject({ code: "LOCKED" });
  }
  expect(await everything()).toBe(before);
}

describe("after the signature", () => {
  it("refuses every verb that could change what the report rests on, and writes nothing", async () => {
    await refuseAll();
  });

  it("refuses them still when the report is released", async () => {
    await storeReportJob.run({ issueId: signed.issueId });
    await refuseAll();
  });

  it.each([
    ["the text", { document: { type: "doc", content: [] } }],
    ["the root cause", { rootCause: "Another cause." }],
    ["the frozen content", { frozen: {} }],
    ["the fingerprint", { manifestSha256: "0".repeat(64) }],
    ["the signature", { signedAt: new Date(0) }],
    ["the PDF", { pdfObjectId: null }],
  ])("the database itself refuses another value for %s", async (_what, change) => {
    const work = database()
      .update(reportIssues)
      .set(change)
      .where(eq(reportIssues.id, signed.issueId));
    await expect(work).rejects.toMatchObject({
      cause: { sqlMessage: "a signed issue is never changed" },
    });
  });

  it("the database itself refuses to delete the issue or change a version beneath it", async () => {
    const remove = database().delete(reportIssues).where(eq(reportIssues.id, signed.issueId));
    await expect(remove).rejects.toMatchObject({
      cause: { sqlMessage: "a signed issue is never deleted" },
    });
    const recordIds = database()
      .select({ id: records.id })
      .from(records)
      .where(eq(records.caseId, signed.caseId));
    const change = database()
      .update(recordVersions)
      .set({ reason: "x" })
      .where(inArray(recordVersions.recordId, recordIds));
    await expect(change).rejects.toMatchObject({
      cause: { sqlMessage: "a version is never changed" },
    });
  });
});

it("opens again only with a new issue", async () => {
  await setState(signed.caseId, "reopened");
  await expect(signed.verbs["state the strength"]?.()).resolves.toBeDefined();
});
