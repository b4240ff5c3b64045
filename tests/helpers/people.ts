import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { organisations, people } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { newId } from "@/lib/new-id";
import type { OrganisationKind, Role } from "@/lib/people/constants";

const LABORATORY = "The laboratory";
const CLIENT = "The client";
const OTHER_CLIENT = "The other client";

async function organisation(name: string, kind: OrganisationKind): Promise<string> {
  const find = () =>
    database()
      .select({ id: organisations.id })
      .from(organisations)
      .where(eq(organisations.name, name));
  const [known] = await find();
  if (known) return known.id;
  await database()
    .insert(organisations)
    .values({ id: newId("org"), kind, name })
    .onDuplicateKeyUpdate({ set: { name } });
  const [made] = await find();
  if (!made) throw new Error(`organisation ${name} was not made`);
  return made.id;
}

/** A person written to the database, as they act. The same name gives the same person. */
export async function aPerson(
  name: string,
  role: Role,
  firm: { name: string; kind: OrganisationKind } = { name: LABORATORY, kind: "laboratory" },
): Promise<Actor> {
  const organisationId = await organisation(firm.name, firm.kind);
  const email = `${name.toLowerCase().replaceAll(/[^a-z]+/g, ".")}@example.test`;
  const find = () => database().select().from(people).where(eq(people.email, email));
  const [known] = await find();
  if (!known) {
    await database()
      .insert(people)
      .values({ id: newId("per"), organisationId, email, name, role })
      .onDuplicateKeyUpdate({ set: { name } });
  }
  const [person] = await find();
  if (!person) throw new Error(`${name} was not made`);
  return {
    id: person.id,
    name,
    email,
    role,
    organisationId,
    organisationName: firm.name,
    organisationKind: firm.kind,
  };
}

const client = (name: string) => ({ name, kind: "client" as const });

export const asLead = () => aPerson("Lead Person", "lead");
export const asSecondLead = () => aPerson("Second Lead", "lead");
export const asInvestigator = () => aPerson("Investigator Person", "investigator");
export const asSecondInvestigator = () => aPerson("Second Investigator", "investigator");
export const asTechnician = () => aPerson("Technician Person", "technician");
export const asAdministrator = () => aPerson("Administrator Person", "administrator");
export const asRequester = () => aPerson("Requester Person", "requester", client(CLIENT));
export const asOtherRequester = () => aPerson("Other Requester", "requester", client(OTHER_CLIENT));
