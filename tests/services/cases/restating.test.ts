import { and, asc, eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { records, recordVersions } from "@/db/schema";
import { verifyChains } from "@/lib/audit/verify-chain";
import { acceptCase } from "@/lib/cases/accept-case";
import { answerQuestion } from "@/lib/cases/answer-question";
import { askBack } from "@/lib/cases/ask-back";
import { loadAnswers } from "@/lib/cases/load-answers";
import { saveDraft } from "@/lib/cases/save-draft";
import { stagePeriods } from "@/lib/cases/stage-periods";
import type { Answers } from "@/lib/intake/answers";
import { fieldReturnContent } from "@/lib/intake/schemas";
import { anAcceptance } from "../../helpers/assignments";
import { caseRow, eventsOf, movesOf } from "../../helpers/case-traces";
import { aSentCase, sendableAnswers, value } from "../../helpers/field-returns";
import { asInvestigator, asLead, asRequester } from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const versionsOf = (caseId: string) =>
  database()
    .select({
      number: recordVersions.number,
      content: recordVersions.content,
      quotes: recordVersions.quotes,
      madeById: recordVersions.madeById,
    })
    .from(recordVersions)
    .innerJoin(records, eq(records.id, recordVersions.recordId))
    .where(and(eq(records.caseId, caseId), eq(records.kind, "field_return")))
    .orderBy(asc(recordVersions.number));

/** A case accepted, then asked about by its investigator. */
async function anAskedCase() {
  const { caseId } = await aSentCase();
  await acceptCase(await asLead(), await anAcceptance(caseId));
  const asked = { caseId, questions: ["What does the drawing say?"] };
  const { questionIds } = await askBack(await asInvestigator(), asked);
  return { caseId, questionId: questionIds[0] ?? "" };
}

async function change(caseId: string, answers: Answers) {
  const { revision } = await loadAnswers(database(), caseId);
  return saveDraft(await asRequester(), { caseId, revision, answers });
}

describe("a field return restated while a question is open", () => {
  it("becomes the next version with the last answer; the first stays as it was sent", async () => {
    const { caseId, questionId } = await anAskedCase();
    const restated = sendableAnswers({
      headline: value("Hoist shaft, broken at the keyway"),
      grade: value("42CrMo4"),
      hoursInService: value("11 400"),
    });
    await change(caseId, restated);
    expect((await caseRow(caseId)).title).toBe("Hoist shaft, broken at the journal fillet");
    expect(await versionsOf(caseId)).toHaveLength(1);

    const requester = await asRequester();
    const answered = await answerQuestion(requester, { caseId, questionId, answer: "See there." });
    expect(answered.version).toBe(2);
    const [first, second] = await versionsOf(caseId);
    expect(fieldReturnContent.parse(first?.content).answers).toEqual(sendableAnswers());
    expect(fieldReturnContent.parse(second?.content).answers).toEqual(restated);
    expect(first?.quotes).not.toHaveProperty("hoursInService");
    expect(second?.quotes.hoursInService).toMatchObject({ value: 11_400, unit: "h" });
    expect(second?.madeById).toBe(requester.id);
    expect(await caseRow(caseId)).toMatchObject({
      title: "Hoist shaft, broken at the keyway",
      material: "42CrMo4",
    });
    const told = (await eventsOf(caseId, "case.answer")).find(
      ({ subjectKind, subjectLabel }) => subjectKind === "field_return" && subjectLabel === "F1",
    );
    expect(told?.after).toMatchObject({ version: 2, answers: { grade: value("42CrMo4") } });
    expect(Object.keys((told?.after as { answers: object }).answers).sort()).toEqual([
      "grade",
      "headline",
      "hoursInService",
    ]);
    expect((await verifyChains(caseId)).faults).toEqual([]);
  });

  it("makes no version where nothing changed", async () => {
    const { caseId, questionId } = await anAskedCase();
    const answer = { caseId, questionId, answer: "As it was." };
    expect((await answerQuestion(await asRequester(), answer)).version).toBeNull();
    expect(await versionsOf(caseId)).toHaveLength(1);
  });

  it("holds the answer back, and keeps what was typed, while the restated one does not hold", async () => {
    const { caseId, questionId } = await anAskedCase();
    const wrong = sendableAnswers({ hoursInService: value("many") });
    await change(caseId, wrong);
    const answer = { caseId, questionId, answer: "See there." };
    const found = await refusal(answerQuestion(await asRequester(), answer));
    expect(found.code).toBe("INVALID");
    expect(found.fields).toEqual({ hoursInService: "This needs one number. You typed “many”." });
    expect((await caseRow(caseId)).state).toBe("info_needed");
    expect((await loadAnswers(database(), caseId)).answers).toEqual(wrong);
  });

  it("does not ask again whether the wanted day still lies ahead", async () => {
    const { caseId, questionId } = await anAskedCase();
    await change(caseId, sendableAnswers({ neededBy: value("2001-01-01") }));
    const answer = { caseId, questionId, answer: "It was urgent." };
    expect((await answerQuestion(await asRequester(), answer)).version).toBe(2);
  });

  it("cannot be changed once the questions are answered", async () => {
    const { caseId, questionId } = await anAskedCase();
    await answerQuestion(await asRequester(), { caseId, questionId, answer: "Nothing to add." });
    const late = change(caseId, sendableAnswers({ grade: value("C45") }));
    expect((await refusal(late)).code).toBe("LOCKED");
  });

  it("is not for the laboratory to change", async () => {
    const { caseId } = await anAskedCase();
    const { revision } = await loadAnswers(database(), caseId);
    for (const actor of [await asLead(), await asInvestigator()]) {
      const saving = saveDraft(actor, { caseId, revision, answers: sendableAnswers() });
      expect((await refusal(saving)).code).toBe("NOT_ALLOWED");
    }
  });
});

it("counts the time of a question as time at the first stage", async () => {
  const { caseId, questionId } = await anAskedCase();
  await answerQuestion(await asRequester(), { caseId, questionId, answer: "Nothing to add." });
  await acceptCase(await asLead(), await anAcceptance(caseId));
  const moves = await movesOf(caseId);
  const at = (index: number) => new Date(Date.UTC(2026, 10, index + 1)).toISOString();
  const periods = stagePeriods(
    moves.map(({ to }, index) => ({ to, at: at(index) })),
    new Date(at(20)),
  );
  // Moves in order: draft, submitted, accepted, info_needed, submitted, accepted.
  expect(periods.map(({ stage, from, to }) => [stage, from, to])).toEqual([
    ["Received", at(1), at(2)],
    ["Accepted", at(2), at(3)],
    ["Received", at(3), at(5)],
    ["Accepted", at(5), at(20)],
  ]);
});
