import { database } from "@/db/client";
import { cases, organisations, people } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { STAGE_OF_STATE } from "@/lib/cases/constants";
import { listCases } from "@/lib/cases/list-cases";
import { type ListParams, parseListParams } from "@/lib/cases/list-params";
import { newId } from "@/lib/new-id";
import { type Measured, medianMs } from "./measure";

const FEW = 1_000;
const MANY = 100_000;
const BATCH = 1_000;
const PAGES_IN = 200;

async function aLead(): Promise<Actor> {
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
  return { ...person, organisationName: "Bench", organisationKind: "laboratory" };
}

async function addCases(requester: Actor, from: number, to: number): Promise<void> {
  for (let start = from; start < to; start += BATCH) {
    const rows = Array.from({ length: BATCH }, (_, i) => ({
      id: newId("case"),
      number: `RL-2026-${String(start + i).padStart(6, "0")}`,
      organisationId: requester.organisationId,
      requesterId: requester.id,
      title: `Shaft ${start + i}`,
      state: "examining" as const,
      stage: STAGE_OF_STATE.examining,
    }));
    await database().insert(cases).values(rows);
  }
}

async function deepIn(actor: Actor, first: ListParams): Promise<ListParams> {
  let params = first;
  for (let page = 0; page < PAGES_IN; page += 1) {
    const { next } = await listCases(actor, params);
    if (!next) throw new Error(`the list ended on page ${page + 1}`);
    params = { ...first, after: next };
  }
  return params;
}

/** The case list with 100 000 cases against the same page with 1 000. */
export async function benchCaseList(): Promise<Measured[]> {
  const actor = await aLead();
  const first = parseListParams({ sort: "number" });
  await addCases(actor, 0, FEW);
  const yardstick = "first page of 1 000 cases";
  const yardstickMs = await medianMs(() => listCases(actor, first));
  await addCases(actor, FEW, MANY);
  const deep = await deepIn(actor, first);
  const measured = async (what: string, params: ListParams) => ({
    what,
    ms: await medianMs(() => listCases(actor, params)),
    yardstick,
    yardstickMs,
  });
  return [
    await measured("First page of 100 000 cases", first),
    await measured(`Page ${PAGES_IN + 1} of 100 000 cases`, deep),
  ];
}
