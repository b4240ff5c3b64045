import { beforeAll, beforeEach, describe, expect, it, vi } from "vitest";
import { GET as getDraft } from "@/app/api/cases/[caseId]/draft.pdf/route";
import { GET as getReport } from "@/app/api/cases/[caseId]/report/[file]/route";
import type { Actor } from "@/lib/auth/actor";
import { sha256Hex } from "@/lib/canonical-json";
import { signReport } from "@/lib/reports/sign-report";
import { storeReportJob } from "@/lib/reports/store-report-job";
import {
  asAdministrator,
  asInvestigator,
  asOtherRequester,
  asRequester,
} from "../../helpers/people";
import { aSignableCase, leadSignedIn, signature, theIssue } from "../../helpers/signable-case";

let actor: Actor | null = null;
vi.mock("@/lib/auth/session", () => ({ currentActor: () => Promise.resolve(actor) }));

const request = (path: string) =>
  new Request(`http://portal.test${path}`, { headers: { host: "portal.test" } });
const report = (caseId: string, file = "1.pdf", query = "") =>
  getReport(request(`/api/cases/${caseId}/report/${file}${query}`), {
    params: Promise.resolve({ caseId, file }),
  });
const draft = (caseId: string) =>
  getDraft(request(`/api/cases/${caseId}/draft.pdf`), { params: Promise.resolve({ caseId }) });

let waiting = "";
let signed = "";
let released = "";
beforeAll(async () => {
  const { lead, signInId } = await leadSignedIn();
  waiting = await aSignableCase();
  signed = await aSignableCase();
  released = await aSignableCase();
  for (const caseId of [signed, released])
    await signReport(lead, signInId, await signature(caseId));
  await storeReportJob.run({ issueId: (await theIssue(released)).id });
});
beforeEach(async () => {
  actor = await asRequester();
});

describe("the PDF of a report", () => {
  it("comes whole, with its digest as tag and the case in its name", async () => {
    const answer = await report(released);
    expect(answer.status).toBe(200);
    expect(answer.headers.get("content-type")).toBe("application/pdf");
    expect(answer.headers.get("content-disposition")).toMatch(
      /^attachment; filename="RL-2026-\d+ issue 1\.pdf"/,
    );
    const bytes = Buffer.from(await answer.arrayBuffer());
    expect(answer.headers.get("content-length")).toBe(String(bytes.byteLength));
    expect(answer.headers.get("etag")).toBe(`"${sha256Hex(bytes)}"`);
    expect((await report(released, "1.pdf", "?view")).headers.get("content-disposition")).toMatch(
      /^inline/,
    );
  });

  it("is not there before the release, for anybody", async () => {
    for (const person of [await asRequester(), await asInvestigator()]) {
      actor = person;
      for (const caseId of [waiting, signed]) expect((await report(caseId)).status).not.toBe(200);
    }
  });

  it.each(["2.pdf", "0.pdf", "01.pdf", "1", "-1.pdf", "1.pdf.exe", "../1.pdf"])(
    "is not there under %s",
    async (file) => {
      expect((await report(released, file)).status).toBe(404);
    },
  );

  it("looks the same to another client as a case that does not exist", async () => {
    actor = await asOtherRequester();
    const [theirs, none] = await Promise.all([report(released), report("case_none")]);
    expect(theirs.status).toBe(404);
    const said = async (answer: Response) => (await answer.json()).error.message;
    expect(await said(theirs)).toBe(await said(none));
  });

  it("is refused without a sign-in and to the administrator", async () => {
    actor = null;
    expect((await report(released)).status).toBe(401);
    actor = await asAdministrator();
    expect((await report(released)).status).toBe(403);
  });
});

describe("the draft", () => {
  it("is printed for the laboratory and never for the client", async () => {
    expect((await draft(waiting)).status).toBe(403);
    actor = await asInvestigator();
    const answer = await draft(waiting);
    expect(answer.status).toBe(200);
    expect(answer.headers.get("content-disposition")).toContain("draft");
    expect(
      Buffer.from(await answer.arrayBuffer())
        .subarray(0, 5)
        .toString(),
    ).toBe("%PDF-");
  });
});
