import { beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { assignPeople } from "@/lib/cases/assign-people";
import { currentAssignment } from "@/lib/cases/write-assignment";
import { anAssignment, dayFromNow } from "../../helpers/assignments";
import { aCase } from "../../helpers/cases";
import { caseRow, eventsOf } from "../../helpers/case-traces";
import { whileFailing } from "../../helpers/failing-database";
import { emptyOutbox, queuedMails } from "../../helpers/mails";
import {
  aPerson,
  asAdministrator,
  asInvestigator,
  asLead,
  asOtherRequester,
  asRequester,
  asTechnician,
} from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const seenOf = async (caseId: string) => currentAssignment(database(), await caseRow(caseId));

beforeEach(emptyOutbox);

describe("naming the people of a case anew", () => {
  it("keeps before and after, and mails only those who are new to it", async () => {
    const [lead, caseId] = [await asLead(), await aCase()];
    const before = await seenOf(caseId);
    const fresh = await aPerson("Third Investigator", "investigator");
    const helper = await aPerson("Second Technician", "technician");
    const chosen = await anAssignment({
      priority: "P1",
      investigatorId: fresh.id,
      technicianIds: [(await asTechnician()).id, helper.id],
    });
    await assignPeople(lead, { caseId, ...chosen, seen: before });
    expect(await seenOf(caseId)).toEqual({
      ...chosen,
      technicianIds: [...chosen.technicianIds].sort(),
    });
    const [event] = await eventsOf(caseId, "case.assign");
    expect(event).toMatchObject({ before, after: chosen });
    const mails = await queuedMails();
    expect(mails.map(({ to }) => to).sort()).toEqual([fresh.email, helper.email].sort());
    expect(mails[0]?.facts).toContainEqual(["Priority", "P1 safety"]);
  });

  it("answers with both when somebody named people meanwhile, and changes nothing", async () => {
    const [lead, caseId] = [await asLead(), await aCase()];
    const seen = await seenOf(caseId);
    const first = await anAssignment({ priority: "P2" });
    await assignPeople(lead, { caseId, ...first, seen });
    await emptyOutbox();
    const second = await anAssignment({ priority: "P1", technicianIds: [] });
    const found = await refusal(assignPeople(lead, { caseId, ...second, seen }));
    expect(found.code).toBe("CONFLICT");
    expect(found.conflict).toMatchObject({ yours: second, theirs: first });
    expect((await caseRow(caseId)).priority).toBe("P2");
    expect(await queuedMails()).toEqual([]);
  });

  it("sees the same people in another order as the same", async () => {
    const [lead, caseId] = [await asLead(), await aCase()];
    const helper = await aPerson("Second Technician", "technician");
    const both = [(await asTechnician()).id, helper.id];
    const chosen = await anAssignment({ technicianIds: both });
    await assignPeople(lead, { caseId, ...chosen, seen: await seenOf(caseId) });
    const seen = { ...chosen, technicianIds: [...both].sort().reverse() };
    await assignPeople(lead, { caseId, ...chosen, priority: "P4", seen });
    expect((await caseRow(caseId)).priority).toBe("P4");
  });

  it("lets a date that has passed stand, and takes no new one that has", async () => {
    const [lead, caseId] = [await asLead(), await aCase({ dueOn: "2026-01-15" })];
    await assignPeople(lead, { caseId, ...(await anAssignment({ dueOn: "2026-01-15" })) });
    const earlier = { caseId, ...(await anAssignment({ dueOn: dayFromNow(-2) })) };
    expect((await refusal(assignPeople(lead, earlier))).fields).toEqual({
      dueOn: "This day has passed.",
    });
  });

  it("takes nobody of the client", async () => {
    const [lead, caseId] = [await asLead(), await aCase()];
    const requester = await asRequester();
    for (const change of [
      { investigatorId: requester.id },
      { leadId: requester.id },
      { secondReaderId: requester.id },
      { technicianIds: [requester.id] },
    ]) {
      const chosen = { caseId, ...(await anAssignment(change)) };
      const found = await refusal(assignPeople(lead, chosen));
      expect(Object.keys(found.fields ?? {})).toEqual(Object.keys(change));
      expect(Object.values(found.fields ?? {})[0]).toContain("belongs to the client");
    }
  });

  it("is for the lead engineer alone", async () => {
    const caseId = await aCase();
    const chosen = { caseId, ...(await anAssignment({ priority: "P1" })) };
    for (const [actor, code] of [
      [await asInvestigator(), "NOT_ALLOWED"],
      [await asTechnician(), "NOT_ALLOWED"],
      [await asRequester(), "NOT_ALLOWED"],
      [await asAdministrator(), "NOT_ALLOWED"],
      [await asOtherRequester(), "NOT_FOUND"],
    ] as const) {
      expect((await refusal(assignPeople(actor, chosen))).code).toBe(code);
    }
    expect((await caseRow(caseId)).priority).toBeNull();
  });

  it("is undone as a whole when the last step fails", async () => {
    const [lead, caseId] = [await asLead(), await aCase()];
    const before = await seenOf(caseId);
    const fresh = await aPerson("Third Investigator", "investigator");
    const chosen = { caseId, ...(await anAssignment({ investigatorId: fresh.id })) };
    await expect(
      whileFailing("lastStepOfCase", () => assignPeople(lead, chosen)),
    ).rejects.toThrow();
    expect(await seenOf(caseId)).toEqual(before);
    expect(await eventsOf(caseId, "case.assign")).toEqual([]);
    expect(await queuedMails()).toEqual([]);
  });
});
