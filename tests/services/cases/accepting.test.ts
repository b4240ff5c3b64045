import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { caseTechnicians, people } from "@/db/schema";
import { acceptCase } from "@/lib/cases/accept-case";
import { findIssue } from "@/lib/findings/find-issue";
import { anAcceptance, dayFromNow } from "../../helpers/assignments";
import { aCase } from "../../helpers/cases";
import { caseRow, eventsOf, movesOf } from "../../helpers/case-traces";
import { whileFailing } from "../../helpers/failing-database";
import { emptyOutbox, queuedMails } from "../../helpers/mails";
import {
  aPerson,
  asAdministrator,
  asInvestigator,
  asLead,
  asRequester,
  asSecondInvestigator,
  asTechnician,
} from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

beforeEach(emptyOutbox);

const sent = () => aCase({ state: "submitted" });

describe("accepting a case", () => {
  it("names its people, opens the findings, and mails the requester and those who are named", async () => {
    const [lead, caseId] = [await asLead(), await sent()];
    const acceptance = await anAcceptance(caseId);
    const { number } = await acceptCase(lead, acceptance);
    const row = await caseRow(caseId);
    expect(row).toMatchObject({
      state: "accepted",
      stage: 2,
      priority: "P3",
      leadId: lead.id,
      investigatorId: acceptance.investigatorId,
      secondReaderId: acceptance.secondReaderId,
      dueOn: acceptance.dueOn,
      impartialityStatement: acceptance.impartialityStatement,
    });
    expect(row.acceptedAt).toBeInstanceOf(Date);
    const named = await database()
      .select({ id: caseTechnicians.personId })
      .from(caseTechnicians)
      .where(eq(caseTechnicians.caseId, caseId));
    expect(named.map(({ id }) => id)).toEqual(acceptance.technicianIds);
    expect((await findIssue(database(), caseId))?.number).toBe(1);
    expect(await movesOf(caseId)).toEqual([{ from: "submitted", to: "accepted", reason: null }]);
    expect(await eventsOf(caseId, "case.accept")).toHaveLength(1);

    const mails = await queuedMails();
    expect(mails.map(({ to, subject }) => [to, subject]).sort()).toEqual(
      [
        [(await asRequester()).email, `${number}, accepted`],
        [(await asInvestigator()).email, `${number}, you are on this case`],
        [(await asSecondInvestigator()).email, `${number}, you are on this case`],
        [(await asTechnician()).email, `${number}, you are on this case`],
      ].sort(),
    );
  });

  it.each([
    ["priority", { priority: undefined }],
    ["priority", { priority: "P5" }],
    ["investigatorId", { investigatorId: undefined }],
    ["investigatorId", { investigatorId: "" }],
    ["leadId", { leadId: undefined }],
    ["dueOn", { dueOn: undefined }],
    ["dueOn", { dueOn: "soon" }],
    ["dueOn", { dueOn: "2031-02-29" }],
    ["dueOn", { dueOn: "2020-01-01" }],
    ["impartialityStatement", { impartialityStatement: undefined }],
    ["impartialityStatement", { impartialityStatement: "   " }],
    ["earlierReturnsSeen", { earlierReturnsSeen: false }],
    ["technicianIds", { technicianIds: "per_1" }],
  ])("demands the %s: %j", async (field, change) => {
    const caseId = await sent();
    const acceptance = { ...(await anAcceptance(caseId)), ...change };
    const found = await refusal(acceptCase(await asLead(), acceptance));
    expect(found.code).toBe("INVALID");
    expect(Object.keys(found.fields ?? {})).toEqual([field]);
    expect(await caseRow(caseId)).toMatchObject({ state: "submitted", revision: 1 });
    expect(await queuedMails()).toEqual([]);
  });

  it("takes today as due date", async () => {
    const acceptance = await anAcceptance(await sent(), { dueOn: dayFromNow(0) });
    await acceptCase(await asLead(), acceptance);
  });
});

describe("who can be named", () => {
  async function saysOf(change: Parameters<typeof anAcceptance>[1]) {
    const acceptance = await anAcceptance(await sent(), change);
    const found = await refusal(acceptCase(await asLead(), acceptance));
    expect(found.code).toBe("INVALID");
    return found.fields;
  }

  it("takes as investigator only an active investigator or lead engineer of the laboratory", async () => {
    const left = await aPerson("Former Investigator", "investigator");
    await database().update(people).set({ isActive: false }).where(eq(people.id, left.id));
    for (const [person, says] of [
      [await asTechnician(), "cannot be investigator here"],
      [await asAdministrator(), "cannot be investigator here"],
      [await asRequester(), "belongs to the client"],
      [left, "cannot be investigator here"],
    ] as const) {
      expect(await saysOf({ investigatorId: person.id })).toEqual({
        investigatorId: expect.stringContaining(says),
      });
    }
  });

  it.each(["per_nobody", "日本", "x'; drop table people; --"])(
    "does not know the investigator %j",
    async (investigatorId) => {
      expect(await saysOf({ investigatorId })).toEqual({
        investigatorId: "This person cannot be investigator here. Choose another.",
      });
    },
  );

  it("takes as lead engineer only a lead engineer, who is not the investigator", async () => {
    const [lead, investigator] = [await asLead(), await asInvestigator()];
    expect(await saysOf({ leadId: investigator.id })).toHaveProperty("leadId");
    expect(await saysOf({ investigatorId: lead.id })).toEqual({
      leadId: "The investigator writes the report, so someone else has to sign it.",
    });
  });

  it("takes as second reader neither the investigator nor the lead engineer", async () => {
    for (const person of [await asLead(), await asInvestigator()]) {
      expect(await saysOf({ secondReaderId: person.id })).toHaveProperty("secondReaderId");
    }
  });

  it("takes as technicians only technicians, and each once", async () => {
    const [technician, investigator] = [await asTechnician(), await asInvestigator()];
    expect(await saysOf({ technicianIds: [technician.id, investigator.id] })).toHaveProperty(
      "technicianIds",
    );
    const caseId = await sent();
    const twice = await anAcceptance(caseId, { technicianIds: [technician.id, technician.id] });
    await acceptCase(await asLead(), twice);
    const named = await database()
      .select()
      .from(caseTechnicians)
      .where(eq(caseTechnicians.caseId, caseId));
    expect(named).toHaveLength(1);
  });

  it("names every seat that does not hold at once", async () => {
    const technician = await asTechnician();
    const fields = await saysOf({
      leadId: technician.id,
      investigatorId: "per_nobody",
      secondReaderId: technician.id,
      dueOn: "2020-01-01",
    });
    expect(Object.keys(fields ?? {}).sort()).toEqual([
      "dueOn",
      "investigatorId",
      "leadId",
      "secondReaderId",
    ]);
  });
});

describe("accepting at once, and accepting that fails", () => {
  it("lets one of two lead engineers accept, and mails once", async () => {
    const [lead, other] = [await asLead(), await aPerson("Second Lead", "lead")];
    const caseId = await sent();
    const acceptance = await anAcceptance(caseId);
    const results = await Promise.allSettled([
      acceptCase(lead, acceptance),
      acceptCase(other, { ...acceptance, priority: "P1" }),
    ]);
    expect(results.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    const lost = results.find((result) => result.status === "rejected");
    expect(lost?.reason).toMatchObject({ code: "LOCKED" });
    expect(await movesOf(caseId)).toHaveLength(1);
    const requester = await asRequester();
    expect((await queuedMails()).filter(({ to }) => to === requester.email)).toHaveLength(1);
  });

  it.each(["outbox", "lastStepOfCase", "auditLog"] as const)(
    "leaves the case, the findings and the outbox as they were when the %s fails",
    async (place) => {
      const caseId = await sent();
      const acceptance = await anAcceptance(caseId);
      const lead = await asLead();
      await expect(whileFailing(place, () => acceptCase(lead, acceptance))).rejects.toThrow();
      expect(await caseRow(caseId)).toMatchObject({ state: "submitted", investigatorId: null });
      expect(await findIssue(database(), caseId)).toBeNull();
      expect(await movesOf(caseId)).toEqual([]);
      expect(await eventsOf(caseId)).toEqual([]);
      expect(await queuedMails()).toEqual([]);
    },
  );
});
