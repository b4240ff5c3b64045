import "server-only";
import { database } from "@/db/client";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { parseInput } from "@/lib/http/parse-input";
import { setVoid } from "@/lib/records/void-record";
import { findMark, placeOfMark } from "./find-mark";
import { RestoreMarkInput } from "./mark-schemas";
import { openImage } from "./open-image";
import { checkMark, remeasure } from "./write-mark";

/**
 * Puts a deleted mark back under its old label, with the values of today's scale.
 * @throws AppError CONFLICT when it is in place already; INVALID when it no longer fits
 */
export async function restoreMark(actor: Actor, input: unknown): Promise<{ label: string }> {
  const { markId } = parseInput(RestoreMarkInput, input);
  const { caseId, imageId } = await placeOfMark(database(), markId);
  return writeCase(actor, "image.mark", caseId, async (tx) => {
    const image = await openImage(tx, imageId);
    const { state, mark } = await findMark(tx, imageId, markId);
    checkMark(image, state, { ...mark.content, originId: null }, markId);
    await setVoid(tx, markId, { isVoid: false });
    await remeasure(tx, actor, imageId, `${mark.label} was restored`);
    await recordEvent(tx, {
      caseId,
      actor,
      action: "image.mark",
      subject: { kind: "mark", id: markId, label: `${image.label} ${mark.label}` },
      before: { state: "void" },
      after: { version: mark.number, state: "recorded" },
    });
    return { label: mark.label };
  });
}
