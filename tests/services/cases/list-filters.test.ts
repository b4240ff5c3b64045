import { beforeAll, describe, expect, it } from "vitest";
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cases, caseTechnicians } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { CASE_STATES, STAGE_OF_STATE } from "@/lib/cases/constants";
import { getCase } from "@/lib/cases/get-case";
import { listChoices } from "@/lib/cases/list-choices";
import { idsOf, manyCases } from "../../helpers/case-lists";
import {
  aPerson,
  asAdministrator,
  asInvestigator,
  asLead,
  asOtherRequester,
  asRequester,
  asSecondInvestigator,
  asTechnician,
} from "../../helpers/people";

let everybody: Record<string, Actor>;
let ids: string[];

beforeAll(async () => {
  const colleague = await aPerson("Colleague Person", "requester", {
    name: (await asRequester()).organisationName,
    kind: "client",
  });
  everybody = {
    requester: await asRequester(),
    colleague,
    otherRequester: await asOtherRequester(),
    technician: await asTechnician(),
    investigator: await asInvestigator(),
    stranger: await asSecondInvestigator(),
    lead: await asLead(),
    administrator: await asAdministrator(),
  };
  const { otherRequester, investigator, technician, lead } = everybody;
  const theirs = {
    organisationId: otherRequester?.organisationId ?? "",
    requesterId: otherRequester?.id ?? "",
  };
  const people = { investigatorId: investigator?.id ?? null, leadId: lead?.id ?? null };
  ids = await manyCases([
    ...CASE_STATES.map((state) => ({ state, ...people })),
    ...CASE_STATES.map((state) => ({ state, ...theirs })),
    { state: "examining", isRestricted: true, isOnHold: true, ...people },
    { state: "examining", isRestricted: true, isOnHold: true },
    // Cancelled before it was sent: it never had a number.
    { state: "cancelled", number: null },
    { state: "cancelled", number: null, ...theirs },
  ]);
  const [first] = await database().select().from(cases).where(eq(cases.state, "examining"));
  await database()
    .insert(caseTechnicians)
    .values({ caseId: first?.id ?? "", personId: technician?.id ?? "" });
});

const person = (name: string): Actor => {
  const found = everybody[name];
  if (!found) throw new Error(`there is no ${name}`);
  return found;
};

describe("who sees which cases in the list", () => {
  it.each([
    "requester",
    "colleague",
    "otherRequester",
    "technician",
    "investigator",
    "stranger",
    "lead",
    "administrator",
  ])("%s: exactly those whose pages they can open", async (name) => {
    const actor = person(name);
    const opens: string[] = [];
    for (const id of ids) {
      const seen = await getCase(actor, "case.view", id).then(
        () => true,
        () => false,
      );
      if (seen) opens.push(id);
    }
    expect((await idsOf(actor, "view=all")).sort()).toEqual(opens.sort());
  });

  it("a requester sees the cases of their own organisation only, whatever the address says", async () => {
    const [requester, other] = [person("requester"), person("otherRequester")];
    for (const query of [
      `client=${other.organisationId}`,
      `view=all&client=${other.organisationId}`,
      `view=all&investigator=${person("investigator").id}`,
      "view=signature",
      "view=client",
      "view=mine",
      "view=all&q=shaft",
    ]) {
      const rows = await idsOf(requester, query);
      const kept = await database().select().from(cases);
      const foreign = kept.filter(
        ({ id, organisationId }) => rows.includes(id) && organisationId === other.organisationId,
      );
      expect([query, foreign]).toEqual([query, []]);
    }
    expect(await listChoices(requester)).toEqual({ clients: [], investigators: [] });
  });

  it("a draft is in nobody else's list", async () => {
    const drafts = await database().select().from(cases).where(eq(cases.state, "draft"));
    expect(drafts).toHaveLength(2);
    for (const [name, actor] of Object.entries(everybody)) {
      const shown = await idsOf(actor, "view=all");
      const others = drafts.filter(
        ({ id, requesterId }) => shown.includes(id) && requesterId !== actor.id,
      );
      expect([name, others]).toEqual([name, []]);
    }
  });
});

describe("filters", () => {
  const rowsOf = async (name: string, query: string) => {
    const found = await idsOf(person(name), query);
    const rows = await database().select().from(cases);
    return rows.filter(({ id }) => found.includes(id));
  };

  it("show what is open and recent unless something is asked for, and one's own drafts", async () => {
    const rows = await rowsOf("requester", "");
    const states = new Set(rows.map(({ state }) => state));
    expect(states).toEqual(
      new Set(
        CASE_STATES.filter((state) => {
          const stage = STAGE_OF_STATE[state];
          return (stage >= 1 && stage <= 6) || state === "draft";
        }),
      ),
    );
  });

  it("of one stage and of several show these stages alone", async () => {
    const one = await rowsOf("lead", "view=all&stages=3");
    expect(new Set(one.map(({ stage }) => stage))).toEqual(new Set([3]));
    const two = await rowsOf("lead", "view=all&stages=1-7");
    expect(new Set(two.map(({ stage }) => stage))).toEqual(new Set([1, 7]));
  });

  it("of client, investigator and hold are joined by and", async () => {
    const [requester, investigator] = [person("requester"), person("investigator")];
    const query = `view=all&client=${requester.organisationId}&investigator=${investigator.id}&hold=yes`;
    const rows = await rowsOf("lead", query);
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({
      organisationId: requester.organisationId,
      investigatorId: investigator.id,
      isOnHold: true,
    });
  });

  it("of the built-in views show what their names say", async () => {
    const mine = await rowsOf("investigator", "view=mine");
    const { id } = person("investigator");
    expect(mine.length).toBeGreaterThan(0);
    expect(mine.every(({ investigatorId }) => investigatorId === id)).toBe(true);
    const waiting = await rowsOf("lead", "view=signature");
    expect(new Set(waiting.map(({ state }) => state))).toEqual(new Set(["in_approval"]));
    const asked = await rowsOf("lead", "view=client");
    expect(new Set(asked.map(({ state }) => state))).toEqual(new Set(["info_needed"]));
  });

  it.each([
    "client=日本",
    "investigator=%F0%9F%AA%9B",
    "client=' or '1'='1",
    "client[]=x",
    "stages=1-1-1-99-x--",
    "hold=maybe&sort=password&dir=sideways&view=everything",
    "view=all&stages=3&investigator=per_nobody",
  ])("that mean nothing fail nothing: %s", async (query) => {
    await expect(idsOf(person("lead"), query)).resolves.toBeInstanceOf(Array);
  });
});
