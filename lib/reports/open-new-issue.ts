import "server-only";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { moveCase } from "@/lib/cases/move-case";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { createIssue } from "@/lib/findings/create-issue";
import { findIssue } from "@/lib/findings/find-issue";
import { parseInput } from "@/lib/http/parse-input";
import { OpenNewIssueInput } from "./schemas";

/** Opens the next issue of a released report, from its text; the old issue stays as it is. */
export async function openNewIssue(actor: Actor, raw: unknown): Promise<{ issueNumber: number }> {
  const input = parseInput(OpenNewIssueInput, raw);
  return writeCase(actor, "report.openNewIssue", input.caseId, async (tx, { row }) => {
    const last = await findIssue(tx, input.caseId, "lock");
    if (!last || last.releasedAt === null)
      throw new AppError("LOCKED", "The last issue is not released yet.");
    const number = last.number + 1;
    const { issueId } = await createIssue(tx, actor, {
      caseId: row.id,
      number,
      reason: input.reason,
      document: last.document,
      rootCause: last.rootCause,
    });
    await moveCase(tx, actor, row, "reopen", {}, input.reason);
    await recordEvent(tx, {
      caseId: row.id,
      actor,
      action: "report.openNewIssue",
      subject: { kind: "report_issue", id: issueId, label: `Report, issue ${number}` },
      before: { issue: last.number },
      after: { issue: number, reason: input.reason },
    });
    return { issueNumber: number };
  });
}
