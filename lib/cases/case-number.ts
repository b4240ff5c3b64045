import "server-only";
import { eq, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { caseNumbers } from "@/db/schema";
import { LABORATORY_TIME_ZONE } from "@/lib/format/dates";
import { dayIn } from "@/lib/intake/moment";

/**
 * Next case number of a year on the laboratory's calendar: RL-2026-0142. The row of the year stays
 * locked to the end of the transaction, so a rollback leaves no gap.
 */
export async function nextCaseNumber(tx: Transaction, at: Date): Promise<string> {
  const year = Number(dayIn(LABORATORY_TIME_ZONE, at).slice(0, 4));
  await tx
    .insert(caseNumbers)
    .values({ year, last: 1 })
    .onDuplicateKeyUpdate({ set: { last: sql`${caseNumbers.last} + 1` } });
  const [row] = await tx
    .select({ last: caseNumbers.last })
    .from(caseNumbers)
    .where(eq(caseNumbers.year, year));
  if (!row) throw new Error(`the case numbers of ${year} have no row`);
  return `RL-${year}-${String(row.last).padStart(4, "0")}`;
}
