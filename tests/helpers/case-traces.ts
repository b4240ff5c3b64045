import { and, asc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { auditEvents, caseMoves, cases } from "@/db/schema";

export async function caseRow(caseId: string) {
  const [row] = await database().select().from(cases).where(eq(cases.id, caseId));
  if (!row) throw new Error(`there is no case ${caseId}`);
  return row;
}

export async function movesOf(caseId: string) {
  return database()
    .select({ from: caseMoves.fromState, to: caseMoves.toState, reason: caseMoves.reason })
    .from(caseMoves)
    .where(eq(caseMoves.caseId, caseId))
    .orderBy(asc(caseMoves.at), asc(caseMoves.id));
}

export async function eventsOf(caseId: string, action?: string) {
  return database()
    .select()
    .from(auditEvents)
    .where(
      and(
        eq(auditEvents.chain, caseId),
        action === undefined ? undefined : eq(auditEvents.action, action),
      ),
    )
    .orderBy(asc(auditEvents.position));
}
