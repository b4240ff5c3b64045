import { describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { verifyChains } from "@/lib/audit/verify-chain";
import { createDraft } from "@/lib/cases/create-draft";
import { getCase } from "@/lib/cases/get-case";
import { loadAnswers } from "@/lib/cases/load-answers";
import { saveDraft } from "@/lib/cases/save-draft";
import { submitCase } from "@/lib/cases/submit-case";
import { DRAFT_TEXT_MAX } from "@/lib/intake/constants";
import { mailBody } from "@/lib/outbox/mail-body";
import { aDraft, sendableAnswers, value } from "../../helpers/field-returns";
import { emptyOutbox, queuedMails } from "../../helpers/mails";
import { asLead, asRequester } from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

/** Half of a pair of code units is no letter; it is kept as the sign for one that is lost. */
const asKept = (text: string) => text.replace(/\p{Surrogate}/gu, "\ufffd");

const TEXTS = {
  "a script tag": '<script>fetch("//evil.example")</script><img src=x onerror=alert(1)>',
  "emoji outside the basic plane": "Shaft 🪛🔥 broke 👩🏽‍🔧",
  "right-to-left words with an override": "عمود الرافعة \u202Efdp.exe",
  "a null character": "Hoist\u0000shaft",
  "control characters and line breaks": "Hoist\r\nshaft\u001b[31m\u0007",
  "database words": "'; DROP TABLE cases; -- \\' \" ` % _ /*",
  "template words": "${process.env} {{7*7}} #{7*7}",
  "half of a pair of code units": "Hoist \ud83d shaft",
  "a character that is none": "Hoist \ufffe\uffff shaft",
  "combining marks": "S\u0336h\u0336a\u0336f\u0336t\u0336",
};

describe("text that means harm is text", () => {
  it.each(Object.entries(TEXTS))("%s", async (_name, text) => {
    const [requester, lead] = [await asRequester(), await asLead()];
    await emptyOutbox();
    const saying = (words: string) =>
      sendableAnswers({ headline: value(words), partName: value(words), residues: value(words) });
    const draft = await aDraft(saying(text));
    const kept = (await loadAnswers(database(), draft.caseId)).answers;
    expect(kept).toEqual(saying(asKept(text)));
    const { number } = await submitCase(requester, draft);
    const { row } = await getCase(lead, "case.view", draft.caseId);
    expect(row.title).toBe(asKept(text.trim()));
    for (const mail of await queuedMails()) {
      expect(mail.subject.startsWith(`${number}, `)).toBe(true);
      const { html } = mailBody(mail);
      expect(html).not.toContain("<script");
      expect(html).not.toContain("<img");
    }
    expect((await verifyChains(draft.caseId)).faults).toEqual([]);
  });
});

describe("what is no field return is refused and changes nothing", () => {
  const wrong: Record<string, unknown> = {
    "a text of 10 million letters": { headline: value("x".repeat(10_000_000)) },
    "a text one letter too long": { headline: value("x".repeat(DRAFT_TEXT_MAX + 1)) },
    "a reason of 10 million letters": {
      headline: { kind: "unknown", why: "x".repeat(10_000_000) },
    },
    "a list in the place of a text": { headline: { kind: "value", value: ["a", "b"] } },
    "an object in the place of a text": { headline: { kind: "value", value: { toString: 1 } } },
    "a number in the place of a text": { hoursInService: { kind: "value", value: 11_400 } },
    "nothing in the place of a text": { headline: { kind: "value", value: null } },
    "a text in the place of an answer": { headline: "Hoist shaft" },
    "an answer of a fifth kind": { headline: { kind: "guessed", value: "x" } },
    "a text in the place of pieces": { pieces: value("two halves") },
    "a thousand pieces": {
      pieces: value(
        Array.from({ length: 1000 }, () => ({
          name: "Half",
          kind: "failed_part",
          quantity: "1",
          condition: "",
        })),
      ),
    },
    "a field that nobody asked for": { isAdministrator: value("yes") },
    "a list in the place of all answers": [value("x")],
    "a text in the place of all answers": "headline=x",
    "the key __proto__": JSON.parse('{"__proto__": {"kind": "value", "value": "x"}}'),
    "the key constructor": { constructor: value("x") },
    "the key toString": { toString: value("x") },
    "the key hasOwnProperty": { hasOwnProperty: value("x") },
  };

  it.each(Object.entries(wrong))("%s", async (_name, answers) => {
    const requester = await asRequester();
    const { caseId, revision } = await aDraft();
    const saving = await refusal(saveDraft(requester, { caseId, revision, answers }));
    expect(saving.code).toBe("INVALID");
    expect(Object.keys(saving.fields ?? {})[0]).toMatch(/^answers/);
    expect((await refusal(createDraft(requester, { answers }))).code).toBe("INVALID");
    expect(await loadAnswers(database(), caseId)).toMatchObject({
      revision,
      answers: sendableAnswers(),
    });
    expect(Object.prototype).not.toHaveProperty("kind");
  });

  it.each([
    ["no revision", { revision: undefined }],
    ["half a revision", { revision: 1.5 }],
    ["a revision as text", { revision: "1" }],
    ["a revision that is no number", { revision: Number.NaN }],
    ["a revision beyond every integer", { revision: Number.POSITIVE_INFINITY }],
    ["a case id that is a list", { caseId: ["case_1"] }],
    ["a case id of 10 million letters", { caseId: "x".repeat(10_000_000) }],
  ])("%s", async (_name, change) => {
    const requester = await asRequester();
    const { caseId, revision } = await aDraft();
    const sent = { caseId, revision, ...change };
    const saving = saveDraft(requester, { ...sent, answers: sendableAnswers() });
    expect((await refusal(saving)).code).toBe("INVALID");
    expect((await refusal(submitCase(requester, sent))).code).toBe("INVALID");
  });

  it.each([null, undefined, "text", 5, []])("%s as a whole", async (raw) => {
    const requester = await asRequester();
    expect((await refusal(saveDraft(requester, raw))).code).toBe("INVALID");
    expect((await refusal(submitCase(requester, raw))).code).toBe("INVALID");
    expect((await refusal(createDraft(requester, raw))).code).toBe("INVALID");
  });

  it.each(["日本", "é", "🪛", "case_1' or '1'='1", "\u0000", "CASE_1", ""])(
    "the case id %j, which names none",
    async (caseId) => {
      const requester = await asRequester();
      const saving = saveDraft(requester, { caseId, revision: 1, answers: {} });
      expect((await refusal(saving)).code).toBe("NOT_FOUND");
      expect((await refusal(getCase(requester, "case.view", caseId))).code).toBe("NOT_FOUND");
    },
  );
});

describe("text that is kept in a draft and too long to be sent", () => {
  it("is kept whole, and named with its limit on sending", async () => {
    const requester = await asRequester();
    const long = "é".repeat(DRAFT_TEXT_MAX);
    const draft = await aDraft(sendableAnswers({ headline: value(long), residues: value(long) }));
    expect((await loadAnswers(database(), draft.caseId)).answers.headline).toEqual(value(long));
    const { fields } = await refusal(submitCase(requester, draft));
    expect(fields?.headline).toBe(
      `This holds 120 characters. You typed ${DRAFT_TEXT_MAX}. Nothing was cut; shorten it.`,
    );
    expect(fields?.residues).toContain("Nothing was cut");
  });
});
