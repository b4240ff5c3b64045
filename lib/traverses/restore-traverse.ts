import "server-only";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { parseInput } from "@/lib/http/parse-input";
import { setVoid } from "@/lib/records/void-record";
import { RestoreTraverseInput } from "./schemas";
import { findTraverse } from "./write-traverse";

/** Puts a withdrawn traverse back, with its result. */
export async function restoreTraverse(actor: Actor, raw: unknown): Promise<{ label: string }> {
  const { caseId, traverseId } = parseInput(RestoreTraverseInput, raw);
  return writeCase(actor, "traverse.record", caseId, async (tx) => {
    const { resultId } = await findTraverse(tx, caseId, traverseId);
    const { label } = await setVoid(tx, traverseId, { isVoid: false });
    await setVoid(tx, resultId, { isVoid: false });
    await recordEvent(tx, {
      caseId,
      actor,
      action: "traverse.record",
      subject: { kind: "traverse", id: traverseId, label },
      before: { isWithdrawn: true },
      after: { isWithdrawn: false },
    });
    return { label };
  });
}
