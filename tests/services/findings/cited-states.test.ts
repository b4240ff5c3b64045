import { describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { transaction } from "@/db/transaction";
import { citableValues } from "@/lib/findings/citable-values";
import { citedStates } from "@/lib/findings/cited-states";
import { CITED_VALUE, type DocumentNode } from "@/lib/findings/document";
import { readFindings } from "@/lib/findings/read-findings";
import { saveFindings } from "@/lib/findings/save-findings";
import { setVoid } from "@/lib/records/void-record";
import { addVersion, createRecord } from "@/lib/records/write-version";
import { createTraverse } from "@/lib/traverses/create-traverse";
import { newTraverse } from "@/lib/traverses/new-traverse";
import { saveTraverse } from "@/lib/traverses/save-traverse";
import type { TraverseContent } from "@/lib/traverses/schemas";
import { withdrawTraverse } from "@/lib/traverses/withdraw-traverse";
import { aCase, setState } from "../../helpers/cases";
import { aQuotedRecord, depthQuotes, openIssue } from "../../helpers/findings";
import { cite, findingsWith, words } from "../../helpers/findings-text";
import { asInvestigator, asTechnician } from "../../helpers/people";

/** Depth mm and hardness HV1 of a hardened layer; invented. */
const LAYER = [
  ["0.3", "632"],
  ["0.9", "610"],
  ["1.5", "570"],
  ["1.9", "463"],
  ["2.3", "351"],
  ["2.9", "310"],
  ["3.5", "300"],
];
const traverse = (surface: string): TraverseContent => ({
  ...newTraverse(),
  name: "at fillet",
  process: "induction",
  depthKind: "SHD",
  minSurfaceHv: 560,
  readings: LAYER.map(([depth = "", hardness = ""], i) => ({
    id: `r${i}`,
    depth,
    hardness: i === 3 ? surface : hardness,
  })),
});

const oneState = async (document: DocumentNode) => {
  const [state] = await citedStates(database(), document);
  return state;
};
const citing = (value: Parameters<typeof cite>[0]) => findingsWith(words("SHD is ", cite(value)));
const withReason = (document: DocumentNode, keptReason: string): DocumentNode =>
  document.type === CITED_VALUE
    ? { ...document, attrs: { ...document.attrs, keptReason } }
    : {
        ...document,
        ...(document.content && {
          content: document.content.map((node) => withReason(node, keptReason)),
        }),
      };

describe("a cited depth of a traverse", () => {
  it("is current, turns stale with old and new when a reading changes, can be kept, and is withdrawn with its source", async () => {
    const caseId = await aCase();
    await openIssue(caseId);
    const technician = await asTechnician();
    const made = await createTraverse(technician, { caseId, content: traverse("463") });
    const depth = (await citableValues(database(), caseId)).find(
      (value) => value.field === "caseDepth",
    );
    if (!depth) throw new Error("the traverse quotes no depth");
    expect(depth).toMatchObject({ group: "Hardness", tag: "T1", source: "measured" });

    const investigator = await asInvestigator();
    const saved = await saveFindings(investigator, {
      caseId,
      revision: 1,
      document: citing(depth),
      rootCause: "",
    });
    expect(saved.cited).toMatchObject([{ state: "current", now: { versionId: depth.versionId } }]);

    await saveTraverse(technician, {
      caseId,
      traverseId: made.traverseId,
      seenVersion: made.version,
      content: traverse("430"),
    });
    const stale = await oneState(saved.document);
    expect(stale).toMatchObject({
      state: "stale",
      versionId: depth.versionId,
      now: { by: technician.name },
    });
    expect(stale?.now?.text).not.toBe(depth.text);
    expect(stale?.now?.versionId).not.toBe(depth.versionId);
    expect((await readFindings(investigator, caseId)).cited).toMatchObject([{ state: "stale" }]);

    const kept = withReason(saved.document, "Read before the last polish.");
    expect((await oneState(kept))?.state).toBe("kept");

    const taken = citing({ ...depth, ...stale?.now });
    expect((await oneState(taken))?.state).toBe("current");

    await withdrawTraverse(technician, {
      caseId,
      traverseId: made.traverseId,
      reason: "Wrong mount",
    });
    expect((await oneState(saved.document))?.state).toBe("withdrawn");
    expect((await oneState(kept))?.state).toBe("withdrawn");
    expect(
      (await citableValues(database(), caseId)).filter((value) => value.group === "Hardness"),
    ).toEqual([]);
  });
});

describe("a cited value", () => {
  it("tells why and by whom its source changed", async () => {
    const caseId = await aCase();
    const technician = await asTechnician();
    const made = await aQuotedRecord(caseId, "1.94 mm");
    await transaction((tx) =>
      addVersion(tx, technician, made.recordId, 1, {
        content: {},
        quotes: depthQuotes("1.95 mm"),
        reason: "Indent 10 read again",
      }),
    );
    const state = await oneState(
      citing({ ...made, field: "caseDepth", text: "1.94 mm", tag: "T1" }),
    );
    expect(state).toMatchObject({
      state: "stale",
      now: { text: "1.95 mm", reason: "Indent 10 read again", by: technician.name },
    });
  });

  it("is stale when only what its source rests on has changed", async () => {
    const caseId = await aCase();
    const technician = await asTechnician();
    const base = await aQuotedRecord(caseId);
    const resting = await transaction((tx) =>
      createRecord(
        tx,
        technician,
        { caseId, kind: "hardness_result", label: "T2" },
        { content: {}, quotes: depthQuotes("2 mm"), inputs: [base.versionId] },
      ),
    );
    const document = citing({ ...resting, field: "caseDepth", text: "2 mm", tag: "T2" });
    expect((await oneState(document))?.state).toBe("current");
    await transaction((tx) =>
      addVersion(tx, technician, base.recordId, 1, { content: { again: true } }),
    );
    expect(await oneState(document)).toMatchObject({
      state: "stale",
      now: { versionId: resting.versionId },
    });
  });

  it("is withdrawn when its source no longer says anything of it", async () => {
    const caseId = await aCase();
    const technician = await asTechnician();
    const made = await aQuotedRecord(caseId);
    await transaction((tx) => addVersion(tx, technician, made.recordId, 1, { content: {} }));
    expect(
      await oneState(citing({ ...made, field: "caseDepth", text: "1 mm", tag: "T1" })),
    ).toMatchObject({ state: "withdrawn", now: null });
  });
});

describe("values that can be cited", () => {
  it("are the newest of this case alone, a mark under the name of its picture", async () => {
    const caseId = await aCase();
    const technician = await asTechnician();
    await aQuotedRecord(await aCase(), "9 mm");
    const old = await aQuotedRecord(caseId, "1 mm");
    await transaction((tx) =>
      addVersion(tx, technician, old.recordId, 1, { content: {}, quotes: depthQuotes("2 mm") }),
    );
    const picture = await transaction((tx) =>
      createRecord(tx, technician, { caseId, kind: "image", label: "IM-03" }, { content: {} }),
    );
    const gone = await aQuotedRecord(caseId, "3 mm");
    await transaction((tx) => setVoid(tx, gone.recordId, { isVoid: true, reason: "Wrong mount" }));
    await transaction((tx) =>
      createRecord(
        tx,
        technician,
        { caseId, kind: "mark", label: "A1", scopeId: picture.recordId },
        { content: {}, quotes: depthQuotes("4 mm") },
      ),
    );
    const values = await citableValues(database(), caseId);
    expect(values.map(({ group, tag, text }) => [group, tag, text])).toEqual([
      ["Hardness", "T1", "2 mm"],
      ["Images", "A1 · IM-03", "4 mm"],
    ]);
  });
});

describe("the findings page", () => {
  it("says why it cannot be written, and by whom", async () => {
    const caseId = await aCase();
    await openIssue(caseId);
    expect((await readFindings(await asInvestigator(), caseId)).refusal).toBeNull();
    expect((await readFindings(await asTechnician(), caseId)).refusal).toMatch(
      /write the findings/,
    );
    await setState(caseId, "released");
    expect((await readFindings(await asInvestigator(), caseId)).refusal).toBeTruthy();
  });
});
