import "server-only";
import type { Readable } from "node:stream";
import { and, eq, isNotNull } from "drizzle-orm";
import { database } from "@/db/client";
import { reportIssues, storedObjects } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { getCase } from "@/lib/cases/get-case";
import { notFound } from "@/lib/errors";
import { objectStore } from "@/lib/storage/s3";

export type OpenedPdf = { body: Readable; fileName: string; sizeBytes: number; sha256: string };

/** The stored PDF of a released issue. @throws AppError NOT_FOUND while there is none */
export async function openReportPdf(
  actor: Actor,
  caseId: string,
  issueNumber: number,
): Promise<OpenedPdf> {
  await getCase(actor, "report.read", caseId);
  const [row] = await database()
    .select({
      key: storedObjects.key,
      fileName: storedObjects.fileName,
      sizeBytes: storedObjects.sizeBytes,
      sha256: storedObjects.sha256,
    })
    .from(reportIssues)
    .innerJoin(storedObjects, eq(storedObjects.id, reportIssues.pdfObjectId))
    .where(
      and(
        eq(reportIssues.caseId, caseId),
        eq(reportIssues.number, issueNumber),
        isNotNull(reportIssues.releasedAt),
      ),
    );
  if (!row) throw notFound();
  const { body } = await objectStore().get(row.key);
  return { body, fileName: row.fileName, sizeBytes: row.sizeBytes, sha256: row.sha256 };
}
