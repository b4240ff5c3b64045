import { execFileSync } from "node:child_process";
import { eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { cases, reportIssues, signIns } from "@/db/schema";
import { verifyChains } from "@/lib/audit/verify-chain";
import type { Actor } from "@/lib/auth/actor";
import { findSignIn } from "@/lib/auth/sign-ins";
import { canonicalJson, sha256Hex } from "@/lib/canonical-json";
import { AppError } from "@/lib/errors";
import { sendForSignOff } from "@/lib/findings/send-for-sign-off";
import { sendToSecondReader } from "@/lib/findings/send-to-second-reader";
import { weighMechanism } from "@/lib/mechanisms/weigh-mechanism";
import { openNewIssue } from "@/lib/reports/open-new-issue";
import { openReportPdf } from "@/lib/reports/open-report-pdf";
import { signReport } from "@/lib/reports/sign-report";
import { storeReportJob } from "@/lib/reports/store-report-job";
import { setState } from "../../helpers/cases";
import {
  asInvestigator,
  asOtherRequester,
  asRequester,
  asSecondInvestigator,
  asSecondLead,
  asTechnician,
} from "../../helpers/people";
import { refusal } from "../../helpers/refusal";
import {
  aSignableCase,
  aWrittenCase,
  haveRead,
  leadSignedIn,
  ROOT_CAUSE,
  signature,
  signedIn,
  theIssue,
  write,
} from "../../helpers/signable-case";

let lead: Actor;
let signInId: string;
beforeAll(async () => {
  ({ lead, signInId } = await leadSignedIn());
});

const sign = async (caseId: string) => signReport(lead, signInId, await signature(caseId));

describe("before the signature", () => {
  it("lets nobody send findings for sign-off that the second reader has not read", async () => {
    const caseId = await aWrittenCase();
    await setState(caseId, "in_review");
    const found = await refusal(sendForSignOff(await asInvestigator(), { caseId }));
    expect(found.message).toContain("Second reader has read");
  });

  it("takes neither the investigator nor the signer as second reader", async () => {
    const caseId = await aWrittenCase();
    const investigator = await asInvestigator();
    for (const reader of [investigator, lead]) {
      const found = await refusal(
        sendToSecondReader(investigator, { caseId, readerId: reader.id }),
      );
      expect(found.code).toBe("INVALID");
      expect(found.fields?.readerId).toMatch(/Choose someone else/);
    }
  });

  it("asks for a new reading once the text has changed after it", async () => {
    const caseId = await aWrittenCase();
    await haveRead(caseId);
    await setState(caseId, "analysing");
    await write(await asInvestigator(), caseId, "The shaft broke by something else.");
    await setState(caseId, "in_approval");
    const found = await refusal(sign(caseId));
    expect(found.message).toContain("Second reader has read");
    expect((await theIssue(caseId)).signedAt).toBeNull();
  });
});

describe("signing", () => {
  it("is refused to everyone who is not the lead engineer of the case", async () => {
    const caseId = await aSignableCase();
    for (const actor of [
      await asInvestigator(),
      await asSecondInvestigator(),
      await asTechnician(),
      await asRequester(),
      await asOtherRequester(),
    ]) {
      const found = await refusal(signReport(actor, signInId, await signature(caseId)));
      expect(["NOT_ALLOWED", "NOT_FOUND"]).toContain(found.code);
    }
    expect((await theIssue(caseId)).signedAt).toBeNull();
  });

  it("is refused to a lead engineer who wrote part of it, and open to the other one", async () => {
    const caseId = await aWrittenCase();
    await write(lead, caseId, "The shaft broke by bending fatigue.");
    await haveRead(caseId);
    await sendForSignOff(await asInvestigator(), { caseId });
    const found = await refusal(sign(caseId));
    expect(found.code).toBe("NOT_ALLOWED");
    expect(found.message).toContain("Another lead engineer has to sign it");
    const other = await signedIn(await asSecondLead());
    await signReport(other.lead, other.signInId, await signature(caseId));
    expect((await theIssue(caseId)).signedById).toBe(other.lead.id);
  });

  it("ends the sign-in after three wrong passwords in a row, and signs nothing", async () => {
    const caseId = await aSignableCase();
    const own = await leadSignedIn();
    const wrong = await signature(caseId, "not the pass phrase");
    for (let i = 0; i < 2; i += 1) {
      const found = await refusal(signReport(own.lead, own.signInId, wrong));
      expect(found.fields?.password).toContain("Nothing was signed");
      expect(await findSignIn(own.signInId, { countsAsUse: false })).not.toBeNull();
    }
    expect((await refusal(signReport(own.lead, own.signInId, wrong))).code).toBe("NOT_SIGNED_IN");
    expect(await findSignIn(own.signInId, { countsAsUse: false })).toBeNull();
    const [row] = await database().select().from(signIns).where(eq(signIns.id, own.signInId));
    expect(row?.endedAt).not.toBeNull();
    expect((await theIssue(caseId)).signedAt).toBeNull();
  });

  it("refuses a text that is not the one that was on screen", async () => {
    const caseId = await aSignableCase();
    const seen = { ...(await signature(caseId)), documentSha256: "0".repeat(64) };
    const found = await refusal(signReport(lead, signInId, seen));
    expect(found.code).toBe("CONFLICT");
  });

  it("happens once when it is asked for twice at the same moment", async () => {
    const caseId = await aSignableCase();
    const given = await signature(caseId);
    const outcomes = await Promise.allSettled([
      signReport(lead, signInId, given),
      signReport(lead, signInId, given),
    ]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    const issues = await database()
      .select()
      .from(reportIssues)
      .where(eq(reportIssues.caseId, caseId));
    expect(issues).toHaveLength(1);
  });

  it("freezes what it rests on under a fingerprint anybody can work out again", async () => {
    const caseId = await aSignableCase();
    const { fingerprint } = await sign(caseId);
    const issue = await theIssue(caseId);
    expect(sha256Hex(canonicalJson(issue.frozen))).toBe(fingerprint);
    expect(issue.signedById).toBe(lead.id);
  });

  it("locks the text and the evidence beneath it", async () => {
    const caseId = await aSignableCase();
    await sign(caseId);
    const investigator = await asInvestigator();
    await expect(write(investigator, caseId, "Another text.")).rejects.toBeInstanceOf(AppError);
    const found = await refusal(
      weighMechanism(investigator, {
        caseId,
        recordId: null,
        seenVersion: null,
        content: {
          code: "DO",
          detail: "",
          verdict: "ruled_out",
          reason: "No dimples at the origin.",
        },
      }),
    );
    expect(found.code).toBe("LOCKED");
  });
});

describe("the report", () => {
  it("is stored, released and read by its requester, and by no other client", async () => {
    const caseId = await aSignableCase();
    const requester = await asRequester();
    await sign(caseId);
    await expect(refusal(openReportPdf(requester, caseId, 1))).resolves.toBeInstanceOf(AppError);
    const { id } = await theIssue(caseId);
    // A job may run twice, as after a worker that died; the report is released once.
    await storeReportJob.run({ issueId: id });
    await storeReportJob.run({ issueId: id });

    const opened = await openReportPdf(requester, caseId, 1);
    const bytes: Buffer[] = [];
    for await (const chunk of opened.body) bytes.push(Buffer.from(chunk as Uint8Array));
    const pdf = Buffer.concat(bytes);
    expect(sha256Hex(pdf)).toBe(opened.sha256);
    // poppler reads the file, as an independent judge of what is in it.
    const words = execFileSync("pdftotext", ["-layout", "-", "-"], { input: pdf }).toString();
    const [row] = await database().select().from(cases).where(eq(cases.id, caseId));
    for (const word of [row?.number ?? "?", ROOT_CAUSE, lead.name, "The shaft broke by fatigue."]) {
      expect(words.replaceAll(/\s+/g, " ")).toContain(word);
    }
    const info = execFileSync("pdfinfo", ["-"], { input: pdf }).toString();
    expect(Number(/^Pages:\s+(\d+)/m.exec(info)?.[1])).toBeGreaterThan(0);
    expect((await refusal(openReportPdf(await asOtherRequester(), caseId, 1))).code).toBe(
      "NOT_FOUND",
    );
  });

  it("stays readable when a new issue replaces it, with the reason kept", async () => {
    const caseId = await aSignableCase();
    await sign(caseId);
    await storeReportJob.run({ issueId: (await theIssue(caseId)).id });
    const early = await refusal(
      openNewIssue(await asInvestigator(), { caseId, reason: "A sister part was received." }),
    );
    expect(early.code).toBe("NOT_ALLOWED");
    await openNewIssue(lead, { caseId, reason: "A sister part was received." });
    await write(await asInvestigator(), caseId, "The shaft and its sister broke by fatigue.");
    await haveRead(caseId);
    await sendForSignOff(await asInvestigator(), { caseId });
    await sign(caseId);
    await storeReportJob.run({ issueId: (await theIssue(caseId)).id });
    const issues = await database()
      .select({ number: reportIssues.number, state: reportIssues.state })
      .from(reportIssues)
      .where(eq(reportIssues.caseId, caseId))
      .orderBy(reportIssues.number);
    expect(issues).toEqual([
      { number: 1, state: "superseded" },
      { number: 2, state: "released" },
    ]);
    const requester = await asRequester();
    expect((await openReportPdf(requester, caseId, 1)).sizeBytes).toBeGreaterThan(1000);
    expect((await openReportPdf(requester, caseId, 2)).sizeBytes).toBeGreaterThan(1000);
  });
});

it("leaves an audit trail that still holds from end to end", async () => {
  const report = await verifyChains();
  expect(report.faults).toEqual([]);
  expect(report.eventCount).toBeGreaterThan(20);
});
