import "server-only";
import { eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { cases } from "@/db/schema";
import { gateLedger } from "./gates";

/** Keeps the number of open gates on the case, so that the list need not work it out. */
export async function refreshOpenGateCount(tx: Transaction, caseId: string): Promise<void> {
  const ledger = await gateLedger(tx, caseId);
  await tx
    .update(cases)
    .set({ openGateCount: ledger.filter((gate) => !gate.isMet).length })
    .where(eq(cases.id, caseId));
}
