import "server-only";
import { database } from "@/db/client";
import type { Actor } from "@/lib/auth/actor";
import { getCase } from "@/lib/cases/get-case";
import { notFound } from "@/lib/errors";
import { findIssue } from "@/lib/findings/find-issue";
import { collectReport } from "./collect-report";
import { figureSource } from "./figure-source";
import { writeReportPdf } from "./pdf/write-report";
import { reportModelOf } from "./report-model";

/** The findings as they stand, printed as a draft that says so on every page. */
export async function draftPdf(
  actor: Actor,
  caseId: string,
): Promise<{ pdf: Buffer; fileName: string }> {
  const { row } = await getCase(actor, "report.preview", caseId);
  const issue = await findIssue(database(), caseId);
  if (!issue) throw notFound();
  const frozen = await collectReport(database(), row, issue, null);
  const model = await reportModelOf(frozen, {
    figure: figureSource(database()),
    fingerprint: null,
    draftRevision: issue.revision,
  });
  const { pdf } = await writeReportPdf(model);
  return { pdf, fileName: `${row.number} issue ${issue.number} draft ${issue.revision}.pdf` };
}
