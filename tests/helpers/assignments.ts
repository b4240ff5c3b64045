import type { Assignment } from "@/lib/cases/schemas";
import { asInvestigator, asLead, asSecondInvestigator, asTechnician } from "./people";

/** Day of the calendar `days` from now, in UTC. */
export const dayFromNow = (days: number) =>
  new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10);

/** The people of ./people on one case, due in a month. */
export async function anAssignment(change: Partial<Assignment> = {}): Promise<Assignment> {
  return {
    priority: "P3",
    leadId: (await asLead()).id,
    investigatorId: (await asInvestigator()).id,
    secondReaderId: (await asSecondInvestigator()).id,
    technicianIds: [(await asTechnician()).id],
    dueOn: dayFromNow(30),
    ...change,
  };
}

/** What the lead engineer sends to accept a case. */
export async function anAcceptance(caseId: string, change: Partial<Assignment> = {}) {
  return {
    caseId,
    ...(await anAssignment(change)),
    impartialityStatement: "Nobody named here owns the design, the process or the supplier.",
    earlierReturnsSeen: true,
  };
}
