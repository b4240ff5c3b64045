import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { caseMoves, cases, reportIssues } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import { transaction } from "@/db/transaction";
import { startSignIn } from "@/lib/auth/sign-ins";
import { documentDigest } from "@/lib/cases/gates";
import { STAGE_OF_STATE } from "@/lib/cases/constants";
import { findIssue } from "@/lib/findings/find-issue";
import { recordReading } from "@/lib/findings/record-reading";
import { sendForSignOff } from "@/lib/findings/send-for-sign-off";
import { sendToSecondReader } from "@/lib/findings/send-to-second-reader";
import { newId } from "@/lib/new-id";
import { signReport } from "@/lib/reports/sign-report";
import { storeReportJob } from "@/lib/reports/store-report-job";
import { stateStrength } from "@/lib/strength/state-strength";
import type { Cast } from "./actors";
import type { StoryCase } from "./case-list";
import { setRealTime, setStoryTime } from "./clock";
import { DEMO_PASSWORD } from "./people";
import { secondReaderOf } from "./reach";

/** How long storing the report took, in the story. */
const RELEASED_AFTER_MS = 90_000;

/** Sends the findings to the second reader, and has them read. */
export async function haveRead(
  cast: Cast,
  story: StoryCase,
  caseId: string,
  daysAgo: number,
): Promise<void> {
  setStoryTime(daysAgo, "10:20");
  const reader = cast[secondReaderOf(story)];
  await sendToSecondReader(cast[story.investigator], { caseId, readerId: reader.id });
  setStoryTime(daysAgo, "14:05");
  const issue = await findIssue(database(), caseId);
  if (!issue) throw new Error("no issue to read");
  await recordReading(reader, {
    caseId,
    verdict: "read",
    note: "Data, arithmetic and reasoning hold.",
    revision: issue.revision,
  });
}

/** Signs the findings as lead engineer and lets the report be stored and released. */
export async function signAndRelease(
  cast: Cast,
  story: StoryCase,
  caseId: string,
  daysAgo: number,
): Promise<void> {
  setStoryTime(daysAgo, "15:40");
  await sendForSignOff(cast[story.investigator], { caseId });
  setStoryTime(Math.max(daysAgo - 1, 0), "10:14");
  const signedAt = new Date();
  const issue = await findIssue(database(), caseId);
  if (!issue) throw new Error("no issue to sign");
  const signInId = await startSignIn({ id: cast.lead.id, signInEpoch: 1 });
  await signReport(cast.lead, signInId, {
    caseId,
    documentSha256: documentDigest(issue.document),
    hasRead: true,
    hasNotMeasured: true,
    password: DEMO_PASSWORD,
  });
  // The store is asked with signed requests, which need the real time.
  setRealTime();
  await storeReportJob.run({ issueId: issue.id });
  await database()
    .update(reportIssues)
    .set({ releasedAt: new Date(signedAt.getTime() + RELEASED_AFTER_MS) })
    .where(eq(reportIssues.id, issue.id));
}

export async function stateNoStrength(cast: Cast, story: StoryCase, caseId: string): Promise<void> {
  await stateStrength(cast[story.investigator], {
    caseId,
    verdict: "not_applicable",
    reason:
      "The part failed by loss of material or progressive cracking; its strength was not in question.",
    seenVersion: null,
  });
}

/** Closes a released case; there is no page for this yet. */
export async function closeCase(cast: Cast, caseId: string, daysAgo: number): Promise<void> {
  setStoryTime(daysAgo, "16:00");
  await transaction(async (tx) => {
    await tx
      .update(cases)
      .set({ state: "closed", stage: STAGE_OF_STATE.closed, changedAt: new Date() })
      .where(eq(cases.id, caseId));
    await tx.insert(caseMoves).values({
      id: newId("move"),
      caseId,
      fromState: "released",
      toState: "closed",
      reason: "Items returned",
      byId: cast.lead.id,
    });
    await recordEvent(tx, {
      caseId,
      actor: null,
      action: "system.seed",
      subject: { kind: "case", id: caseId, label: "the end of the case" },
      before: { state: "released" },
      after: { state: "closed" },
    });
  });
}
