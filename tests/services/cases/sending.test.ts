import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { caseNumbers, cases, people, records } from "@/db/schema";
import { verifyChains } from "@/lib/audit/verify-chain";
import { submitCase } from "@/lib/cases/submit-case";
import { routes } from "@/lib/routes";
import { FAILURE, failureOf, whileFailing } from "../../helpers/failing-database";
import { aDraft, sendableAnswers, value } from "../../helpers/field-returns";
import { emptyOutbox, queuedMails } from "../../helpers/mails";
import { aPerson, asLead, asRequester, asSecondLead } from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const caseRow = async (caseId: string) =>
  (await database().select().from(cases).where(eq(cases.id, caseId)))[0];

beforeEach(async () => {
  await asLead();
  await emptyOutbox();
});

describe("sending a field return", () => {
  it("gives it a number, keeps it as F1, and mails the sender and the lead engineer", async () => {
    const requester = await asRequester();
    const draft = await aDraft();
    const { number } = await submitCase(requester, draft);
    expect(await caseRow(draft.caseId)).toMatchObject({
      number,
      state: "submitted",
      stage: 1,
      title: "Hoist shaft, broken at the journal fillet",
      drawingNumber: "HB-2210",
    });
    const [record] = await database()
      .select()
      .from(records)
      .where(eq(records.caseId, draft.caseId));
    expect(record).toMatchObject({ kind: "field_return", label: "F1" });
    const [toSender, toLead, ...rest] = await queuedMails();
    expect(rest).toEqual([]);
    expect(toSender).toMatchObject({
      to: requester.email,
      subject: `${number}, field return received, Hoist shaft`,
      button: { path: routes.fieldReturn(draft.caseId) },
    });
    expect(toSender?.after).toContain("Do not fit the broken faces back together.");
    expect(toLead).toMatchObject({
      to: (await asLead()).email,
      subject: `${number}, new field return, Hoist shaft`,
      button: { path: routes.case(draft.caseId) },
    });
    expect((await verifyChains(draft.caseId)).faults).toEqual([]);
  });

  it("mails no lead engineer who has left, and everyone once", async () => {
    const gone = await aPerson("Former Lead", "lead");
    await database().update(people).set({ isActive: false }).where(eq(people.id, gone.id));
    const second = await asSecondLead();
    const requester = await asRequester();
    await submitCase(requester, await aDraft());
    const told = (await queuedMails()).map(({ to }) => to).sort();
    expect(told).toEqual([requester.email, (await asLead()).email, second.email].sort());
    await database().update(people).set({ isActive: false }).where(eq(people.id, second.id));
  });

  it("is refused while it is incomplete, and sends, numbers and mails nothing", async () => {
    const requester = await asRequester();
    const incomplete = sendableAnswers({
      headline: value(" "),
      quantityFailed: value("some"),
      neededBy: value("2001-01-01"),
      surfaceHardness: value({ scale: "", min: "58", max: "", location: "Journal" }),
    });
    const draft = await aDraft(incomplete);
    const { code, fields } = await refusal(submitCase(requester, draft));
    expect(code).toBe("INVALID");
    expect(fields).toEqual({
      headline: expect.stringContaining("Answer this"),
      quantityFailed: "This needs one number. You typed “some”.",
      neededBy: "This day has passed.",
      surfaceHardness: expect.stringContaining("Choose the scale"),
    });
    expect(await caseRow(draft.caseId)).toMatchObject({ number: null, state: "draft" });
    expect(await queuedMails()).toEqual([]);
  });

  it("names answers that contradict one another", async () => {
    const requester = await asRequester();
    const tomorrow = new Date(Date.now() + 2 * 86_400_000).toISOString().slice(0, 10);
    const draft = await aDraft(
      sendableAnswers({
        quantityFailed: value("3"),
        quantityInstalled: value("2"),
        foundAt: value({ date: tomorrow, time: "", zone: "Europe/London" }),
      }),
    );
    const { fields } = await refusal(submitCase(requester, draft));
    expect(fields).toEqual({
      quantityFailed: "3 failed is more than the 2 in service. Count the failed ones in.",
      foundAt: "This lies in the future.",
    });
  });
});

describe("sending the same draft twice at once", () => {
  it("gives one number and one pair of mails, and tells the second that it is sent", async () => {
    const requester = await asRequester();
    const draft = await aDraft();
    const results = await Promise.allSettled([
      submitCase(requester, draft),
      submitCase(requester, draft),
    ]);
    const sent = results.flatMap((result) => (result.status === "fulfilled" ? result.value : []));
    const refused = results.flatMap((result) =>
      result.status === "rejected" ? [result.reason as unknown] : [],
    );
    expect(sent).toHaveLength(1);
    expect(refused).toEqual([expect.objectContaining({ code: "LOCKED" })]);
    expect((await caseRow(draft.caseId))?.number).toBe(sent[0]?.number);
    expect(await queuedMails()).toHaveLength(2);
    const f1 = await database().select().from(records).where(eq(records.caseId, draft.caseId));
    expect(f1).toHaveLength(1);
  });
});

describe("when sending fails half way", () => {
  it("leaves neither number nor mail, and the next one gets the number", async () => {
    const requester = await asRequester();
    const [before] = await database().select().from(caseNumbers);
    const draft = await aDraft();
    for (const place of ["outbox", "lastStepOfCase", "auditLog"] as const) {
      const failed: unknown = await whileFailing(place, () => submitCase(requester, draft)).catch(
        (error: unknown) => error,
      );
      expect(failureOf(failed)).toContain(FAILURE);
    }
    expect(await queuedMails()).toEqual([]);
    expect(await caseRow(draft.caseId)).toMatchObject({ number: null, state: "draft" });
    const { number } = await submitCase(requester, draft);
    expect(number.slice(-4)).toBe(String((before?.last ?? 0) + 1).padStart(4, "0"));
    expect(await queuedMails()).toHaveLength(2);
  });
});
