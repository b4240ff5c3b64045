import "server-only";
import { database } from "@/db/client";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { parseInput } from "@/lib/http/parse-input";
import type { WrittenVersion } from "@/lib/records/write-version";
import { PlaceMarkInput } from "./mark-schemas";
import { caseOfImage, openImage } from "./open-image";
import { createMark, remeasure } from "./write-mark";

/**
 * Puts a mark on a picture; its values are computed here.
 * @throws AppError INVALID for a shape that is off the picture or measures nothing, LOCKED, NOT_FOUND
 */
export async function placeMark(actor: Actor, input: unknown): Promise<WrittenVersion> {
  const { imageId, ...description } = parseInput(PlaceMarkInput, input);
  const caseId = await caseOfImage(database(), imageId);
  return writeCase(actor, "image.mark", caseId, async (tx) => {
    const image = await openImage(tx, imageId);
    const written = await createMark(tx, actor, image, description);
    await remeasure(tx, actor, imageId, `${written.label} was placed`);
    await recordEvent(tx, {
      caseId,
      actor,
      action: "image.mark",
      subject: { kind: "mark", id: written.recordId, label: `${image.label} ${written.label}` },
      before: null,
      after: { version: written.number, ...description },
    });
    return written;
  });
}
