import "server-only";
import { and, eq, isNull } from "drizzle-orm";
import { caseHolds, cases } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { AppError, notFound } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { HOLD_NAMES } from "./constants";
import { ClearHoldInput } from "./schemas";
import { writeCase } from "./write-case";

/** Takes one hold off a case. A legal hold needs the authority that allowed it, in writing. */
export async function clearHold(actor: Actor, raw: unknown): Promise<void> {
  const input = parseInput(ClearHoldInput, raw);
  await writeCase(actor, "case.clearHold", input.caseId, async (tx, { row }) => {
    const standing = await tx
      .select()
      .from(caseHolds)
      .where(and(eq(caseHolds.caseId, row.id), isNull(caseHolds.clearedAt)))
      .for("update");
    const hold = standing.find(({ id }) => id === input.holdId);
    if (!hold) {
      const [gone] = await tx
        .select({ id: caseHolds.id })
        .from(caseHolds)
        .where(and(eq(caseHolds.id, input.holdId), eq(caseHolds.caseId, row.id)));
      if (!gone) throw notFound();
      throw new AppError("CONFLICT", "This hold was taken off in the meantime.");
    }
    if (hold.kind === "legal" && !input.authority) {
      throw new AppError("INVALID", undefined, {
        fields: { authority: "Say who allowed it, and on what paper." },
      });
    }
    const clearReason = input.authority
      ? `${input.reason} Allowed by: ${input.authority}`
      : input.reason;
    await tx
      .update(caseHolds)
      .set({ clearedById: actor.id, clearedAt: new Date(), clearReason })
      .where(eq(caseHolds.id, hold.id));
    const left = standing.filter(({ id }) => id !== hold.id);
    const after = {
      isOnHold: left.length > 0,
      isRestricted: left.some(({ kind }) => kind === "restricted"),
    };
    await tx.update(cases).set(after).where(eq(cases.id, row.id));
    await recordEvent(tx, {
      caseId: row.id,
      actor,
      action: "case.clearHold",
      subject: { kind: "hold", id: hold.id, label: HOLD_NAMES[hold.kind] },
      before: { isOnHold: row.isOnHold, isRestricted: row.isRestricted },
      after: { ...after, kind: hold.kind, clearReason },
    });
  });
}
