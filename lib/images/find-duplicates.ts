import "server-only";
import { aliasedTable, and, eq, inArray, ne } from "drizzle-orm";
import { database } from "@/db/client";
import { cases, images, records, storedObjects } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { visibleCases } from "@/lib/cases/visible";

export type SamePicture = {
  caseId: string;
  caseNumber: string | null;
  imageId: string;
  label: string;
};

/**
 * For each of some pictures, where the very same file stands already: earlier pictures only, in cases
 * that this person may see.
 */
export async function findDuplicates(
  actor: Actor,
  imageIds: readonly string[],
): Promise<Map<string, SamePicture[]>> {
  const found = new Map<string, SamePicture[]>();
  if (imageIds.length === 0) return found;
  const ownObject = aliasedTable(storedObjects, "own_object");
  const ownImage = aliasedTable(images, "own_image");
  const rows = await database()
    .select({
      of: ownImage.recordId,
      caseId: cases.id,
      caseNumber: cases.number,
      imageId: images.recordId,
      label: records.label,
    })
    .from(ownImage)
    .innerJoin(ownObject, eq(ownObject.id, ownImage.objectId))
    .innerJoin(storedObjects, eq(storedObjects.sha256, ownObject.sha256))
    .innerJoin(images, eq(images.objectId, storedObjects.id))
    .innerJoin(records, eq(records.id, images.recordId))
    .innerJoin(cases, eq(cases.id, images.caseId))
    .where(
      and(
        inArray(ownImage.recordId, [...imageIds]),
        ne(images.recordId, ownImage.recordId),
        ne(records.state, "void"),
        visibleCases(actor),
      ),
    );
  for (const { of, ...same } of rows) {
    // Ids begin with the time they were made at.
    if (same.imageId < of) found.set(of, [...(found.get(of) ?? []), same]);
  }
  return found;
}
