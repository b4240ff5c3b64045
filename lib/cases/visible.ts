import "server-only";
import { and, eq, or, type SQL, sql } from "drizzle-orm";
import { cases } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { POLICY, type Relation, seesRestricted } from "@/lib/auth/policy";

const assigned = (actor: Actor) =>
  sql`(${cases.investigatorId} = ${actor.id} or ${cases.leadId} = ${actor.id}
    or ${cases.secondReaderId} = ${actor.id} or ${cases.requesterId} = ${actor.id}
    or exists (select 1 from case_technicians ct where ct.case_id = ${cases.id} and ct.person_id = ${actor.id}))`;

/**
 * `assigned` found from the person's side, through an index each, for who sees nothing else: as a
 * condition on each row it would be asked of every case there is.
 */
const ofAssigned = (actor: Actor) =>
  sql`${cases.id} in (select of_person.id from (
    select c.id from cases c where c.investigator_id = ${actor.id}
    union select c.id from cases c where c.lead_id = ${actor.id}
    union select c.id from cases c where c.second_reader_id = ${actor.id}
    union select c.id from cases c where c.requester_id = ${actor.id}
    union select ct.case_id from case_technicians ct where ct.person_id = ${actor.id}) of_person)`;

/** The policy's "case.view" as a condition on rows, so that lists show what pages would open. */
export function visibleCases(actor: Actor): SQL {
  const roles: Partial<Record<string, Relation>> = POLICY["case.view"].roles;
  const relation = roles[actor.role];
  const own = eq(cases.requesterId, actor.id);
  // Put so that the index on the number does not draw the planner away from the list's own order.
  const sent = sql`(${cases.number} is null) = 0`;
  switch (relation) {
    case undefined:
      return sql`false`;
    case "own":
      return own;
    case "organisation":
      // Their own drafts are of their own organisation, so one indexed condition is enough.
      return and(eq(cases.organisationId, actor.organisationId), or(sent, own)) ?? sql`false`;
    case "assigned":
      return ofAssigned(actor);
    case "any":
      return seesRestricted(actor)
        ? (or(own, sent) ?? sql`false`)
        : (or(own, and(sent, or(eq(cases.isRestricted, false), assigned(actor)))) ?? sql`false`);
  }
}
