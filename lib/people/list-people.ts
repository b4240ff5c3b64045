import "server-only";
import { asc, eq, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { organisations, people, signIns } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { requireAllowed } from "@/lib/auth/require";
import type { OrganisationKind, Role } from "./constants";

export type PersonRow = {
  id: string;
  name: string;
  email: string;
  role: Role;
  organisationName: string;
  organisationKind: OrganisationKind;
  isActive: boolean;
  hasPassword: boolean;
  lastUsedAt: string | null;
};

export async function listPeople(actor: Actor): Promise<PersonRow[]> {
  requireAllowed(actor, "person.view");
  const rows = await database()
    .select({
      id: people.id,
      name: people.name,
      email: people.email,
      role: people.role,
      organisationName: organisations.name,
      organisationKind: organisations.kind,
      isActive: people.isActive,
      hasPassword: sql<number>`${people.passwordHash} is not null`.mapWith(Boolean),
      lastUsedAt: sql`max(${signIns.lastUsedAt})`.mapWith(signIns.lastUsedAt),
    })
    .from(people)
    .innerJoin(organisations, eq(organisations.id, people.organisationId))
    .leftJoin(signIns, eq(signIns.personId, people.id))
    .groupBy(people.id)
    .orderBy(asc(organisations.kind), asc(organisations.name), asc(people.name));
  return rows.map((row) => ({ ...row, lastUsedAt: row.lastUsedAt?.toISOString() ?? null }));
}

export async function listOrganisations(
  actor: Actor,
): Promise<{ id: string; name: string; kind: OrganisationKind }[]> {
  requireAllowed(actor, "person.view");
  return database()
    .select({ id: organisations.id, name: organisations.name, kind: organisations.kind })
    .from(organisations)
    .orderBy(asc(organisations.kind), asc(organisations.name));
}
