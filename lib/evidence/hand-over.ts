import "server-only";
import { and, eq } from "drizzle-orm";
import { custodyEntries, people, records } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { canMove } from "@/lib/cases/lifecycle";
import { moveCase } from "@/lib/cases/move-case";
import { writeCase } from "@/lib/cases/write-case";
import { AppError, notFound } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { HandOverInput } from "./schemas";
import { appendCustody, lastEntry } from "./write-custody";

/**
 * Writes the next entry of an item's chain of custody. It starts where the last one ended. The
 * first item taken to a bench starts the examination.
 * @throws AppError CONFLICT when someone else wrote an entry in the meantime
 */
export async function handOver(
  actor: Actor,
  raw: unknown,
): Promise<{ entryId: string; label: string }> {
  const input = parseInput(HandOverInput, raw);
  return writeCase(actor, "evidence.handOver", input.caseId, async (tx, { row }) => {
    const [item] = await tx
      .select({ id: records.id, label: records.label })
      .from(records)
      .where(
        and(
          eq(records.id, input.itemId),
          eq(records.caseId, input.caseId),
          eq(records.kind, "item"),
        ),
      );
    if (!item) throw notFound();
    const last = await lastEntry(tx, item.id);
    if ((last?.position ?? 0) !== input.seenPosition) {
      throw new AppError(
        "CONFLICT",
        `${item.label} has a new entry since you opened it. Nothing was written. Load it again and write yours.`,
      );
    }
    if (input.holderId !== null) {
      const [holder] = await tx
        .select({ id: people.id })
        .from(people)
        .where(and(eq(people.id, input.holderId), eq(people.isActive, true)));
      if (!holder)
        throw new AppError("INVALID", undefined, { fields: { holderId: "Choose a person." } });
    }
    if (input.correctsId !== null) {
      const [corrected] = await tx
        .select({ id: custodyEntries.id })
        .from(custodyEntries)
        .where(and(eq(custodyEntries.id, input.correctsId), eq(custodyEntries.itemId, item.id)));
      if (!corrected)
        throw new AppError("INVALID", undefined, {
          fields: { correctsId: "Choose an entry of this item." },
        });
    }
    const fromPlace = last?.toPlace ?? "";
    const entry = await appendCustody(tx, input.caseId, item.id, {
      act: input.act,
      at: new Date(input.at),
      fromPlace,
      toPlace: input.act === "correction" ? fromPlace : input.toPlace,
      holderId: input.holderId,
      reason: input.act === "correction" ? `${input.reason} (${input.toPlace})` : input.reason,
      conditionNote: input.conditionNote,
      sealBroken: input.sealBroken,
      sealFitted: input.sealFitted,
      correctsId: input.correctsId,
      byId: actor.id,
    });
    await recordEvent(tx, {
      caseId: input.caseId,
      actor,
      action: "evidence.handOver",
      subject: { kind: "item", id: item.id, label: item.label },
      before: { place: fromPlace },
      after: { act: input.act, place: input.toPlace, reason: input.reason },
    });
    if (input.act === "taken_to_bench" && canMove("startExamining", row.state)) {
      await moveCase(tx, actor, row, "startExamining");
    }
    return { entryId: entry.id, label: item.label };
  });
}
