import "server-only";
import { database } from "@/db/client";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import type { WrittenVersion } from "@/lib/records/write-version";
import { findMark, placeOfMark } from "./find-mark";
import { ChangeMarkInput } from "./mark-schemas";
import { openImage } from "./open-image";
import { remeasure, reviseMark } from "./write-mark";

/**
 * Changes a mark's shape, feature, name, confidence or note.
 * @throws AppError CONFLICT with both contents when somebody changed it since `seenVersion`
 */
export async function changeMark(actor: Actor, input: unknown): Promise<WrittenVersion> {
  const { markId, seenVersion, ...description } = parseInput(ChangeMarkInput, input);
  const { caseId, imageId } = await placeOfMark(database(), markId);
  return writeCase(actor, "image.mark", caseId, async (tx) => {
    const image = await openImage(tx, imageId);
    const { mark } = await findMark(tx, imageId, markId);
    if (mark.content.tool !== description.geometry.tool) {
      throw new AppError(
        "INVALID",
        `${mark.label} cannot turn into another kind of mark. Nothing was changed. Place a new mark instead.`,
      );
    }
    const written = await reviseMark(tx, actor, image, markId, seenVersion, description);
    await remeasure(tx, actor, imageId, `${mark.label} was changed`);
    const { measurements: _values, tool: _tool, ...before } = mark.content;
    await recordEvent(tx, {
      caseId,
      actor,
      action: "image.mark",
      subject: { kind: "mark", id: markId, label: `${image.label} ${mark.label}` },
      before: { version: mark.number, ...before },
      after: { version: written.number, ...description },
    });
    return written;
  });
}
