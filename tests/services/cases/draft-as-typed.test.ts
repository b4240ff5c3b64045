import { describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { verifyChains } from "@/lib/audit/verify-chain";
import { createDraft } from "@/lib/cases/create-draft";
import { loadAnswers } from "@/lib/cases/load-answers";
import { saveDraft } from "@/lib/cases/save-draft";
import { submitCase } from "@/lib/cases/submit-case";
import type { Answer, Answers } from "@/lib/intake/answers";
import { FIELDS, type FieldKey } from "@/lib/intake/fields";
import { aDraft, sendableAnswers, unknown, value } from "../../helpers/field-returns";
import { asRequester } from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

const kept = async (caseId: string) => (await loadAnswers(database(), caseId)).answers;

describe("a draft of a field return", () => {
  it("keeps what was typed, letter by letter, right or wrong", async () => {
    const requester = await asRequester();
    const { caseId, revision } = await createDraft(requester, {});
    const answers: Answers = {
      headline: value("  Shaft   broke\tat the fillet  "),
      hoursInService: value("11,400 or so"),
      quantityFailed: value("-3"),
      foundAt: value({ date: "2026-02-30", time: "25:99", zone: "Mars/Olympus" }),
      surfaceHardness: value({ scale: "", min: "60", max: "58", location: "" }),
      suspects: value(["fatigue", "something else"]),
      pieces: value([{ name: "", kind: "half", quantity: "two", condition: "rusted" }]),
    };
    const saved = await saveDraft(requester, { caseId, revision, answers });
    expect(saved.revision).toBe(2);
    expect(await kept(caseId)).toEqual(answers);
  });

  it("makes no new revision where nothing changed", async () => {
    const requester = await asRequester();
    const { caseId, revision } = await aDraft();
    const again = await saveDraft(requester, { caseId, revision, answers: sendableAnswers() });
    expect(again.revision).toBe(revision);
  });

  it("leaves a chain of events that fits", async () => {
    const requester = await asRequester();
    const { caseId, revision } = await aDraft();
    await saveDraft(requester, {
      caseId,
      revision,
      answers: sendableAnswers({ headline: value("Another line") }),
    });
    const report = await verifyChains(caseId);
    expect(report).toMatchObject({ chainCount: 1, eventCount: 2, faults: [] });
  });
});

describe("every field takes each of the four answers", () => {
  const asked = FIELDS.filter(({ need }) => need !== "optional").map(({ key }) => key);
  const each = (answer: Answer): Answers =>
    Object.fromEntries(FIELDS.map(({ key }) => [key, answer]));

  it.each([
    ["not applicable", { kind: "not_applicable" }],
    ["unknown, with the reason", unknown("The owner kept no record")],
    ["awaiting an answer", { kind: "awaiting" }],
    ["awaiting an answer of someone", { kind: "awaiting", of: "The works in Hull" }],
  ] satisfies [string, Answer][])("%s, and is sent so", async (_name, answer) => {
    const requester = await asRequester();
    const answers = each(answer);
    const draft = await createDraft(requester, { answers });
    expect(await kept(draft.caseId)).toEqual(answers);
    const sent = await submitCase(requester, draft);
    expect(sent.number).toMatch(/^RL-\d{4}-\d{4}$/);
  });

  it("asks why, of each field that is unknown without a reason", async () => {
    const requester = await asRequester();
    const draft = await createDraft(requester, { answers: each(unknown("  ")) });
    const { code, fields } = await refusal(submitCase(requester, draft));
    expect(code).toBe("INVALID");
    expect(Object.keys(fields ?? {}).sort()).toEqual(FIELDS.map(({ key }) => key).sort());
    expect(new Set(Object.values(fields ?? {}))).toEqual(new Set(["Say why it is not known."]));
  });

  it("names every field that is asked for and blank, and lets the optional ones be", async () => {
    const requester = await asRequester();
    const draft = await createDraft(requester, {});
    const { code, fields } = await refusal(submitCase(requester, draft));
    expect(code).toBe("INVALID");
    const named = Object.keys(fields ?? {}) as FieldKey[];
    expect(named.sort()).toEqual([...asked].sort());
    expect(fields?.headline).toMatch(/^Answer this/);
  });
});
