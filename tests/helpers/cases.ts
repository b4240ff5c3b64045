import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cases, caseTechnicians } from "@/db/schema";
import { type CaseState, STAGE_OF_STATE } from "@/lib/cases/constants";
import { newId } from "@/lib/new-id";
import { asInvestigator, asLead, asRequester, asSecondInvestigator, asTechnician } from "./people";

let made = 0;

/**
 * A case in any state, with everybody of ./people named on it unless said otherwise. It is written
 * straight to the tables, so what a verb has to do before stands in that verb's own tests.
 */
export async function aCase(
  given: Partial<typeof cases.$inferInsert> & { state?: CaseState; withTechnician?: boolean } = {},
): Promise<string> {
  const { withTechnician = true, ...columns } = given;
  const state = columns.state ?? "examining";
  const [requester, lead, investigator, secondReader, technician] = await Promise.all([
    asRequester(),
    asLead(),
    asInvestigator(),
    asSecondInvestigator(),
    asTechnician(),
  ]);
  const id = newId("case");
  made += 1;
  const isAccepted = STAGE_OF_STATE[state] >= 2;
  await database()
    .insert(cases)
    .values({
      id,
      number: state === "draft" ? null : `RL-2026-${String(1000 + made)}`,
      organisationId: requester.organisationId,
      requesterId: requester.id,
      title: "A shaft that broke",
      stage: STAGE_OF_STATE[state],
      leadId: isAccepted ? lead.id : null,
      investigatorId: isAccepted ? investigator.id : null,
      secondReaderId: isAccepted ? secondReader.id : null,
      ...columns,
      state,
    });
  if (isAccepted && withTechnician) {
    await database().insert(caseTechnicians).values({ caseId: id, personId: technician.id });
  }
  return id;
}

/** Puts a case into another state, as if its moves had been made. */
export async function setState(caseId: string, state: CaseState): Promise<void> {
  await database()
    .update(cases)
    .set({ state, stage: STAGE_OF_STATE[state] })
    .where(eq(cases.id, caseId));
}
