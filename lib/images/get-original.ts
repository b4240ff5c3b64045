import "server-only";
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { images, records, storedObjects } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { getCase } from "@/lib/cases/get-case";
import { notFound } from "@/lib/errors";

export type Original = { key: string; mediaType: string; fileName: string; label: string };

/** Where the unchanged file of a picture stands, for somebody who may see the work. */
export async function getOriginal(actor: Actor, imageId: string): Promise<Original> {
  const [row] = await database()
    .select({
      caseId: images.caseId,
      key: storedObjects.key,
      mediaType: storedObjects.mediaType,
      fileName: storedObjects.fileName,
      label: records.label,
    })
    .from(images)
    .innerJoin(storedObjects, eq(storedObjects.id, images.objectId))
    .innerJoin(records, eq(records.id, images.recordId))
    .where(eq(images.recordId, imageId));
  if (!row) throw notFound();
  await getCase(actor, "case.viewWork", row.caseId);
  const { caseId: _caseId, ...original } = row;
  return original;
}
