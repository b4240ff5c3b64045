import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { people } from "@/db/schema";
import { cancelCase } from "@/lib/cases/cancel-case";
import { declineCase } from "@/lib/cases/decline-case";
import { REASON_MAX } from "@/lib/cases/schemas";
import { submitCase } from "@/lib/cases/submit-case";
import { caseRow, eventsOf, movesOf } from "../../helpers/case-traces";
import { whileFailing } from "../../helpers/failing-database";
import { aDraft, aSentCase } from "../../helpers/field-returns";
import { emptyOutbox, queuedMails } from "../../helpers/mails";
import { aPerson, asLead, asRequester } from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const REASON = "The part is not metal.";

async function aFreshCase() {
  await asLead();
  const sent = await aSentCase();
  await emptyOutbox();
  return sent;
}

beforeEach(emptyOutbox);

describe("declining", () => {
  it("ends the case, keeps the reason, and mails it to the requester alone", async () => {
    const { caseId, number } = await aFreshCase();
    await declineCase(await asLead(), { caseId, reason: `  ${REASON} ` });
    expect(await caseRow(caseId)).toMatchObject({ state: "declined", stage: 0, endReason: REASON });
    expect((await movesOf(caseId)).at(-1)).toEqual({
      from: "submitted",
      to: "declined",
      reason: REASON,
    });
    const [event] = await eventsOf(caseId, "case.decline");
    expect(event?.after).toMatchObject({ state: "declined", reason: REASON });
    const [mail, ...others] = await queuedMails();
    expect(others).toEqual([]);
    expect(mail).toMatchObject({
      to: (await asRequester()).email,
      subject: `${number}, declined, Hoist shaft`,
    });
    expect(mail?.facts).toContainEqual(["Reason", REASON]);
  });

  it("mails nobody who has left", async () => {
    const gone = await aPerson("Leaving Requester", "requester", {
      name: (await asRequester()).organisationName,
      kind: "client",
    });
    const { caseId } = await aSentCase(undefined, gone);
    await database().update(people).set({ isActive: false }).where(eq(people.id, gone.id));
    await emptyOutbox();
    await declineCase(await asLead(), { caseId, reason: REASON });
    expect(await queuedMails()).toEqual([]);
  });

  it.each([undefined, "", "   ", "x".repeat(REASON_MAX + 1), ["a reason"]])(
    "demands a reason: %.20j",
    async (reason) => {
      const { caseId } = await aFreshCase();
      const found = await refusal(declineCase(await asLead(), { caseId, reason }));
      expect(found.code).toBe("INVALID");
      expect(Object.keys(found.fields ?? {})).toEqual(["reason"]);
      expect((await caseRow(caseId)).state).toBe("submitted");
    },
  );

  it("leaves the case as it was when the mail cannot be put into the outbox", async () => {
    const { caseId } = await aFreshCase();
    const lead = await asLead();
    const declining = whileFailing("outbox", () => declineCase(lead, { caseId, reason: REASON }));
    await expect(declining).rejects.toThrow();
    expect(await caseRow(caseId)).toMatchObject({ state: "submitted", endReason: null });
  });
});

describe("cancelling", () => {
  it("of a draft tells nobody, and nothing can be sent after it", async () => {
    const requester = await asRequester();
    const draft = await aDraft();
    await cancelCase(requester, { caseId: draft.caseId, reason: "Found it ourselves." });
    expect(await queuedMails()).toEqual([]);
    expect(await caseRow(draft.caseId)).toMatchObject({ state: "cancelled", number: null });
    expect((await refusal(submitCase(requester, draft))).code).toBe("LOCKED");
  });

  it("of a draft works however long its title is", async () => {
    const requester = await asRequester();
    const { caseId } = await aDraft({ headline: { kind: "value", value: "🪛x".repeat(150) } });
    await cancelCase(requester, { caseId, reason: "Typed by the cat." });
    expect((await caseRow(caseId)).state).toBe("cancelled");
    const [event] = await eventsOf(caseId, "case.cancel");
    expect(event?.subjectLabel).toMatch(/^(🪛x){59}🪛…$/u);
  });

  it("of a sent case by its requester tells the lead engineer, who may take it", async () => {
    const { caseId, number } = await aFreshCase();
    await cancelCase(await asRequester(), { caseId, reason: "Found it ourselves." });
    const [mail, ...others] = await queuedMails();
    expect(others).toEqual([]);
    expect(mail).toMatchObject({
      to: (await asLead()).email,
      subject: `${number}, cancelled, Hoist shaft`,
    });
  });

  it("by the lead engineer tells the requester", async () => {
    const { caseId } = await aFreshCase();
    await cancelCase(await asLead(), { caseId, reason: "Sent twice." });
    expect((await queuedMails()).map(({ to }) => to)).toEqual([(await asRequester()).email]);
  });

  it("is not for a colleague of the requester", async () => {
    const colleague = await aPerson("Colleague Person", "requester", {
      name: (await asRequester()).organisationName,
      kind: "client",
    });
    const { caseId } = await aFreshCase();
    const found = await refusal(cancelCase(colleague, { caseId, reason: "Not mine." }));
    expect(found.code).toBe("NOT_ALLOWED");
  });

  it("meets a decline at the same time: one of the two holds", async () => {
    const { caseId } = await aFreshCase();
    const [lead, requester] = [await asLead(), await asRequester()];
    const results = await Promise.allSettled([
      declineCase(lead, { caseId, reason: REASON }),
      cancelCase(requester, { caseId, reason: "Found it ourselves." }),
    ]);
    const lost = results.filter((result) => result.status === "rejected");
    expect(lost.map(({ reason }) => reason as unknown)).toEqual([
      expect.objectContaining({ code: "LOCKED" }),
    ]);
    expect(await movesOf(caseId)).toHaveLength(3);
    expect(await queuedMails()).toHaveLength(1);
  });
});
