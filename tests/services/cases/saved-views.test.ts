import { beforeAll, describe, expect, it } from "vitest";
import type { Actor } from "@/lib/auth/actor";
import { verifyChains } from "@/lib/audit/verify-chain";
import { CASE_STATES } from "@/lib/cases/constants";
import { keptViewQuery, parseListParams, queryToKeep } from "@/lib/cases/list-params";
import { dropView, listViews, saveView } from "@/lib/cases/saved-views";
import { VIEWS_MAX } from "@/lib/cases/view-schemas";
import { idsOf, manyCases } from "../../helpers/case-lists";
import {
  aPerson,
  asAdministrator,
  asInvestigator,
  asLead,
  asRequester,
  asTechnician,
} from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const names = async (actor: Actor) => (await listViews(actor)).map(({ name }) => name);

describe("a view under a name", () => {
  it("is kept, changed and dropped by its owner, and every step is in the log", async () => {
    const lead = await asLead();
    const view = await saveView(lead, { name: "  Late shafts ", query: "q=shaft&sort=due" });
    expect(view).toMatchObject({ name: "Late shafts", query: "q=shaft&sort=due" });
    await saveView(lead, { id: view.id, name: "Late drums", query: "q=drum" });
    expect(await listViews(lead)).toEqual([{ id: view.id, name: "Late drums", query: "q=drum" }]);
    await dropView(lead, { id: view.id });
    expect(await listViews(lead)).toEqual([]);
    expect((await verifyChains("installation")).faults).toEqual([]);
  });

  it.each([asRequester, asTechnician, asInvestigator, asAdministrator])(
    "is for people of every role, and for themselves alone",
    async (person) => {
      const [actor, lead] = [await person(), await asLead()];
      const view = await saveView(actor, { name: "Mine alone", query: "view=mine" });
      expect(await names(lead)).not.toContain("Mine alone");
      const { id } = view;
      const change = saveView(lead, { id, name: "Yours now", query: "" });
      expect((await refusal(change)).code).toBe("NOT_FOUND");
      expect((await refusal(dropView(lead, { id }))).code).toBe("NOT_FOUND");
      expect(await listViews(actor)).toContainEqual(view);
      await dropView(actor, { id });
    },
  );

  it("has a name of its own", async () => {
    const requester = await asRequester();
    const first = await saveView(requester, { name: "Shafts", query: "q=shaft" });
    const second = await saveView(requester, { name: "Drums", query: "q=drum" });
    for (const again of [
      { name: "Shafts", query: "" },
      { name: " shafts ", query: "" },
      { id: second.id, name: "Shafts", query: "" },
    ]) {
      const found = await refusal(saveView(requester, again));
      expect(found.fields).toEqual({ name: "You have a view of this name already." });
    }
    expect(await names(requester)).toEqual(["Shafts", "Drums"]);
    // Somebody else may call theirs the same.
    const other = await asInvestigator();
    await saveView(other, { name: "Shafts", query: "" });
    expect(await names(other)).toEqual(["Shafts"]);
    await dropView(requester, { id: first.id });
  });

  it("of the same name at once is kept once", async () => {
    const technician = await asTechnician();
    const results = await Promise.allSettled([
      saveView(technician, { name: "Twice", query: "a" }),
      saveView(technician, { name: "Twice", query: "b" }),
    ]);
    expect(results.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    expect((await names(technician)).filter((name) => name === "Twice")).toHaveLength(1);
  });

  it.each([
    ["no name", { name: "  ", query: "" }, "name"],
    ["a long name", { name: "x".repeat(61), query: "" }, "name"],
    ["a name of 10 million letters", { name: "x".repeat(10_000_000), query: "" }, "name"],
    ["a name that is a list", { name: ["x"], query: "" }, "name"],
    ["a long query", { name: "Long", query: "x".repeat(2001) }, "query"],
    ["no query", { name: "None" }, "query"],
  ])("is refused with %s", async (_name, view, field) => {
    const found = await refusal(saveView(await asLead(), view));
    expect(found.code).toBe("INVALID");
    expect(Object.keys(found.fields ?? {})).toEqual([field]);
  });

  it.each(["<b>Bold</b>", "🪛 emoji", "\u202Eright to left", "half \ud83d", "x".repeat(60)])(
    "may be called %j, and leaves the log whole",
    async (name) => {
      const lead = await asLead();
      const view = await saveView(lead, { name, query: "" });
      expect(await names(lead)).toContain(view.name);
      expect((await verifyChains("installation")).faults).toEqual([]);
    },
  );

  it(`is one of at most ${VIEWS_MAX}`, async () => {
    const keen = await aPerson("Keen Requester", "requester", {
      name: (await asRequester()).organisationName,
      kind: "client",
    });
    for (let i = 1; i < VIEWS_MAX; i += 1) await saveView(keen, { name: `View ${i}`, query: "" });
    // The last free place is asked for three times at once.
    const results = await Promise.allSettled(
      ["A", "B", "C"].map((name) => saveView(keen, { name, query: "" })),
    );
    expect(results.map(({ status }) => status).sort()).toEqual([
      "fulfilled",
      "rejected",
      "rejected",
    ]);
    const found = await refusal(saveView(keen, { name: "One too many", query: "" }));
    expect(found.message).toContain("Drop one first");
    const [first] = await listViews(keen);
    await saveView(keen, { id: first?.id, name: "Changed", query: "q=x" });
    expect(await names(keen)).toHaveLength(VIEWS_MAX);
  });
});

describe("a kept view", () => {
  beforeAll(async () => {
    await manyCases(CASE_STATES.map((state) => ({ state, dueOn: "2026-12-24" })));
  });

  it.each([
    "",
    "stages=3",
    "view=mine&stages=1",
    "view=all&sort=number&dir=desc",
    "view=client",
    "q=shaft&hold=yes",
  ])("shows what was on the screen when it was kept: %j", async (address) => {
    const requester = await asRequester();
    const params = parseListParams(Object.fromEntries(new URLSearchParams(address)));
    const kept = { id: "view_1", query: queryToKeep(params) };
    const later = keptViewQuery(kept);
    expect(await idsOf(requester, later)).toEqual(await idsOf(requester, address));
    const again = parseListParams(Object.fromEntries(new URLSearchParams(later)));
    expect(again.saved).toBe("view_1");
    expect(queryToKeep(again)).toBe(kept.query);
  });
});
