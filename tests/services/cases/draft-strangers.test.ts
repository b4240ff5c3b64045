import { beforeAll, describe, expect, it } from "vitest";
import { cancelCase } from "@/lib/cases/cancel-case";
import { createDraft } from "@/lib/cases/create-draft";
import { getCase } from "@/lib/cases/get-case";
import { saveDraft } from "@/lib/cases/save-draft";
import { submitCase } from "@/lib/cases/submit-case";
import type { Actor } from "@/lib/auth/actor";
import { ERROR_SENTENCE } from "@/lib/errors";
import { readFieldReturn } from "@/lib/intake/read-field-return";
import { aDraft, sendableAnswers } from "../../helpers/field-returns";
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

let strangers: Record<string, Actor>;
beforeAll(async () => {
  strangers = {
    "another requester of the client": await aPerson("Colleague Person", "requester", {
      name: (await asRequester()).organisationName,
      kind: "client",
    }),
    "a requester of another client": await asOtherRequester(),
    "a technician": await asTechnician(),
    "an investigator": await asInvestigator(),
    "the lead engineer": await asLead(),
    "an administrator": await asAdministrator(),
  };
});

const NOBODY = "case_that_is_not_there";

describe("somebody else's draft", () => {
  it("answers everyone as if it were not there", async () => {
    const { caseId, revision } = await aDraft();
    for (const [who, actor] of Object.entries(strangers)) {
      const deeds: [string, (id: string) => Promise<unknown>][] = [
        ["save", (id) => saveDraft(actor, { caseId: id, revision, answers: sendableAnswers() })],
        ["send", (id) => submitCase(actor, { caseId: id, revision })],
        ["cancel", (id) => cancelCase(actor, { caseId: id, reason: "No longer wanted" })],
        ["open", (id) => getCase(actor, "case.view", id)],
        ["read", (id) => readFieldReturn(actor, id)],
      ];
      for (const [deed, does] of deeds) {
        const theirs = await refusal(does(caseId));
        const absent = await refusal(does(NOBODY));
        expect([who, deed, theirs.code, theirs.message]).toEqual([
          who,
          deed,
          "NOT_FOUND",
          ERROR_SENTENCE.NOT_FOUND,
        ]);
        expect([absent.code, absent.message]).toEqual([theirs.code, theirs.message]);
      }
    }
    const { row } = await getCase(await asRequester(), "case.view", caseId);
    expect(row).toMatchObject({ state: "draft", number: null, revision: 1 });
  });

  it("stays closed to them when it is cancelled before it was ever sent", async () => {
    const { caseId } = await aDraft();
    await cancelCase(await asRequester(), { caseId, reason: "Found the cause ourselves" });
    for (const [who, actor] of Object.entries(strangers)) {
      const found = await refusal(getCase(actor, "case.view", caseId));
      expect([who, found.code]).toEqual([who, "NOT_FOUND"]);
    }
    const own = await getCase(await asRequester(), "case.view", caseId);
    expect(own.row.state).toBe("cancelled");
  });
});

describe("starting a field return", () => {
  it("is not for administrators", async () => {
    const found = await refusal(createDraft(await asAdministrator(), {}));
    expect(found.code).toBe("NOT_ALLOWED");
  });

  it("is for a client's own organisation only", async () => {
    const other = await asOtherRequester();
    const given = { organisationId: other.organisationId };
    expect((await refusal(createDraft(await asRequester(), given))).code).toBe("NOT_FOUND");
  });

  it("asks people of the laboratory for the client", async () => {
    const investigator = await asInvestigator();
    const none = await refusal(createDraft(investigator, {}));
    expect(none.fields).toHaveProperty("organisationId");
    const laboratory = { organisationId: investigator.organisationId };
    expect((await refusal(createDraft(investigator, laboratory))).code).toBe("NOT_FOUND");
    const client = { organisationId: (await asRequester()).organisationId };
    const { caseId } = await createDraft(investigator, client);
    const { row } = await getCase(investigator, "case.view", caseId);
    expect(row).toMatchObject({ requesterId: investigator.id, ...client });
  });
});
