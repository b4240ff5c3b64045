import { beforeAll, describe, expect, it } from "vitest";
import type { Actor } from "@/lib/auth/actor";
import { acceptCase } from "@/lib/cases/accept-case";
import { answerQuestion } from "@/lib/cases/answer-question";
import { askBack } from "@/lib/cases/ask-back";
import { assignPeople } from "@/lib/cases/assign-people";
import { cancelCase } from "@/lib/cases/cancel-case";
import { CASE_STATES, type CaseState } from "@/lib/cases/constants";
import { declineCase } from "@/lib/cases/decline-case";
import { holdCase } from "@/lib/cases/hold-case";
import { submitCase } from "@/lib/cases/submit-case";
import { anAcceptance, anAssignment } from "../../helpers/assignments";
import { aCase } from "../../helpers/cases";
import { caseRow, eventsOf, movesOf } from "../../helpers/case-traces";
import { emptyOutbox, queuedMails } from "../../helpers/mails";
import {
  asAdministrator,
  asInvestigator,
  asLead,
  asOtherRequester,
  asRequester,
  asSecondLead,
  asTechnician,
} from "../../helpers/people";
import { refusal } from "../../helpers/refusal";

type Deed = {
  by: () => Promise<Actor>;
  /** States in which it can be done, typed out. */
  states: readonly CaseState[];
  does: (actor: Actor, caseId: string) => Promise<unknown>;
};

const WORK: CaseState[] = [
  "accepted",
  "awaiting_evidence",
  "examining_nd",
  "plan_review",
  "examining",
  "analysing",
  "reopened",
  "in_review",
];

const DEEDS: Record<string, Deed> = {
  send: {
    by: asRequester,
    states: ["draft"],
    does: (actor, caseId) => submitCase(actor, { caseId, revision: 1 }),
  },
  accept: {
    by: asLead,
    states: ["submitted"],
    does: async (actor, caseId) => acceptCase(actor, await anAcceptance(caseId)),
  },
  "ask back": {
    by: asLead,
    states: ["submitted", "accepted"],
    does: (actor, caseId) => askBack(actor, { caseId, questions: ["Why?"] }),
  },
  answer: {
    by: asRequester,
    states: ["info_needed"],
    does: (actor, caseId) =>
      answerQuestion(actor, { caseId, questionId: "qst_none", answer: "So." }),
  },
  decline: {
    by: asLead,
    states: ["submitted"],
    does: (actor, caseId) => declineCase(actor, { caseId, reason: "Not metal." }),
  },
  cancel: {
    by: asRequester,
    states: ["draft", "submitted", "info_needed"],
    does: (actor, caseId) => cancelCase(actor, { caseId, reason: "Not wanted." }),
  },
  assign: {
    by: asLead,
    states: ["submitted", "info_needed", ...WORK],
    does: async (actor, caseId) => assignPeople(actor, { caseId, ...(await anAssignment()) }),
  },
  hold: {
    by: asLead,
    states: CASE_STATES.filter(
      (state) => !["draft", "declined", "cancelled", "closed"].includes(state),
    ),
    does: (actor, caseId) => holdCase(actor, { caseId, kind: "customer", reason: "They asked." }),
  },
};

/** What a case leaves behind, to see that a refusal left nothing. */
async function traces(caseId: string) {
  return {
    row: await caseRow(caseId),
    moves: await movesOf(caseId),
    events: await eventsOf(caseId),
    mails: await queuedMails(),
  };
}

beforeAll(async () => {
  await asSecondLead();
  await emptyOutbox();
});

describe.each(Object.entries(DEEDS))("to %s", (_name, { by, states, does }) => {
  const wrong = CASE_STATES.filter((state) => !states.includes(state));

  it.each(wrong)("is refused while the case is %s, and leaves no trace", async (state) => {
    const actor = await by();
    // A lead engineer sees no draft of somebody else.
    const code = state === "draft" && actor.role === "lead" ? "NOT_FOUND" : "LOCKED";
    const caseId = await aCase({ state });
    const before = await traces(caseId);
    expect((await refusal(does(actor, caseId))).code).toBe(code);
    expect(await traces(caseId)).toEqual(before);
  });
});

describe("the wrong person", () => {
  const NOBODYS = new Map<string, () => Promise<Actor>>([
    ["an investigator of the case", asInvestigator],
    ["a technician of the case", asTechnician],
    ["an administrator", asAdministrator],
    ["the requester", asRequester],
    ["a requester of another client", asOtherRequester],
  ]);
  const mayDo: Record<string, string[]> = {
    accept: [],
    decline: [],
    assign: [],
    "ask back": ["an investigator of the case"],
    cancel: ["the requester"],
    hold: ["an investigator of the case", "a technician of the case"],
  };

  it.each(Object.entries(mayDo))("may not %s a submitted case", async (name, allowed) => {
    const [investigator, technician] = [await asInvestigator(), await asTechnician()];
    for (const [who, person] of NOBODYS) {
      if (allowed.includes(who)) continue;
      const caseId = await aCase({ state: "submitted", investigatorId: investigator.id });
      const before = await traces(caseId);
      const actor = await person();
      const found = await refusal(DEEDS[name]?.does(actor, caseId) ?? Promise.resolve());
      // Nobody is technician of a case that is not accepted, so it is not theirs to see.
      const sees = ![(await asOtherRequester()).id, technician.id].includes(actor.id);
      expect([who, found.code]).toEqual([who, sees ? "NOT_ALLOWED" : "NOT_FOUND"]);
      expect(await traces(caseId)).toEqual(before);
    }
  });
});
