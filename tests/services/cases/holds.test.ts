import { asc, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { caseHolds } from "@/db/schema";
import { clearHold } from "@/lib/cases/clear-hold";
import { HOLD_KINDS } from "@/lib/cases/constants";
import { getCase } from "@/lib/cases/get-case";
import { holdCase } from "@/lib/cases/hold-case";
import { aCase } from "../../helpers/cases";
import { caseRow, eventsOf } from "../../helpers/case-traces";
import { whileFailing } from "../../helpers/failing-database";
import { emptyOutbox, queuedMails } from "../../helpers/mails";
import {
  aPerson,
  asAdministrator,
  asInvestigator,
  asLead,
  asRequester,
  asTechnician,
} from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const holdsOf = (caseId: string) =>
  database()
    .select()
    .from(caseHolds)
    .where(eq(caseHolds.caseId, caseId))
    .orderBy(asc(caseHolds.setAt));

beforeEach(emptyOutbox);

describe("putting a case on hold", () => {
  it.each(HOLD_KINDS)("for %s keeps who and why, and tells lead and investigator", async (kind) => {
    const caseId = await aCase();
    const technician = await asTechnician();
    await holdCase(technician, { caseId, kind, reason: "The insurer wrote." });
    expect(await caseRow(caseId)).toMatchObject({
      isOnHold: true,
      isRestricted: kind === "restricted",
      state: "examining",
    });
    expect(await holdsOf(caseId)).toMatchObject([
      { kind, reason: "The insurer wrote.", setById: technician.id, clearedAt: null },
    ]);
    expect(await eventsOf(caseId, "case.hold")).toHaveLength(1);
    const told = (await queuedMails()).map(({ to }) => to).sort();
    expect(told).toEqual([(await asLead()).email, (await asInvestigator()).email].sort());
  });

  it.each([
    ["kind", { kind: "forever" }],
    ["kind", { kind: undefined }],
    ["reason", { reason: " " }],
    ["reason", { reason: undefined }],
  ])("demands the %s: %j", async (field, change) => {
    const caseId = await aCase();
    const hold = { caseId, kind: "legal", reason: "The insurer wrote.", ...change };
    const found = await refusal(holdCase(await asLead(), hold));
    expect(Object.keys(found.fields ?? {})).toEqual([field]);
    expect((await caseRow(caseId)).isOnHold).toBe(false);
  });

  it("takes each kind once, also when two press at once", async () => {
    const caseId = await aCase();
    const [lead, investigator] = [await asLead(), await asInvestigator()];
    const hold = { caseId, kind: "legal", reason: "The insurer wrote." };
    const results = await Promise.allSettled([holdCase(lead, hold), holdCase(investigator, hold)]);
    const lost = results.filter((result) => result.status === "rejected");
    expect(lost.map(({ reason }) => reason as unknown)).toEqual([
      expect.objectContaining({ code: "CONFLICT" }),
    ]);
    expect(await holdsOf(caseId)).toHaveLength(1);
    await holdCase(lead, { ...hold, kind: "customer" });
    expect(await holdsOf(caseId)).toHaveLength(2);
  });

  it("shuts a restricted case to laboratory people who are not named on it", async () => {
    const caseId = await aCase();
    const stranger = await aPerson("Third Investigator", "investigator");
    await getCase(stranger, "case.viewWork", caseId);
    await holdCase(await asLead(), { caseId, kind: "restricted", reason: "Under dispute." });
    for (const actor of [stranger, await asAdministrator()]) {
      expect((await refusal(getCase(actor, "case.view", caseId))).code).toBe("NOT_FOUND");
    }
    await getCase(await asInvestigator(), "case.viewWork", caseId);
    await getCase(await asRequester(), "case.view", caseId);
    await getCase(await aPerson("Second Lead", "lead"), "case.viewWork", caseId);
  });

  it("is undone as a whole when the mail cannot be put into the outbox", async () => {
    const caseId = await aCase();
    const lead = await asLead();
    const holding = whileFailing("outbox", () =>
      holdCase(lead, { caseId, kind: "legal", reason: "The insurer wrote." }),
    );
    await expect(holding).rejects.toThrow();
    expect((await caseRow(caseId)).isOnHold).toBe(false);
    expect(await holdsOf(caseId)).toEqual([]);
  });
});

describe("taking a case off hold", () => {
  it("keeps the case on hold while another hold stands, and restricted while that one does", async () => {
    const [lead, caseId] = [await asLead(), await aCase()];
    const reason = "Settled.";
    const restricted = await holdCase(lead, { caseId, kind: "restricted", reason: "Dispute." });
    const customer = await holdCase(lead, { caseId, kind: "customer", reason: "They asked." });
    await clearHold(lead, { caseId, holdId: customer.holdId, reason });
    expect(await caseRow(caseId)).toMatchObject({ isOnHold: true, isRestricted: true });
    await clearHold(lead, { caseId, holdId: restricted.holdId, reason });
    expect(await caseRow(caseId)).toMatchObject({ isOnHold: false, isRestricted: false });
    expect((await holdsOf(caseId)).every(({ clearedById }) => clearedById === lead.id)).toBe(true);
    expect(await eventsOf(caseId, "case.clearHold")).toHaveLength(2);
  });

  it("of a legal hold needs the authority that allowed it", async () => {
    const [lead, caseId] = [await asLead(), await aCase()];
    const { holdId } = await holdCase(lead, { caseId, kind: "legal", reason: "The insurer." });
    for (const authority of [undefined, "", "  "]) {
      const found = await refusal(
        clearHold(lead, { caseId, holdId, reason: "Settled", authority }),
      );
      expect(found.fields).toHaveProperty("authority");
    }
    await clearHold(lead, { caseId, holdId, reason: "Settled.", authority: "J. Marsh, letter 12" });
    expect((await holdsOf(caseId))[0]?.clearReason).toBe(
      "Settled. Allowed by: J. Marsh, letter 12",
    );
  });

  it("is for the lead engineer alone", async () => {
    const caseId = await aCase();
    const { holdId } = await holdCase(await asLead(), { caseId, kind: "customer", reason: "Ask." });
    for (const actor of [
      await asInvestigator(),
      await asTechnician(),
      await asRequester(),
      await asAdministrator(),
    ]) {
      const found = await refusal(clearHold(actor, { caseId, holdId, reason: "Go on." }));
      expect([actor.name, found.code]).toEqual([actor.name, "NOT_ALLOWED"]);
    }
    expect((await caseRow(caseId)).isOnHold).toBe(true);
  });

  it("happens once, and not through another case", async () => {
    const [lead, caseId, other] = [await asLead(), await aCase(), await aCase()];
    const { holdId } = await holdCase(lead, { caseId, kind: "customer", reason: "They asked." });
    const crossed = await refusal(clearHold(lead, { caseId: other, holdId, reason: "Settled." }));
    expect(crossed.code).toBe("NOT_FOUND");
    const clearing = { caseId, holdId, reason: "Settled." };
    const results = await Promise.allSettled([
      clearHold(lead, clearing),
      clearHold(lead, clearing),
    ]);
    const lost = results.filter((result) => result.status === "rejected");
    expect(lost.map(({ reason }) => reason as unknown)).toEqual([
      expect.objectContaining({ code: "CONFLICT" }),
    ]);
    expect(await eventsOf(caseId, "case.clearHold")).toHaveLength(1);
  });
});
