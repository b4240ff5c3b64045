import { beforeEach, describe, expect, it, vi } from "vitest";
import { PUT } from "@/app/api/cases/[caseId]/findings/route";
import type { Actor } from "@/lib/auth/actor";
import { database } from "@/db/client";
import { findIssue } from "@/lib/findings/find-issue";
import { aCase, setState } from "../../helpers/cases";
import { openIssue } from "../../helpers/findings";
import { findingsWith, words } from "../../helpers/findings-text";
import { asInvestigator, asOtherRequester, asRequester } from "../../helpers/people";

let actor: Actor | null = null;
vi.mock("@/lib/auth/session", () => ({ currentActor: () => Promise.resolve(actor) }));

let caseId = "";
beforeEach(async () => {
  actor = await asInvestigator();
  caseId = await aCase();
  await openIssue(caseId);
});

const put = (body: string, into = caseId) =>
  PUT(
    new Request(`http://portal.test/api/cases/${into}/findings`, {
      method: "PUT",
      headers: {
        host: "portal.test",
        origin: "http://portal.test",
        "content-type": "application/json",
      },
      body,
    }),
    { params: Promise.resolve({ caseId: into }) },
  );
const draft = (document: unknown = findingsWith(words("It broke.")), more = {}) =>
  JSON.stringify({ revision: 1, document, rootCause: "", ...more });
const revision = async () => (await findIssue(database(), caseId))?.revision;
const failed = async (answer: Response) => {
  const { error } = await answer.json();
  return { status: answer.status, code: error.code };
};

describe("saving the draft", () => {
  it("answers the next revision", async () => {
    const answer = await put(draft());
    expect(answer.status).toBe(200);
    expect(await answer.json()).toMatchObject({ revision: 2, cited: [] });
  });

  it("takes the case from the address, not from the text", async () => {
    const other = await aCase();
    await openIssue(other);
    expect((await put(draft(undefined, { caseId: other }))).status).toBe(200);
    expect(await revision()).toBe(2);
    expect((await findIssue(database(), other))?.revision).toBe(1);
  });

  it.each([
    [
      "5 MB of text",
      () => draft(findingsWith(words("x".repeat(5 * 1024 * 1024)))),
      413,
      "TOO_LARGE",
    ],
    ["no JSON", () => "{", 400, "INVALID"],
    ["a list", () => "[]", 400, "INVALID"],
    ["nothing", () => "", 400, "INVALID"],
    ["brackets without end", () => "[".repeat(500_000), 400, "INVALID"],
    [
      "quotes without end",
      () =>
        `{"revision":1,"rootCause":"","document":${'{"type":"blockquote","content":['.repeat(20_000)}${"]}".repeat(20_000)}}`,
      400,
      "INVALID",
    ],
    ["a revision in words", () => draft(undefined, { revision: "one" }), 400, "INVALID"],
    ["a revision that nobody saw", () => draft(undefined, { revision: 7 }), 409, "CONFLICT"],
    ["a script", () => draft(findingsWith({ type: "script" })), 400, "INVALID"],
  ])("refuses %s and keeps what was there", async (_name, body, status, code) => {
    expect(await failed(await put(body()))).toEqual({ status, code });
    expect(await revision()).toBe(1);
  });

  it("refuses without a session, for the requester, for another client, and after signing", async () => {
    actor = null;
    expect(await failed(await put(draft()))).toEqual({ status: 401, code: "NOT_SIGNED_IN" });
    actor = await asRequester();
    expect(await failed(await put(draft()))).toEqual({ status: 403, code: "NOT_ALLOWED" });
    actor = await asOtherRequester();
    const foreign = await failed(await put(draft()));
    expect(foreign).toEqual({ status: 403, code: "NOT_ALLOWED" });
    // A case that is not there gets the same answer, so nobody learns which exist.
    expect(await failed(await put(draft(), "case_none"))).toEqual(foreign);
    actor = await asInvestigator();
    await setState(caseId, "signed");
    expect(await failed(await put(draft()))).toEqual({ status: 423, code: "LOCKED" });
    expect(await revision()).toBe(1);
  });
});
