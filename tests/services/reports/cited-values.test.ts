import { execFileSync } from "node:child_process";
import { eq } from "drizzle-orm";
import { beforeEach, expect, it } from "vitest";
import { database } from "@/db/client";
import { cases, records, recordVersions } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { sendForSignOff } from "@/lib/findings/send-for-sign-off";
import { saveFindings } from "@/lib/findings/save-findings";
import { formatDateTimeWithZone } from "@/lib/format/dates";
import { newId } from "@/lib/new-id";
import { addVersion } from "@/lib/records/write-version";
import { openReportPdf } from "@/lib/reports/open-report-pdf";
import { signReport } from "@/lib/reports/sign-report";
import { storeReportJob } from "@/lib/reports/store-report-job";
import { createTraverse } from "@/lib/traverses/create-traverse";
import { setState } from "../../helpers/cases";
import { aQuotedRecord, depthQuotes } from "../../helpers/findings";
import { cite, findingsWith, words } from "../../helpers/findings-text";
import { asInvestigator, asRequester, asTechnician } from "../../helpers/people";
import {
  aWrittenCase,
  haveRead,
  leadSignedIn,
  ROOT_CAUSE,
  signature,
  theIssue,
} from "../../helpers/signable-case";
import { aTraverse } from "../traverses/sample-traverse";

const DEPTH = "1.94 ± 0.05 mm";

let caseId = "";
let depth: Awaited<ReturnType<typeof aQuotedRecord>>;
beforeEach(async () => {
  caseId = await aWrittenCase();
  depth = await aQuotedRecord(caseId, DEPTH);
});

async function writeCiting(versionId: string, ...more: Parameters<typeof findingsWith>) {
  const source = { recordId: depth.recordId, versionId, field: "caseDepth", text: "", tag: "" };
  await saveFindings(await asInvestigator(), {
    caseId,
    revision: (await theIssue(caseId)).revision,
    document: findingsWith(words("The case is ", cite(source), " deep."), ...more),
    rootCause: ROOT_CAUSE,
  });
}

async function sign() {
  const { lead, signInId } = await leadSignedIn();
  return signReport(lead, signInId, await signature(caseId));
}

it("is not sent or signed while a cited value is stale", async () => {
  await writeCiting(depth.versionId);
  await haveRead(caseId);
  const technician = await asTechnician();
  const before = await database()
    .select({ content: recordVersions.content })
    .from(recordVersions)
    .where(eq(recordVersions.id, depth.versionId));
  await transaction((tx) =>
    addVersion(tx, technician, depth.recordId, 1, {
      content: before[0]?.content,
      quotes: depthQuotes("2.10 ± 0.05 mm"),
    }),
  );
  await expect(sendForSignOff(await asInvestigator(), { caseId })).rejects.toMatchObject({
    code: "INVALID",
    message: expect.stringContaining("Cited values current (1 stale)"),
  });
  await setState(caseId, "in_approval");
  await expect(sign()).rejects.toThrow("Cited values current");
  expect((await theIssue(caseId)).signedAt).toBeNull();
});

it("is not signed when a version beneath it is not as it was written, and says which", async () => {
  const [written] = await database()
    .select()
    .from(recordVersions)
    .where(eq(recordVersions.id, depth.versionId));
  if (!written) throw new Error("there is no version");
  const versionId = newId("ver");
  // As if somebody had written to the database by hand: another value under the old digest.
  await database()
    .insert(recordVersions)
    .values({ ...written, id: versionId, number: 2, quotes: depthQuotes("3.00 ± 0.05 mm") });
  await database().update(records).set({ latestVersion: 2 }).where(eq(records.id, depth.recordId));
  await writeCiting(versionId);
  await haveRead(caseId);
  await sendForSignOff(await asInvestigator(), { caseId });
  await expect(sign()).rejects.toThrow(
    `${depth.label}, version 2, is not as it was written. Nothing was signed.`,
  );
  expect((await theIssue(caseId)).signedAt).toBeNull();
});

it("prints cited values, chart, people, cautions and versions, with the case on every page", async () => {
  const { traverseId } = await createTraverse(await asTechnician(), {
    caseId,
    content: aTraverse(),
  });
  const caption = "Profile at the fillet";
  await writeCiting(depth.versionId, {
    type: "chartFigure",
    attrs: { traverseId, caption },
  });
  await haveRead(caseId);
  await sendForSignOff(await asInvestigator(), { caseId });
  await sign();
  const issue = await theIssue(caseId);
  await storeReportJob.run({ issueId: issue.id });

  const bytes: Buffer[] = [];
  const opened = await openReportPdf(await asRequester(), caseId, 1);
  for await (const chunk of opened.body) bytes.push(Buffer.from(chunk as Uint8Array));
  // poppler reads the file, as an independent judge of what is in it.
  const words = execFileSync("pdftotext", ["-layout", "-", "-"], { input: Buffer.concat(bytes) });
  const pages = words
    .toString()
    .split("\f")
    .slice(0, -1)
    .map((page) => page.replaceAll(/\s+/g, " "));
  const [row] = await database().select().from(cases).where(eq(cases.id, caseId));
  expect(pages.length).toBeGreaterThan(2);
  for (const page of pages) expect(page).toContain(row?.number);
  const all = pages.join(" ");
  for (const text of [
    DEPTH,
    caption,
    "Investigated by",
    "Read by",
    "Signed by",
    "Lead Person",
    "Do not return the part, a sister part or a fleet to service",
    "End of report",
    "Second reader has read",
    "T2 readings",
    formatDateTimeWithZone(issue.signedAt).replaceAll(/\s+/g, " "),
  ]) {
    expect(all.toLowerCase()).toContain(text.toLowerCase());
  }
  const manifest = issue.manifest as { label: string; sha256: string }[];
  const entry = manifest.find(({ label }) => label === depth.label);
  // A digest is broken over lines in its column; its head stands on the first.
  expect(all).toContain(entry?.sha256.slice(0, 12));
});
