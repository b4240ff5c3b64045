import "server-only";
import { and, asc, eq, inArray } from "drizzle-orm";
import { database } from "@/db/client";
import { organisations, people } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { decide, POLICY } from "@/lib/auth/policy";
import { ROLES } from "@/lib/people/constants";

export type Choice = { value: string; label: string };

/** Clients and investigators to filter by; a client's own people see neither list. */
export async function listChoices(
  actor: Actor,
): Promise<{ clients: Choice[]; investigators: Choice[] }> {
  if (actor.organisationKind === "client" || !decide(actor, "case.list").allowed) {
    return { clients: [], investigators: [] };
  }
  const rules: Partial<Record<string, unknown>> = POLICY["findings.write"].roles;
  const writers = ROLES.filter((role) => role in rules);
  const [clients, investigators] = await Promise.all([
    database()
      .select({ value: organisations.id, label: organisations.name })
      .from(organisations)
      .where(eq(organisations.kind, "client"))
      .orderBy(asc(organisations.name)),
    database()
      .select({ value: people.id, label: people.name })
      .from(people)
      .where(and(inArray(people.role, writers), eq(people.isActive, true)))
      .orderBy(asc(people.name)),
  ]);
  return { clients, investigators };
}
