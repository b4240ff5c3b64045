import "server-only";
import { desc, eq, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { cases, custodyEntries, records } from "@/db/schema";
import { canonicalJson, sha256Hex } from "@/lib/canonical-json";
import { AppError } from "@/lib/errors";
import { newId } from "@/lib/new-id";

type NewEntry = Omit<
  typeof custodyEntries.$inferInsert,
  "id" | "position" | "sha256" | "madeAt" | "caseId" | "itemId"
>;

const START = "0".repeat(64);
const CLOCK_TOLERANCE_MS = 5 * 60_000;

export async function lastEntry(tx: Transaction, itemId: string) {
  const [entry] = await tx
    .select()
    .from(custodyEntries)
    .where(eq(custodyEntries.itemId, itemId))
    .orderBy(desc(custodyEntries.position))
    .limit(1);
  return entry ?? null;
}

/**
 * Appends one entry to the chain of an item, sealed to the one before.
 * @throws AppError INVALID when its time lies before the last entry or in the future
 */
export async function appendCustody(
  tx: Transaction,
  caseId: string,
  itemId: string,
  entry: NewEntry,
): Promise<{ id: string; position: number }> {
  await tx.select({ id: records.id }).from(records).where(eq(records.id, itemId)).for("update");
  const last = await lastEntry(tx, itemId);
  if (last && entry.act !== "correction" && entry.at < last.at) {
    throw new AppError("INVALID", undefined, {
      fields: { at: "This is before the last entry of the item. Time runs forward." },
    });
  }
  if (entry.at.getTime() > Date.now() + CLOCK_TOLERANCE_MS) {
    throw new AppError("INVALID", undefined, { fields: { at: "This lies in the future." } });
  }
  const position = (last?.position ?? 0) + 1;
  const sealed = { ...entry, itemId, position, previous: last?.sha256 ?? START };
  const id = newId("cus");
  await tx
    .insert(custodyEntries)
    .values({ ...entry, id, caseId, itemId, position, sha256: sha256Hex(canonicalJson(sealed)) });
  return { id, position };
}

export async function countItem(tx: Transaction, caseId: string): Promise<void> {
  await tx
    .update(cases)
    .set({ itemCount: sql`${cases.itemCount} + 1` })
    .where(eq(cases.id, caseId));
}
