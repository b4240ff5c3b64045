import "server-only";
import { and, asc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { people, requestFiles, storedObjects } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { getCase } from "@/lib/cases/get-case";
import { notFound } from "@/lib/errors";

export type RequestFile = {
  id: string;
  fileName: string;
  mediaType: string;
  sizeBytes: number;
  caption: string;
  by: string;
  at: string;
};

/** Photographs and papers of a field return, in the order they came. */
export async function listRequestFiles(actor: Actor, caseId: string): Promise<RequestFile[]> {
  await getCase(actor, "case.viewFieldReturn", caseId);
  const rows = await database()
    .select({
      id: requestFiles.id,
      fileName: storedObjects.fileName,
      mediaType: storedObjects.mediaType,
      sizeBytes: storedObjects.sizeBytes,
      caption: requestFiles.caption,
      by: people.name,
      at: requestFiles.madeAt,
    })
    .from(requestFiles)
    .innerJoin(storedObjects, eq(storedObjects.id, requestFiles.objectId))
    .innerJoin(people, eq(people.id, requestFiles.byId))
    .where(and(eq(requestFiles.caseId, caseId), eq(requestFiles.isWithdrawn, false)))
    .orderBy(asc(requestFiles.madeAt), asc(requestFiles.id));
  return rows.map((row) => ({ ...row, at: row.at.toISOString() }));
}

/** Where a paper of a field return stands, for somebody who may read the field return. */
export async function getRequestFile(
  actor: Actor,
  fileId: string,
): Promise<{ key: string; mediaType: string; fileName: string }> {
  const [row] = await database()
    .select({
      caseId: requestFiles.caseId,
      key: storedObjects.key,
      mediaType: storedObjects.mediaType,
      fileName: storedObjects.fileName,
    })
    .from(requestFiles)
    .innerJoin(storedObjects, eq(storedObjects.id, requestFiles.objectId))
    .where(eq(requestFiles.id, fileId));
  if (!row) throw notFound();
  await getCase(actor, "case.viewFieldReturn", row.caseId);
  const { caseId: _caseId, ...file } = row;
  return file;
}
