import "server-only";
import { eq, sql } from "drizzle-orm";
import { database, type Transaction } from "@/db/client";
import { cases } from "@/db/schema";
import { transaction } from "@/db/transaction";
import type { Actor } from "@/lib/auth/actor";
import type { Action } from "@/lib/auth/policy";
import { requireAllowed } from "@/lib/auth/require";
import { notFound } from "@/lib/errors";
import { findCase, type LoadedCase } from "./subject";
import { refreshOpenGateCount } from "./gate-count";

/**
 * The frame of every write to a case: asks the policy, then again with the case row locked, runs
 * `work` in the transaction, and marks the case as changed. `work` records its own event.
 */
export async function writeCase<T>(
  actor: Actor,
  action: Action,
  caseId: string,
  work: (tx: Transaction, loaded: LoadedCase) => Promise<T>,
): Promise<T> {
  const seen = await findCase(database(), caseId);
  if (!seen) throw notFound();
  requireAllowed(actor, action, seen.subject);
  return transaction(async (tx) => {
    const loaded = await findCase(tx, caseId, "lock");
    if (!loaded) throw notFound();
    requireAllowed(actor, action, loaded.subject);
    const result = await work(tx, loaded);
    await touchCase(tx, caseId);
    return result;
  });
}

/** Marks a case as changed and brings its count of open gates up to date. */
export async function touchCase(tx: Transaction, caseId: string): Promise<void> {
  await tx
    .update(cases)
    .set({ changedAt: new Date(), revision: sql`${cases.revision} + 1` })
    .where(eq(cases.id, caseId));
  await refreshOpenGateCount(tx, caseId);
}
