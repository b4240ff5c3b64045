import { and, asc, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { auditEvents, reportIssues, reportRevisions } from "@/db/schema";
import { transaction } from "@/db/transaction";
import type { Actor } from "@/lib/auth/actor";
import { AppError } from "@/lib/errors";
import { createFirstIssue } from "@/lib/findings/create-issue";
import { citedValuesOf } from "@/lib/findings/document";
import { findIssue } from "@/lib/findings/find-issue";
import { saveFindings } from "@/lib/findings/save-findings";
import { startingDocument } from "@/lib/findings/starting-document";
import { aCase, setState } from "../../helpers/cases";
import { aQuotedRecord, openIssue } from "../../helpers/findings";
import { cite, findingsWith, words } from "../../helpers/findings-text";
import {
  asAdministrator,
  asInvestigator,
  asLead,
  asOtherRequester,
  asRequester,
  asTechnician,
} from "../../helpers/people";

const failure = async (work: Promise<unknown>): Promise<AppError> => {
  const error: unknown = await work.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (error instanceof AppError) return error;
  throw error ?? new Error("it was not refused");
};

const stored = async (caseId: string) => {
  const issue = await findIssue(database(), caseId);
  if (!issue) throw new Error("no issue");
  return issue;
};
const events = (caseId: string) =>
  database()
    .select()
    .from(auditEvents)
    .where(and(eq(auditEvents.chain, caseId), eq(auditEvents.action, "findings.write")))
    .orderBy(asc(auditEvents.position));

let writer: Actor;
beforeAll(async () => {
  writer = await asInvestigator();
});

describe("opening the findings", () => {
  it("gives an accepted case one issue with every section, once", async () => {
    const caseId = await aCase();
    const issue = await openIssue(caseId);
    expect(issue).toMatchObject({ number: 1, revision: 1, state: "drafting", rootCause: null });
    expect(issue.document).toEqual(startingDocument());
    const lead = await asLead();
    await transaction((tx) => createFirstIssue(tx, lead, caseId));
    const issues = await database()
      .select()
      .from(reportIssues)
      .where(eq(reportIssues.caseId, caseId));
    expect(issues).toHaveLength(1);
  });
});

describe("saving the findings", () => {
  it("stores text and root cause as the next revision, keeps the revision, and records one event", async () => {
    const caseId = await aCase();
    const issue = await openIssue(caseId);
    const document = findingsWith(words("The shaft broke by bending fatigue."));
    const saved = await saveFindings(writer, {
      caseId,
      revision: 1,
      document,
      rootCause: "  Bending fatigue. ",
    });
    expect(saved).toMatchObject({ revision: 2, document, cited: [] });
    expect(await stored(caseId)).toMatchObject({
      revision: 2,
      document,
      rootCause: "Bending fatigue.",
      savedById: writer.id,
    });
    const kept = await database()
      .select()
      .from(reportRevisions)
      .where(eq(reportRevisions.issueId, issue.id));
    expect(kept.map(({ revision, document: text }) => ({ revision, text }))).toEqual([
      { revision: 2, text: document },
    ]);
    const [event, ...others] = await events(caseId);
    expect(others).toEqual([]);
    expect(event).toMatchObject({
      actorId: writer.id,
      subjectId: issue.id,
      before: { revision: 1, rootCause: null },
      after: { revision: 2, rootCause: "Bending fatigue." },
    });
  });

  it("prints a cited value from its source, whatever the browser says it is", async () => {
    const caseId = await aCase();
    await openIssue(caseId);
    const { recordId, versionId } = await aQuotedRecord(caseId, "1.94 ± 0.05 mm");
    const forged = cite({ recordId, versionId, field: "caseDepth", text: "9.99 mm", tag: "T9" });
    const saved = await saveFindings(writer, {
      caseId,
      revision: 1,
      document: findingsWith(words("Hardened to ", forged)),
      rootCause: "",
    });
    expect(citedValuesOf(saved.document)).toMatchObject([
      { recordId, versionId, text: "1.94 ± 0.05 mm" },
    ]);
    expect(JSON.stringify((await stored(caseId)).document)).not.toMatch(/9\.99|T9/);
    expect(saved.cited).toMatchObject([{ recordId, state: "current" }]);
  });

  it.each([
    ["a value of another case", "other case"],
    ["a field that the source does not have", "other field"],
    ["a version of another record", "other record"],
  ])("refuses %s and stores nothing", async (_name, kind) => {
    const caseId = await aCase();
    await openIssue(caseId);
    const own = await aQuotedRecord(caseId);
    const foreign = await aQuotedRecord(kind === "other case" ? await aCase() : caseId);
    const node = cite({
      recordId: kind === "other record" ? own.recordId : foreign.recordId,
      versionId: foreign.versionId,
      field: kind === "other field" ? "constructor" : "caseDepth",
      text: "1 mm",
      tag: "T1",
    });
    const refused = await failure(
      saveFindings(writer, {
        caseId,
        revision: 1,
        document: findingsWith(words(node)),
        rootCause: "",
      }),
    );
    expect(refused.code).toBe("INVALID");
    expect(refused.message).toMatch(/not from this case.*kept here/);
    expect(await stored(caseId)).toMatchObject({ revision: 1, document: startingDocument() });
    expect(await events(caseId)).toEqual([]);
  });

  it.each([
    ["figure", "imageId"],
    ["chartFigure", "traverseId"],
  ])("refuses a %s of another case", async (type, name) => {
    const caseId = await aCase();
    await openIssue(caseId);
    const foreign = await aQuotedRecord(await aCase());
    const document = findingsWith({ type, attrs: { [name]: foreign.recordId, caption: "" } });
    const refused = await failure(
      saveFindings(writer, { caseId, revision: 1, document, rootCause: "" }),
    );
    expect(refused.code).toBe("INVALID");
    expect(refused.message).toMatch(/figure is not from this case/);
    expect((await stored(caseId)).revision).toBe(1);
  });

  it("refuses a part that findings do not hold, and a root cause of a page", async () => {
    const caseId = await aCase();
    await openIssue(caseId);
    const script = findingsWith({ type: "script" });
    const input = { caseId, revision: 1, rootCause: "" };
    expect(await failure(saveFindings(writer, { ...input, document: script }))).toMatchObject({
      fields: { document: expect.stringContaining("script") },
    });
    const long = { ...input, document: findingsWith(words("x")), rootCause: "x".repeat(501) };
    expect(await failure(saveFindings(writer, long))).toMatchObject({
      fields: { rootCause: expect.stringContaining("500") },
    });
    expect((await stored(caseId)).revision).toBe(1);
  });

  it("answers the second of two with both texts, and loses neither", async () => {
    const caseId = await aCase();
    await openIssue(caseId);
    const [mine, theirs] = [findingsWith(words("Mine.")), findingsWith(words("Theirs."))];
    const lead = await asLead();
    await saveFindings(lead, { caseId, revision: 1, document: theirs, rootCause: "Theirs" });
    const refused = await failure(
      saveFindings(writer, { caseId, revision: 1, document: mine, rootCause: "Mine" }),
    );
    expect(refused.code).toBe("CONFLICT");
    expect(refused).toMatchObject({
      conflict: {
        yours: { document: mine, rootCause: "Mine" },
        theirs: { document: theirs, rootCause: "Theirs", revision: 2 },
        changedBy: lead.name,
      },
    });
    await saveFindings(writer, { caseId, revision: 2, document: mine, rootCause: "Mine" });
    const issue = await stored(caseId);
    const kept = await database()
      .select({ document: reportRevisions.document })
      .from(reportRevisions)
      .where(eq(reportRevisions.issueId, issue.id))
      .orderBy(asc(reportRevisions.revision));
    expect(kept.map(({ document }) => document)).toEqual([theirs, mine]);
  });

  it("lets one of two win that save at the same moment", async () => {
    const caseId = await aCase();
    await openIssue(caseId);
    const lead = await asLead();
    const save = (actor: Actor, text: string) =>
      saveFindings(actor, {
        caseId,
        revision: 1,
        document: findingsWith(words(text)),
        rootCause: "",
      });
    const results = await Promise.allSettled([save(writer, "Mine."), save(lead, "Theirs.")]);
    expect(results.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    const lost = results.find((result) => result.status === "rejected");
    expect(lost?.reason).toMatchObject({ code: "CONFLICT" });
    expect((await stored(caseId)).revision).toBe(2);
    expect(await events(caseId)).toHaveLength(1);
  });
});

describe("who may write", () => {
  const input = (caseId: string) => ({
    caseId,
    revision: 1,
    document: findingsWith(words("x")),
    rootCause: "",
  });

  it.each([
    ["a technician", asTechnician, "NOT_ALLOWED"],
    ["an administrator", asAdministrator, "NOT_ALLOWED"],
    ["the requester", asRequester, "NOT_ALLOWED"],
    ["another client", asOtherRequester, "NOT_FOUND"],
  ])("not %s", async (_name, as, code) => {
    const caseId = await aCase();
    await openIssue(caseId);
    expect((await failure(saveFindings(await as(), input(caseId)))).code).toBe(code);
    expect((await stored(caseId)).revision).toBe(1);
  });

  it.each(["in_approval", "signed", "released", "closed"] as const)(
    "nobody while the case is %s",
    async (state) => {
      const caseId = await aCase();
      await openIssue(caseId);
      await setState(caseId, state);
      expect((await failure(saveFindings(writer, input(caseId)))).code).toBe("LOCKED");
      expect((await stored(caseId)).revision).toBe(1);
    },
  );

  it("nobody in an issue that is signed, whatever the case says", async () => {
    const caseId = await aCase();
    const issue = await openIssue(caseId);
    await database()
      .update(reportIssues)
      .set({ signedAt: new Date() })
      .where(eq(reportIssues.id, issue.id));
    expect((await failure(saveFindings(writer, input(caseId)))).code).toBe("LOCKED");
  });

  it("nobody in a case that is not there", async () => {
    expect((await failure(saveFindings(writer, input("case_none")))).code).toBe("NOT_FOUND");
  });
});
