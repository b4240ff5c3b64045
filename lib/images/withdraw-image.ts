import "server-only";
import { database } from "@/db/client";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { parseInput } from "@/lib/http/parse-input";
import { setVoid } from "@/lib/records/void-record";
import { PutBackImageInput, WithdrawImageInput } from "./image-schemas";
import { caseOfImage } from "./open-image";

/** Withdraws a picture with a reason. It stays visible; figures and values that rest on it turn stale. */
export async function withdrawImage(actor: Actor, raw: unknown): Promise<{ label: string }> {
  const { imageId, reason } = parseInput(WithdrawImageInput, raw);
  const caseId = await caseOfImage(database(), imageId);
  return writeCase(actor, "image.describe", caseId, async (tx) => {
    const { label } = await setVoid(tx, imageId, { isVoid: true, reason });
    await recordEvent(tx, {
      caseId,
      actor,
      action: "image.describe",
      subject: { kind: "image", id: imageId, label },
      before: { isWithdrawn: false },
      after: { isWithdrawn: true, reason },
    });
    return { label };
  });
}

/** Puts a withdrawn picture back. */
export async function putBackImage(actor: Actor, raw: unknown): Promise<{ label: string }> {
  const { imageId } = parseInput(PutBackImageInput, raw);
  const caseId = await caseOfImage(database(), imageId);
  return writeCase(actor, "image.describe", caseId, async (tx) => {
    const { label } = await setVoid(tx, imageId, { isVoid: false });
    await recordEvent(tx, {
      caseId,
      actor,
      action: "image.describe",
      subject: { kind: "image", id: imageId, label },
      before: { isWithdrawn: true },
      after: { isWithdrawn: false },
    });
    return { label };
  });
}
