import { asc, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { caseQuestions } from "@/db/schema";
import { acceptCase } from "@/lib/cases/accept-case";
import { answerQuestion } from "@/lib/cases/answer-question";
import { askBack } from "@/lib/cases/ask-back";
import { ANSWER_MAX, QUESTION_MAX, QUESTIONS_AT_ONCE_MAX } from "@/lib/cases/schemas";
import { routes } from "@/lib/routes";
import { anAcceptance } from "../../helpers/assignments";
import { caseRow, eventsOf, movesOf } from "../../helpers/case-traces";
import { whileFailing } from "../../helpers/failing-database";
import { aSentCase } from "../../helpers/field-returns";
import { emptyOutbox, queuedMails } from "../../helpers/mails";
import {
  aPerson,
  asAdministrator,
  asInvestigator,
  asLead,
  asOtherRequester,
  asRequester,
  asSecondLead,
  asTechnician,
} from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const questionsOf = (caseId: string) =>
  database()
    .select()
    .from(caseQuestions)
    .where(eq(caseQuestions.caseId, caseId))
    .orderBy(asc(caseQuestions.askedAt), asc(caseQuestions.id));

async function aQuestion(...questions: string[]) {
  const { caseId, number } = await aSentCase();
  const { questionIds } = await askBack(await asLead(), {
    caseId,
    questions: questions.length > 0 ? questions : ["Was it oiled?"],
  });
  await emptyOutbox();
  return { caseId, number, questionIds, questionId: questionIds[0] ?? "" };
}

beforeEach(emptyOutbox);

describe("asking back", () => {
  it("keeps the questions in their order, mails the requester, and lets the case wait", async () => {
    const { caseId, number } = await aSentCase();
    await emptyOutbox();
    const questions = ["Was it oiled?", "Which edition of the drawing?"];
    await askBack(await asLead(), { caseId, questions });
    expect((await questionsOf(caseId)).map(({ question }) => question).sort()).toEqual(
      [...questions].sort(),
    );
    expect(await caseRow(caseId)).toMatchObject({ state: "info_needed", stage: 1 });
    const [mail, ...others] = await queuedMails();
    expect(others).toEqual([]);
    expect(mail).toMatchObject({
      to: (await asRequester()).email,
      subject: `${number}, a question for you, Hoist shaft`,
      button: { label: "Answer", path: routes.fieldReturn(caseId) },
    });
    for (const question of questions) expect(mail?.news).toContain(question);
  });

  it.each([
    ["none", []],
    ["an empty one", ["Was it oiled?", "  "]],
    ["one that is too long", ["x".repeat(QUESTION_MAX + 1)]],
    ["too many", Array.from({ length: QUESTIONS_AT_ONCE_MAX + 1 }, (_, i) => `Question ${i}`)],
    ["a text in the place of a list", "Was it oiled?"],
  ])("asks %s: refused", async (_name, questions) => {
    const { caseId } = await aSentCase();
    const found = await refusal(askBack(await asLead(), { caseId, questions }));
    expect(found.code).toBe("INVALID");
    expect((await caseRow(caseId)).state).toBe("submitted");
    expect(await questionsOf(caseId)).toEqual([]);
  });

  it("is undone as a whole when the mail cannot be put into the outbox", async () => {
    const { caseId } = await aSentCase();
    await emptyOutbox();
    const lead = await asLead();
    const asking = whileFailing("outbox", () => askBack(lead, { caseId, questions: ["Why?"] }));
    await expect(asking).rejects.toThrow();
    expect((await caseRow(caseId)).state).toBe("submitted");
    expect(await questionsOf(caseId)).toEqual([]);
    expect(await eventsOf(caseId, "case.askBack")).toEqual([]);
  });
});

describe("answering", () => {
  it("gives the case back with the last answer, and mails who asked", async () => {
    const { caseId, number, questionIds } = await aQuestion("Was it oiled?", "Who cut it?");
    const requester = await asRequester();
    const [one = "", two = ""] = questionIds;
    const first = await answerQuestion(requester, { caseId, questionId: one, answer: " No. " });
    expect(first).toEqual({ stillOpen: 1, version: null });
    expect((await caseRow(caseId)).state).toBe("info_needed");
    expect(await queuedMails()).toEqual([]);
    const last = await answerQuestion(requester, { caseId, questionId: two, answer: "Nobody." });
    expect(last).toEqual({ stillOpen: 0, version: null });
    expect((await caseRow(caseId)).state).toBe("submitted");
    const answered = await questionsOf(caseId);
    expect(answered.map(({ id, answer }) => [id, answer]).sort()).toEqual(
      [
        [one, "No."],
        [two, "Nobody."],
      ].sort(),
    );
    expect(answered.every(({ answeredById }) => answeredById === requester.id)).toBe(true);
    const [mail, ...others] = await queuedMails();
    expect(others).toEqual([]);
    expect(mail).toMatchObject({
      to: (await asLead()).email,
      subject: `${number}, answered, Hoist shaft`,
    });
    expect(mail?.facts).toContainEqual(["Answer", "Nobody."]);
  });

  it("is open to the people of the client and to nobody else", async () => {
    const { caseId, questionId } = await aQuestion();
    const answer = { caseId, questionId, answer: "No." };
    for (const [actor, code] of [
      [await asOtherRequester(), "NOT_FOUND"],
      [await asTechnician(), "NOT_FOUND"],
      [await asInvestigator(), "NOT_ALLOWED"],
      [await asLead(), "NOT_ALLOWED"],
      [await asAdministrator(), "NOT_ALLOWED"],
    ] as const) {
      expect([actor.name, (await refusal(answerQuestion(actor, answer))).code]).toEqual([
        actor.name,
        code,
      ]);
    }
    const colleague = await aPerson("Colleague Person", "requester", {
      name: (await asRequester()).organisationName,
      kind: "client",
    });
    expect(await answerQuestion(colleague, answer)).toMatchObject({ stillOpen: 0 });
  });

  it("tells the second of two who answer at once, and keeps the first answer", async () => {
    const { caseId, questionIds } = await aQuestion("Was it oiled?", "Who cut it?");
    const questionId = questionIds[0] ?? "";
    const requester = await asRequester();
    const results = await Promise.allSettled([
      answerQuestion(requester, { caseId, questionId, answer: "One" }),
      answerQuestion(requester, { caseId, questionId, answer: "Two" }),
    ]);
    expect(results.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    const lost = results.find((result) => result.status === "rejected");
    expect(lost?.reason).toMatchObject({ code: "CONFLICT" });
    const kept = (await questionsOf(caseId)).find(({ id }) => id === questionId);
    expect(kept?.answer).toBe(results[0].status === "fulfilled" ? "One" : "Two");
  });

  it("does not know the question of another case", async () => {
    const [one, other] = [await aQuestion(), await aQuestion()];
    const requester = await asRequester();
    const crossed = { caseId: one.caseId, questionId: other.questionId, answer: "No." };
    expect((await refusal(answerQuestion(requester, crossed))).code).toBe("NOT_FOUND");
    expect((await questionsOf(other.caseId))[0]?.answer).toBeNull();
  });

  it.each(["", "   ", "x".repeat(ANSWER_MAX + 1)])("takes no answer like %.10j", async (answer) => {
    const { caseId, questionId } = await aQuestion();
    const found = await refusal(
      answerQuestion(await asRequester(), { caseId, questionId, answer }),
    );
    expect(found.fields).toHaveProperty("answer");
  });

  it("keeps the case waiting when the mail cannot be put into the outbox", async () => {
    const { caseId, questionId } = await aQuestion();
    const requester = await asRequester();
    const answering = whileFailing("outbox", () =>
      answerQuestion(requester, { caseId, questionId, answer: "No." }),
    );
    await expect(answering).rejects.toThrow();
    expect((await caseRow(caseId)).state).toBe("info_needed");
    expect((await questionsOf(caseId))[0]?.answer).toBeNull();
  });
});

describe("a question after the case was accepted", () => {
  it("takes it back to be accepted anew, with its people and its findings as they were", async () => {
    const [lead, investigator] = [await asLead(), await asInvestigator()];
    const { caseId } = await aSentCase();
    await acceptCase(lead, await anAcceptance(caseId));
    const { questionIds } = await askBack(investigator, { caseId, questions: ["Which edition?"] });
    await emptyOutbox();
    const questionId = questionIds[0] ?? "";
    await answerQuestion(await asRequester(), { caseId, questionId, answer: "B" });
    const told = (await queuedMails()).map(({ to }) => to).sort();
    expect(told).toEqual([lead.email, investigator.email].sort());
    expect(await caseRow(caseId)).toMatchObject({
      state: "submitted",
      investigatorId: investigator.id,
    });
    await acceptCase(await asSecondLead(), await anAcceptance(caseId));
    expect((await movesOf(caseId)).map(({ to }) => to)).toEqual([
      "draft",
      "submitted",
      "accepted",
      "info_needed",
      "submitted",
      "accepted",
    ]);
  });

  it("is not for an investigator of another case", async () => {
    const stranger = await aPerson("Third Investigator", "investigator");
    const { caseId } = await aSentCase();
    await acceptCase(await asLead(), await anAcceptance(caseId));
    const found = await refusal(askBack(stranger, { caseId, questions: ["Why?"] }));
    expect(found.code).toBe("NOT_ALLOWED");
  });
});
