import "server-only";
import { and, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { images, records, recordVersions } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { notFound } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { addVersion, type WrittenVersion } from "@/lib/records/write-version";
import { checkItem } from "./check-item";
import { DescribeImageInput } from "./image-schemas";
import { caseOfImage } from "./open-image";

/**
 * Changes what is said of a picture.
 * @throws AppError CONFLICT with both contents when somebody else changed it; INVALID, LOCKED
 */
export async function describeImage(actor: Actor, raw: unknown): Promise<WrittenVersion> {
  const { imageId, seenVersion, content, isShareable } = parseInput(DescribeImageInput, raw);
  const caseId = await caseOfImage(database(), imageId);
  return writeCase(actor, "image.describe", caseId, async (tx) => {
    await checkItem(tx, caseId, content.itemId, "content.itemId");
    const [before] = await tx
      .select({ content: recordVersions.content, isShareable: images.isShareable })
      .from(images)
      .innerJoin(records, eq(records.id, images.recordId))
      .innerJoin(
        recordVersions,
        and(
          eq(recordVersions.recordId, records.id),
          eq(recordVersions.number, records.latestVersion),
        ),
      )
      .where(eq(images.recordId, imageId));
    if (!before) throw notFound();
    const written = await addVersion(tx, actor, imageId, seenVersion, { content });
    await tx.update(images).set({ isShareable }).where(eq(images.recordId, imageId));
    await recordEvent(tx, {
      caseId,
      actor,
      action: "image.describe",
      subject: { kind: "image", id: imageId, label: written.label },
      before,
      after: { content, isShareable },
    });
    return written;
  });
}
