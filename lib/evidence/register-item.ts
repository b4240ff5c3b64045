import "server-only";
import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { items, records } from "@/db/schema";
import { recordEvent } from "@/lib/audit/record";
import type { Actor } from "@/lib/auth/actor";
import { writeCase } from "@/lib/cases/write-case";
import { AppError } from "@/lib/errors";
import { parseInput } from "@/lib/http/parse-input";
import { createRecord, nextLabel } from "@/lib/records/write-version";
import { ITEM_PREFIX, type ItemKind } from "./constants";
import { RegisterItemInput } from "./schemas";
import { appendCustody, countItem } from "./write-custody";

async function labelFor(
  tx: Transaction,
  caseId: string,
  kind: ItemKind,
  parent: { id: string; label: string } | null,
) {
  if (kind === "cut" && parent) {
    return nextLabel(tx, parent.id, `${parent.label}.`);
  }
  return nextLabel(tx, caseId, ITEM_PREFIX[kind === "cut" ? "part" : kind]);
}

/**
 * Registers a piece with its first custody entry: received, or cut from another.
 * @throws AppError INVALID when the piece it was taken from is not an item of this case
 */
export async function registerItem(
  actor: Actor,
  raw: unknown,
): Promise<{ itemId: string; label: string }> {
  const input = parseInput(RegisterItemInput, raw);
  return writeCase(actor, "evidence.register", input.caseId, async (tx) => {
    const [parent] =
      input.parentId === null
        ? []
        : await tx
            .select({ id: records.id, label: records.label })
            .from(records)
            .where(
              and(
                eq(records.id, input.parentId),
                eq(records.caseId, input.caseId),
                eq(records.kind, "item"),
              ),
            );
    if (input.parentId !== null && !parent) {
      throw new AppError("INVALID", undefined, {
        fields: { parentId: "Choose an item of this case." },
      });
    }
    const label = await labelFor(tx, input.caseId, input.kind, parent ?? null);
    const written = await createRecord(
      tx,
      actor,
      { caseId: input.caseId, kind: "item", label },
      { content: input.content },
    );
    await tx.insert(items).values({
      recordId: written.recordId,
      caseId: input.caseId,
      kind: input.kind,
      parentId: parent?.id ?? null,
    });
    await appendCustody(tx, input.caseId, written.recordId, {
      act: parent ? "cut" : "received",
      at: new Date(input.at),
      fromPlace: input.fromPlace,
      toPlace: input.toPlace,
      holderId: actor.id,
      reason: input.reason,
      conditionNote: input.content.condition.join(", ") || null,
      sealFitted: input.content.seal || null,
      byId: actor.id,
    });
    await countItem(tx, input.caseId);
    await recordEvent(tx, {
      caseId: input.caseId,
      actor,
      action: "evidence.register",
      subject: { kind: "item", id: written.recordId, label },
      before: null,
      after: { ...input.content, kind: input.kind, from: input.fromPlace, to: input.toPlace },
    });
    return { itemId: written.recordId, label };
  });
}
