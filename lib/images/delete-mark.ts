import "server-only";
import { database } from "@/db/client";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { setVoid } from "@/lib/records/void-record";
import { findMark, placeOfMark } from "./find-mark";
import { DeleteMarkInput } from "./mark-schemas";
import { openImage } from "./open-image";
import { remeasure } from "./write-mark";

/**
 * Takes a mark off its picture. It is kept and can be restored; its label is not used again.
 * @throws AppError CONFLICT when somebody changed or deleted it since `seenVersion`
 */
export async function deleteMark(actor: Actor, input: unknown): Promise<{ label: string }> {
  const { markId, seenVersion, reason } = parseInput(DeleteMarkInput, input);
  const { caseId, imageId } = await placeOfMark(database(), markId);
  return writeCase(actor, "image.mark", caseId, async (tx) => {
    const image = await openImage(tx, imageId);
    const { mark } = await findMark(tx, imageId, markId);
    if (mark.number !== seenVersion && !mark.isVoid) {
      throw new AppError(
        "CONFLICT",
        `${mark.label} was not deleted. ${mark.by} changed it since you opened it. Look at it, then delete it again.`,
        {
          conflict: {
            yours: null,
            theirs: mark.content,
            changedBy: mark.by,
            changedAt: mark.at.toISOString(),
          },
        },
      );
    }
    await setVoid(tx, markId, { isVoid: true, reason });
    await remeasure(tx, actor, imageId, `${mark.label} was deleted`);
    await recordEvent(tx, {
      caseId,
      actor,
      action: "image.mark",
      subject: { kind: "mark", id: markId, label: `${image.label} ${mark.label}` },
      before: { version: mark.number, state: "recorded" },
      after: { state: "void", reason },
    });
    return { label: mark.label };
  });
}
