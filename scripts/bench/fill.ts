import { writeFileSync } from "node:fs";
import { asc } from "drizzle-orm";
import { closeDatabase, database } from "@/db/client";
import { migrateDatabase } from "@/db/migrate";
import { cases, organisations, people } from "@/db/schema";
import { hashPassword } from "@/lib/auth/password";
import { type CaseState, STAGE_OF_STATE } from "@/lib/cases/constants";
import { encodeCursor } from "@/lib/cases/cursor";
import { newId } from "@/lib/new-id";
import type { Role } from "@/lib/people/constants";

/**
 * Fills the database of this environment with an invented laboratory for measuring, and writes down
 * how to come in: `fill.ts COUNT FILE`.
 */
const BATCH = 1_000;
const CLIENTS = 20;
const INVESTIGATORS = 10;
const PASSWORD = "bench-only-password";
const PARTS = "shaft bolt gear spring bearing valve hook blade weld pipe rail pin".split(" ");
const FAILURES = "broken bent cracked worn pitted leaking stripped loose seized split".split(" ");
const MATERIALS = ["42CrMo4", "34CrNiMo6", "C45", "18CrNiMo7-6", "X5CrNi18-10"];
/** One in ten is open, as in a laboratory that keeps its old cases. */
const STATES: CaseState[] = [
  "examining",
  ...Array<CaseState>(5).fill("released"),
  "analysing",
  ...Array<CaseState>(13).fill("closed"),
];

const count = Number(process.argv[2]);
const file = process.argv[3] ?? "";

async function addOrganisation(kind: "laboratory" | "client", name: string): Promise<string> {
  const id = newId("org");
  await database().insert(organisations).values({ id, kind, name });
  return id;
}

async function addPerson(organisationId: string, role: Role, name: string) {
  const person = { id: newId("per"), organisationId, role, name, email: `${name}@bench.example` };
  const passwordHash = await hashPassword(PASSWORD);
  await database()
    .insert(people)
    .values({ ...person, passwordHash });
  return person;
}

const pick = <T>(from: readonly T[], i: number): T => {
  const found = from[i % from.length];
  if (found === undefined) throw new Error("nothing to pick from");
  return found;
};

type Client = { organisationId: string; requesterId: string };

function caseRow(i: number, clients: Client[], investigatorIds: string[]) {
  const state = pick(STATES, i);
  const isOpen = state === "examining" || state === "analysing";
  // Spread over some three years, in no order of the numbers.
  const day = new Date(Date.UTC(2024, 0, 1 + ((i * 7919) % 1_000)));
  return {
    id: newId("case"),
    number: `RL-2026-${String(i + 1).padStart(6, "0")}`,
    ...pick(clients, i),
    state,
    stage: STAGE_OF_STATE[state],
    title: `Drive ${pick(PARTS, i)} ${pick(FAILURES, Math.floor(i / PARTS.length))} in service`,
    partName: `Drive ${pick(PARTS, i)}`,
    drawingNumber: `HD-${String(i + 1).padStart(6, "0")}`,
    material: pick(MATERIALS, i),
    investigatorId: pick(investigatorIds, Math.floor(i / 3)),
    dueOn: i % 11 === 0 ? null : day.toISOString().slice(0, 10),
    signedAt: isOpen ? null : day,
    isRestricted: i % 50 === 7,
    itemCount: i % 9,
    openGateCount: isOpen ? 5 : 0,
    changedAt: new Date(day.getTime() + (i % 86_400) * 1000),
  };
}

await migrateDatabase();
const laboratoryId = await addOrganisation("laboratory", "Bench laboratory");
const investigators = [];
for (let i = 0; i < INVESTIGATORS; i += 1) {
  investigators.push(await addPerson(laboratoryId, "investigator", `investigator-${i}`));
}
const clients: Client[] = [];
for (let i = 0; i < CLIENTS; i += 1) {
  const organisationId = await addOrganisation("client", `Client ${i}`);
  const { id } = await addPerson(organisationId, "requester", `requester-${i}`);
  clients.push({ organisationId, requesterId: id });
}
const investigatorIds = investigators.map(({ id }) => id);
for (let start = 0; start < count; start += BATCH) {
  const rows = Array.from({ length: BATCH }, (_, i) =>
    caseRow(start + i, clients, investigatorIds),
  );
  await database().insert(cases).values(rows);
}
const [middle] = await database()
  .select({ key: cases.dueKey, id: cases.id })
  .from(cases)
  .orderBy(asc(cases.dueKey), asc(cases.id))
  .offset(Math.floor(count / 2))
  .limit(1);
const [first] = await database()
  .select({ id: cases.id })
  .from(cases)
  .orderBy(asc(cases.number))
  .limit(1);
writeFileSync(
  file,
  JSON.stringify({
    email: investigators[0]?.email,
    password: PASSWORD,
    /** A case at which this investigator is examining. */
    caseId: first?.id,
    /** The place in the list by due date that half of all cases come before. */
    halfWay: encodeCursor([middle?.key ?? 0, middle?.id ?? ""]),
  }),
);
await closeDatabase();
