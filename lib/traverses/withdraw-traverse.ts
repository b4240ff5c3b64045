import "server-only";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { parseInput } from "@/lib/http/parse-input";
import { setVoid } from "@/lib/records/void-record";
import { WithdrawTraverseInput } from "./schemas";
import { findTraverse } from "./write-traverse";

/** Withdraws a traverse and its result: they stay visible, and what cites them has to be mended. */
export async function withdrawTraverse(actor: Actor, raw: unknown): Promise<{ label: string }> {
  const { caseId, traverseId, reason } = parseInput(WithdrawTraverseInput, raw);
  return writeCase(actor, "traverse.record", caseId, async (tx) => {
    const { resultId } = await findTraverse(tx, caseId, traverseId);
    const { label } = await setVoid(tx, traverseId, { isVoid: true, reason });
    await setVoid(tx, resultId, { isVoid: true, reason });
    await recordEvent(tx, {
      caseId,
      actor,
      action: "traverse.record",
      subject: { kind: "traverse", id: traverseId, label },
      before: { isWithdrawn: false },
      after: { isWithdrawn: true, reason },
    });
    return { label };
  });
}
