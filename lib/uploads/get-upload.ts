import "server-only";
import { and, asc, eq, gt, inArray, or, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { records, uploadParts, uploads } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { getCase } from "@/lib/cases/get-case";
import { notFound } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { UNFINISHED_KEPT_DAYS } from "./constants";
import { UnfinishedQuery, type UploadStatus } from "./schemas";

const sentBytes = sql<number>`coalesce((select sum(${uploadParts.sizeBytes}) from ${uploadParts}
  where ${uploadParts.uploadId} = ${uploads.id}), 0)`.mapWith(Number);

function statuses() {
  return database()
    .select({
      uploadId: uploads.id,
      caseId: uploads.caseId,
      purpose: uploads.purpose,
      state: uploads.state,
      fileName: uploads.fileName,
      sizeBytes: uploads.sizeBytes,
      sentBytes,
      startedAt: uploads.madeAt,
      refusal: uploads.refusal,
      imageId: uploads.imageId,
      imageLabel: records.label,
    })
    .from(uploads)
    .leftJoin(records, eq(records.id, uploads.imageId))
    .$dynamic();
}

/** Where a file of this person's own stands. @throws AppError NOT_FOUND */
export async function getUpload(actor: Actor, uploadId: string): Promise<UploadStatus> {
  const [row] = await statuses().where(and(eq(uploads.id, uploadId), eq(uploads.byId, actor.id)));
  if (!row) throw notFound();
  await getCase(actor, "case.view", row.caseId);
  return { ...row, startedAt: row.startedAt.toISOString() };
}

/** Files of this person's own that are on their way to a case, being checked, or were refused. */
export async function listUnfinished(actor: Actor, raw: unknown): Promise<UploadStatus[]> {
  const { caseId, purpose } = parseInput(UnfinishedQuery, raw);
  await getCase(actor, "case.view", caseId);
  const since = new Date(Date.now() - UNFINISHED_KEPT_DAYS * 86_400_000);
  const rows = await statuses()
    .where(
      and(
        eq(uploads.caseId, caseId),
        eq(uploads.byId, actor.id),
        eq(uploads.purpose, purpose),
        or(
          inArray(uploads.state, ["sending", "sent"]),
          and(eq(uploads.state, "refused"), gt(uploads.changedAt, since)),
        ),
      ),
    )
    .orderBy(asc(uploads.madeAt), asc(uploads.id));
  return rows.map((row) => ({ ...row, startedAt: row.startedAt.toISOString() }));
}
