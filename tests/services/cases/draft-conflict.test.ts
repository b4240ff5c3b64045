import { describe, expect, it } from "vitest";
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { auditEvents } from "@/db/schema";
import { loadAnswers } from "@/lib/cases/load-answers";
import { saveDraft } from "@/lib/cases/save-draft";
import { submitCase } from "@/lib/cases/submit-case";
import { aDraft, sendableAnswers, value } from "../../helpers/field-returns";
import { asRequester } from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const mine = sendableAnswers({ headline: value("As typed in the first window") });
const other = sendableAnswers({ headline: value("As typed in the second window") });

describe("a draft saved from two windows", () => {
  it("answers the late one with both contents and keeps what was saved first", async () => {
    const requester = await asRequester();
    const { caseId, revision } = await aDraft();
    const first = await saveDraft(requester, { caseId, revision, answers: mine });
    const { code, conflict } = await refusal(
      saveDraft(requester, { caseId, revision, answers: other }),
    );
    expect(code).toBe("CONFLICT");
    expect(conflict).toEqual({
      yours: { answers: other },
      theirs: { answers: mine, revision: first.revision },
      changedBy: requester.name,
      changedAt: first.savedAt,
    });
    expect(await loadAnswers(database(), caseId)).toMatchObject({
      answers: mine,
      revision: first.revision,
    });
  });

  it("takes the late one once it names the revision it was shown", async () => {
    const requester = await asRequester();
    const { caseId, revision } = await aDraft();
    await saveDraft(requester, { caseId, revision, answers: mine });
    await saveDraft(requester, { caseId, revision: revision + 1, answers: other });
    expect((await loadAnswers(database(), caseId)).answers).toEqual(other);
  });

  it("keeps one of two that come at the same time, and gives the other both", async () => {
    const requester = await asRequester();
    const { caseId, revision } = await aDraft();
    const results = await Promise.allSettled([
      saveDraft(requester, { caseId, revision, answers: mine }),
      saveDraft(requester, { caseId, revision, answers: other }),
    ]);
    expect(results.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    const lost = results.find((result) => result.status === "rejected");
    const won = results[0].status === "fulfilled" ? mine : other;
    expect(lost?.reason).toMatchObject({
      code: "CONFLICT",
      conflict: { yours: { answers: won === mine ? other : mine }, theirs: { answers: won } },
    });
    expect((await loadAnswers(database(), caseId)).answers).toEqual(won);
    const events = await database().select().from(auditEvents).where(eq(auditEvents.chain, caseId));
    expect(events.map(({ action }) => action)).toEqual(["case.create", "case.editDraft"]);
  });

  it("refuses a revision from the future as well", async () => {
    const requester = await asRequester();
    const { caseId, revision } = await aDraft();
    const late = saveDraft(requester, { caseId, revision: revision + 5, answers: mine });
    expect((await refusal(late)).code).toBe("CONFLICT");
  });

  it("sends nothing that the sender has not seen", async () => {
    const requester = await asRequester();
    const { caseId, revision } = await aDraft();
    await saveDraft(requester, { caseId, revision, answers: mine });
    const found = await refusal(submitCase(requester, { caseId, revision }));
    expect(found.code).toBe("CONFLICT");
    expect(found.message).toContain("Nothing was sent");
    await submitCase(requester, { caseId, revision: revision + 1 });
  });

  it("refuses to save after it was sent", async () => {
    const requester = await asRequester();
    const draft = await aDraft();
    await submitCase(requester, draft);
    const found = await refusal(saveDraft(requester, { ...draft, answers: mine }));
    expect(found.code).toBe("LOCKED");
    expect((await loadAnswers(database(), draft.caseId)).answers).toEqual(sendableAnswers());
  });
});
