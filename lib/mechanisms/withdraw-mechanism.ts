import "server-only";
import { and, eq } from "drizzle-orm";
import { records } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { notFound } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { setVoid } from "@/lib/records/void-record";
import { WithdrawMechanismInput } from "./schemas";

/** Takes a mechanism off the list; it stays in the history with the reason. */
export async function withdrawMechanism(actor: Actor, raw: unknown): Promise<{ label: string }> {
  const input = parseInput(WithdrawMechanismInput, raw);
  return writeCase(actor, "mechanism.weigh", input.caseId, async (tx) => {
    const [record] = await tx
      .select({ id: records.id })
      .from(records)
      .where(
        and(
          eq(records.id, input.recordId),
          eq(records.caseId, input.caseId),
          eq(records.kind, "mechanism"),
        ),
      );
    if (!record) throw notFound();
    const { label } = await setVoid(tx, record.id, { isVoid: true, reason: input.reason });
    await recordEvent(tx, {
      caseId: input.caseId,
      actor,
      action: "mechanism.weigh",
      subject: { kind: "mechanism", id: record.id, label },
      before: { isListed: true },
      after: { isListed: false, reason: input.reason },
    });
    return { label };
  });
}
