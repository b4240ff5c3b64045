import "server-only";
import { asc, eq } from "drizzle-orm";
import type { Reader, Transaction } from "@/db/client";
import { caseTechnicians } from "@/db/schema";
import type { Assignment, SeenAssignment } from "./schemas";
import type { CaseRow } from "./subject";

/** Puts exactly these technicians on the case. */
export async function writeTechnicians(
  tx: Transaction,
  caseId: string,
  technicianIds: readonly string[],
): Promise<void> {
  await tx.delete(caseTechnicians).where(eq(caseTechnicians.caseId, caseId));
  const ids = [...new Set(technicianIds)];
  if (ids.length > 0) {
    await tx.insert(caseTechnicians).values(ids.map((personId) => ({ caseId, personId })));
  }
}

/** Columns of the case that an assignment sets. */
export function assignmentColumns(chosen: Assignment) {
  const { priority, leadId, investigatorId, secondReaderId, dueOn } = chosen;
  return { priority, leadId, investigatorId, secondReaderId, dueOn };
}

/** Who is on a case now, as a form shows it; null where nobody is named yet. */
export async function currentAssignment(reader: Reader, row: CaseRow): Promise<SeenAssignment> {
  const technicians = await reader
    .select({ id: caseTechnicians.personId })
    .from(caseTechnicians)
    .where(eq(caseTechnicians.caseId, row.id))
    .orderBy(asc(caseTechnicians.personId));
  return {
    priority: row.priority,
    leadId: row.leadId,
    investigatorId: row.investigatorId,
    secondReaderId: row.secondReaderId,
    technicianIds: technicians.map(({ id }) => id),
    dueOn: row.dueOn,
  };
}
