import { organisations, people } from "@/db/schema";
import { database } from "@/db/client";
import { hashPassword } from "@/lib/auth/password";
import { newId } from "@/lib/new-id";
import type { Role } from "@/lib/people/constants";

export const DEMO_PASSWORD = "Riverline-demo-1";

/** Invented firms and people of the demonstration. */
const FIRMS = {
  lab: {
    kind: "laboratory",
    name: "Calder Street Materials Laboratory",
    addressLine: "Unit 6, Calder Street. Failure analysis, metallography, mechanical testing",
  },
  harrow: { kind: "client", name: "Harrow Bay Lifting Gear", addressLine: null },
  tessel: { kind: "client", name: "Tessel Wind", addressLine: null },
  orrin: { kind: "client", name: "Orrin Pumps", addressLine: null },
  vale: { kind: "client", name: "Lower Vale Transit", addressLine: null },
  saltmarsh: { kind: "client", name: "Saltmarsh Dairy", addressLine: null },
} as const;
export type Firm = keyof typeof FIRMS;

const PEOPLE = {
  lead: ["lab", "Mara Quist", "lead@calderstreet.example", "lead"],
  secondLead: ["lab", "Henrik Oster", "second.lead@calderstreet.example", "lead"],
  investigator: ["lab", "Idris Vale", "investigator@calderstreet.example", "investigator"],
  secondInvestigator: [
    "lab",
    "Sanna Reeve",
    "second.investigator@calderstreet.example",
    "investigator",
  ],
  thirdInvestigator: ["lab", "Noor Adel", "noor.adel@calderstreet.example", "investigator"],
  technician: ["lab", "Tove Brandt", "technician@calderstreet.example", "technician"],
  admin: ["lab", "Ansel Roke", "admin@calderstreet.example", "administrator"],
  harrowRequester: ["harrow", "Pell Harrow", "requester@harrowbay.example", "requester"],
  tesselRequester: ["tessel", "Ilse Tamm", "requester@tesselwind.example", "requester"],
  orrinRequester: ["orrin", "Bram Orrin", "bram@orrinpumps.example", "requester"],
  valeRequester: ["vale", "Dot Lindqvist", "dot@lowervale.example", "requester"],
  saltmarshRequester: ["saltmarsh", "Ewan Marsh", "ewan@saltmarsh.example", "requester"],
} as const satisfies Record<string, readonly [Firm, string, string, Role]>;
export type PersonKey = keyof typeof PEOPLE;

export type SeededPeople = { firms: Record<Firm, string>; people: Record<PersonKey, string> };

/** Writes firms and people and gives back their ids by key. */
export async function seedPeople(): Promise<SeededPeople> {
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  const firms = Object.fromEntries(Object.keys(FIRMS).map((key) => [key, newId("org")])) as Record<
    Firm,
    string
  >;
  const ids = Object.fromEntries(Object.keys(PEOPLE).map((key) => [key, newId("per")])) as Record<
    PersonKey,
    string
  >;
  await database().transaction(async (tx) => {
    await tx
      .insert(organisations)
      .values((Object.keys(FIRMS) as Firm[]).map((key) => ({ id: firms[key], ...FIRMS[key] })));
    await tx.insert(people).values(
      (Object.keys(PEOPLE) as PersonKey[]).map((key) => {
        const [firm, name, email, role] = PEOPLE[key];
        return { id: ids[key], organisationId: firms[firm], name, email, role, passwordHash };
      }),
    );
  });
  return { firms, people: ids };
}
