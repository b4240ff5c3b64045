import { sql } from "drizzle-orm";
import { database } from "@/db/client";
import { cases, organisations, people } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { STAGE_OF_STATE } from "@/lib/cases/constants";
import { listCases } from "@/lib/cases/list-cases";
import { type ListParams, parseListParams } from "@/lib/cases/list-params";
import { newId } from "@/lib/new-id";
import { type Measured, medianMs } from "./measure";

const CASES = 5_000;
const PAGES_IN = 80;

async function fill(): Promise<Actor> {
  const organisationId = newId("org");
  const person = {
    id: newId("per"),
    organisationId,
    email: "lead@bench.example",
    name: "Lead",
    role: "lead" as const,
  };
  await database()
    .insert(organisations)
    .values({ id: organisationId, kind: "laboratory", name: "Bench" });
  await database().insert(people).values(person);
  const rows = Array.from({ length: CASES }, (_, i) => ({
    id: newId("case"),
    number: `RL-2026-${String(i).padStart(5, "0")}`,
    organisationId,
    requesterId: person.id,
    title: `Shaft ${i}`,
    state: "examining" as const,
    stage: STAGE_OF_STATE.examining,
  }));
  for (let i = 0; i < rows.length; i += 500) {
    await database()
      .insert(cases)
      .values(rows.slice(i, i + 500));
  }
  return { ...person, organisationName: "Bench", organisationKind: "laboratory" };
}

/** The first page and a page deep in a list of 5 000 cases. */
export async function benchCaseList(): Promise<Measured[]> {
  const actor = await fill();
  const first = parseListParams({ sort: "number" });
  let deep: ListParams = first;
  for (let page = 0; page < PAGES_IN; page += 1) {
    const { next } = await listCases(actor, deep);
    if (!next) throw new Error(`the list ended on page ${page + 1}`);
    deep = { ...first, after: next };
  }
  const yardstick = "SELECT of 50 whole rows by primary key";
  const yardstickMs = await medianMs(() =>
    database().execute(sql`SELECT * FROM ${cases} ORDER BY ${cases.id} LIMIT 50`),
  );
  const measured = async (what: string, params: ListParams) => ({
    what,
    ms: await medianMs(() => listCases(actor, params)),
    yardstick,
    yardstickMs,
  });
  return [
    await measured("First page of 5 000 cases", first),
    await measured(`Page ${PAGES_IN + 1} of 5 000 cases`, deep),
  ];
}
