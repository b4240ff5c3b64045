import "server-only";
import { and, desc, eq, isNotNull } from "drizzle-orm";
import { database } from "@/db/client";
import { reportIssues, storedObjects } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { getCase } from "@/lib/cases/get-case";
import { notFound } from "@/lib/errors";
import type { IssueState } from "./constants";
import { type FrozenReport, frozenReport } from "./frozen-report";

export type ReleasedIssue = {
  number: number;
  state: IssueState;
  signedAt: string;
  releasedAt: string;
  reason: string | null;
  fingerprint: string;
  pdfSha256: string;
  pdfSizeBytes: number;
};
export type ReportPage = { issue: ReleasedIssue; others: ReleasedIssue[]; frozen: FrozenReport };

/** A released issue as it was frozen, the newest unless another is asked for. */
export async function readReport(
  actor: Actor,
  caseId: string,
  issueNumber: number | null,
): Promise<ReportPage> {
  await getCase(actor, "report.read", caseId);
  const rows = await database()
    .select({
      issue: reportIssues,
      pdfSha256: storedObjects.sha256,
      pdfSizeBytes: storedObjects.sizeBytes,
    })
    .from(reportIssues)
    .innerJoin(storedObjects, eq(storedObjects.id, reportIssues.pdfObjectId))
    .where(and(eq(reportIssues.caseId, caseId), isNotNull(reportIssues.releasedAt)))
    .orderBy(desc(reportIssues.number));
  const chosen =
    issueNumber === null ? rows[0] : rows.find((row) => row.issue.number === issueNumber);
  if (!chosen) throw notFound();
  const issues = rows.map(({ issue, pdfSha256, pdfSizeBytes }) => ({
    number: issue.number,
    state: issue.state,
    signedAt: issue.signedAt?.toISOString() ?? "",
    releasedAt: issue.releasedAt?.toISOString() ?? "",
    reason: issue.reason,
    fingerprint: issue.manifestSha256 ?? "",
    pdfSha256,
    pdfSizeBytes,
  }));
  const issue = issues.find((other) => other.number === chosen.issue.number);
  if (!issue) throw notFound();
  return {
    issue,
    others: issues.filter((other) => other.number !== issue.number),
    frozen: frozenReport.parse(chosen.issue.frozen),
  };
}
