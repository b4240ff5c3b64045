import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { organisations, people } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import type { PersonKey, SeededPeople } from "./people";

export type Cast = { [K in PersonKey]: Actor } & { firms: SeededPeople["firms"] };

/** The people of the demonstration as they act. */
export async function castOf(seeded: SeededPeople): Promise<Cast> {
  const rows = await database()
    .select({
      id: people.id,
      name: people.name,
      email: people.email,
      role: people.role,
      organisationId: organisations.id,
      organisationName: organisations.name,
      organisationKind: organisations.kind,
    })
    .from(people)
    .innerJoin(organisations, eq(organisations.id, people.organisationId));
  const actors = Object.fromEntries(
    Object.entries(seeded.people).map(([key, id]) => {
      const row = rows.find((person) => person.id === id);
      if (!row) throw new Error(`${key} was not written`);
      return [key, row];
    }),
  ) as { [K in PersonKey]: Actor };
  return { ...actors, firms: seeded.firms };
}
