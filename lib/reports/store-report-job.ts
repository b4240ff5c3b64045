import "server-only";
import { eq } from "drizzle-orm";
import { z } from "zod";
import { database } from "@/db/client";
import { reportIssues, storedObjects } from "@/db/schema";
import { transaction } from "@/db/transaction";
import { sha256Hex } from "@/lib/canonical-json";
import type { JobHandler } from "@/lib/jobs/handler";
import { newId } from "@/lib/new-id";
import { objectStore } from "@/lib/storage/s3";
import { figureSource } from "./figure-source";
import { frozenReport } from "./frozen-report";
import { writeReportPdf } from "./pdf/write-report";
import { releaseIssue } from "./release-issue";
import { reportModelOf } from "./report-model";

const payloadShape = z.object({ issueId: z.string() });
const PDF = "application/pdf";

/**
 * Writes the PDF of a signed issue, stores it, reads it back, and releases the report once the
 * stored bytes have the same SHA-256. Each step finds what an earlier try has done.
 */
async function storeReport(payload: unknown): Promise<void> {
  const { issueId } = payloadShape.parse(payload);
  const [issue] = await database().select().from(reportIssues).where(eq(reportIssues.id, issueId));
  if (!issue?.signedAt || issue.manifestSha256 === null)
    throw new Error(`issue ${issueId} is not signed`);
  if (issue.releasedAt !== null) return;
  const frozen = frozenReport.parse(issue.frozen);
  const { pdf } = await writeReportPdf(
    await reportModelOf(frozen, {
      figure: figureSource(database()),
      fingerprint: issue.manifestSha256,
      draftRevision: null,
    }),
  );
  const sha256 = sha256Hex(pdf);
  const key = `reports/${issue.caseId}/${issue.id}/${sha256}.pdf`;
  await objectStore().put(key, pdf, PDF);
  const stored = await objectStore().getBytes(key);
  if (sha256Hex(stored) !== sha256)
    throw new Error(`the stored report ${key} is not what was sent`);

  await transaction(async (tx) => {
    const [row] = await tx
      .select()
      .from(reportIssues)
      .where(eq(reportIssues.id, issueId))
      .for("update");
    if (!row || row.releasedAt !== null) return;
    const objectId = newId("obj");
    await tx.insert(storedObjects).values({
      id: objectId,
      caseId: row.caseId,
      key,
      fileName: `${frozen.caseNumber} issue ${row.number}.pdf`,
      mediaType: PDF,
      sizeBytes: pdf.byteLength,
      sha256,
      madeById: row.signedById,
    });
    await releaseIssue(tx, row, { objectId, sha256, pdfKey: key });
  });
}

export const storeReportJob: JobHandler = { run: storeReport };
