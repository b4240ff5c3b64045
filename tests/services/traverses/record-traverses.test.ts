import { and, desc, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { auditEvents, recordEdges, recordVersions, settings, traverseReadings } from "@/db/schema";
import { transaction } from "@/db/transaction";
import type { Actor } from "@/lib/auth/actor";
import { AppError } from "@/lib/errors";
import { citableValues } from "@/lib/records/citable-entries";
import { addVersion } from "@/lib/records/write-version";
import { staleVersionIds } from "@/lib/records/stale";
import { switchTable } from "@/lib/reference/switch-table";
import { hardnessResultFacts } from "@/lib/traverses/result-facts";
import { createTraverse } from "@/lib/traverses/create-traverse";
import { latestReturn, listTraverses, loadTraverse } from "@/lib/traverses/read-traverses";
import { restoreTraverse } from "@/lib/traverses/restore-traverse";
import { saveTraverse } from "@/lib/traverses/save-traverse";
import type { TraverseContent } from "@/lib/traverses/schemas";
import { withdrawTraverse } from "@/lib/traverses/withdraw-traverse";
import { aCase, setState } from "../../helpers/cases";
import {
  asAdministrator,
  asInvestigator,
  asOtherRequester,
  asRequester,
  asTechnician,
} from "../../helpers/people";
import { fieldReturnRecord } from "./field-return-record";
import { aFieldReturn, aTraverse, shaftRows } from "./sample-traverse";

const failure = async (work: Promise<unknown>): Promise<AppError> => {
  const error: unknown = await work.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (error instanceof AppError) return error;
  throw error ?? new Error("it was not refused");
};

async function versions(recordId: string) {
  return database()
    .select()
    .from(recordVersions)
    .where(eq(recordVersions.recordId, recordId))
    .orderBy(desc(recordVersions.number));
}

let technician: Actor;
beforeAll(async () => {
  technician = await asTechnician();
});

describe("recording a traverse", () => {
  it("writes the rows, the result that follows, what it rests on, and one event", async () => {
    const caseId = await aCase();
    const fieldReturn = await aFieldReturn(caseId);
    const content = aTraverse({ isRequirementFromReturn: true });
    const saved = await createTraverse(technician, { caseId, content });
    expect(saved).toMatchObject({ label: "T1", version: 1 });

    const loaded = await loadTraverse(database(), saved.traverseId);
    expect(loaded.content).toEqual(content);
    expect(loaded.result.depth).toMatchObject({ kind: "SHD", limit: 448 });
    // 1.90 + 0.40 (464.3 - 448) / (464.3 - 351.8), by hand from 1.8544 F / d2.
    expect(loaded.result.depth?.depthMm).toBeCloseTo(1.958, 2);
    expect(loaded.result.depth?.requirement?.word).toBe("fail");
    expect(loaded.resultVersionId).toBe(saved.resultVersionId);

    const rows = await database()
      .select()
      .from(traverseReadings)
      .where(eq(traverseReadings.recordId, saved.traverseId));
    expect(rows).toHaveLength(8);
    expect(rows[0]).toMatchObject({ position: 1, depthMm: 0.3, d1Um: 54.2, enteredHardness: null });

    const edges = await database()
      .select({ id: recordEdges.inputVersionId })
      .from(recordEdges)
      .where(eq(recordEdges.versionId, saved.resultVersionId));
    expect(new Set(edges.map(({ id }) => id))).toEqual(
      new Set([loaded.versionId, fieldReturn.versionId]),
    );
    const events = await database().select().from(auditEvents).where(eq(auditEvents.chain, caseId));
    expect(events).toHaveLength(1);
    expect(events[0]).toMatchObject({ action: "traverse.record", subjectLabel: "T1" });
  });

  it("gives the values that findings cite, under the label of the traverse", async () => {
    const caseId = await aCase();
    await createTraverse(technician, {
      caseId,
      content: aTraverse({ coreReadingIds: ["r7", "r8"] }),
    });
    const cited = await citableValues(database(), caseId, ["hardness_result"]);
    const byField = Object.fromEntries(cited.map((entry) => [entry.field, entry]));
    expect(byField.caseDepth).toMatchObject({ tag: "T1", label: "SHD of T1 at fillet" });
    expect(byField.caseDepth?.text).toMatch(/^1\.9\d\u00a0±\u00a00\.0\d\u00a0mm$/);
    expect(byField.coreHardness?.text).toMatch(/HV1$/);
    expect(byField.coreConverted).toMatchObject({ source: "converted" });
    expect(byField.coreConverted?.text).toMatch(
      /^≈\u00a0\d+\.\d\u00a0HRC \(ISO\u00a018265\u00a0Table\u00a0A\.1\)$/,
    );
    expect(byField.coreStrength).toMatchObject({ source: "estimated" });
  });

  it("proposes the depth and the requirement from the field return", async () => {
    const caseId = await aCase();
    await aFieldReturn(caseId);
    const found = await latestReturn(database(), caseId);
    expect(found?.proposal).toMatchObject({
      process: "induction",
      depthKind: "SHD",
      minSurfaceHv: 560,
      requiredDepthMm: { min: 2.5, max: 4 },
      requiredSurface: { scale: "HV", min: 560, max: null },
      isRequirementFromReturn: true,
    });
  });

  it("does not decide a requirement in another scale from a converted value", async () => {
    const caseId = await aCase();
    const saved = await createTraverse(technician, {
      caseId,
      content: aTraverse({ requiredSurface: { scale: "HRC", min: 55, max: null } }),
    });
    const { result } = await loadTraverse(database(), saved.traverseId);
    expect(result.surface.conversions[0]?.value).toBeGreaterThan(55);
    expect(result.surface.requirement?.word).toBe("cannot_be_decided");
  });

  it("holds the gate for indents too close, and names them", async () => {
    const caseId = await aCase();
    const readings = [
      ...shaftRows().slice(0, 5),
      { id: "r9", depth: "2.00", d1: "66.0", d2: "66.0" },
      ...shaftRows().slice(5),
    ];
    const saved = await createTraverse(technician, { caseId, content: aTraverse({ readings }) });
    const { result } = await loadTraverse(database(), saved.traverseId);
    expect(hardnessResultFacts(result).unsettled).toContain("indents 5 and 6");
    const settled = aTraverse({
      readings: readings.map((row) =>
        row.id === "r9" ? { ...row, keptReason: "set in zigzag, seen under the microscope" } : row,
      ),
    });
    await saveTraverse(technician, {
      caseId,
      traverseId: saved.traverseId,
      seenVersion: 1,
      content: settled,
    });
    const after = await loadTraverse(database(), saved.traverseId);
    expect(after.result.unsettled).toEqual([]);
  });
});

describe("saving it again", () => {
  const start = async () => {
    const caseId = await aCase();
    const saved = await createTraverse(technician, { caseId, content: aTraverse() });
    const save = (content: TraverseContent, seenVersion = 1) =>
      saveTraverse(technician, { caseId, traverseId: saved.traverseId, seenVersion, content });
    return { caseId, saved, save };
  };

  it("makes a version of traverse and result, and what cited the old one turns stale", async () => {
    const { saved, save } = await start();
    const again = await save(aTraverse({ minSurfaceHv: 600 }));
    expect(again.version).toBe(2);
    expect(again.resultVersionId).not.toBe(saved.resultVersionId);
    const stale = await staleVersionIds(database(), [saved.resultVersionId, again.resultVersionId]);
    expect([...stale]).toEqual([saved.resultVersionId]);
  });

  it("writes nothing when nothing changed", async () => {
    const { caseId, saved, save } = await start();
    const same = await save(aTraverse());
    expect(same).toEqual(saved);
    expect(await versions(saved.traverseId)).toHaveLength(1);
    const events = await database().select().from(auditEvents).where(eq(auditEvents.chain, caseId));
    expect(events).toHaveLength(1);
  });

  it("works the result out anew when only the field return changed", async () => {
    const caseId = await aCase();
    await aFieldReturn(caseId);
    const content = aTraverse({ isRequirementFromReturn: true });
    const saved = await createTraverse(technician, { caseId, content });
    const [edge] = await database()
      .select()
      .from(recordEdges)
      .where(eq(recordEdges.versionId, saved.resultVersionId));
    expect(edge).toBeDefined();
    const first = await latestReturn(database(), caseId);

    const { recordId, content: answers } = await fieldReturnRecord(caseId);
    await transaction((tx) => addVersion(tx, technician, recordId, null, { content: answers }));
    expect((await latestReturn(database(), caseId))?.versionId).not.toBe(first?.versionId);
    expect((await staleVersionIds(database(), [saved.resultVersionId])).size).toBe(1);
    const again = await saveTraverse(technician, {
      caseId,
      traverseId: saved.traverseId,
      seenVersion: 1,
      content,
    });
    expect(again.version).toBe(1);
    expect((await staleVersionIds(database(), [again.resultVersionId])).size).toBe(0);
  });

  it("of two at once one is saved and the other gets both versions", async () => {
    const { saved, save } = await start();
    const answers = await Promise.allSettled([
      save(aTraverse({ name: "mine" })),
      save(aTraverse({ name: "yours" })),
    ]);
    expect(answers.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
    const lost = answers.find((one) => one.status === "rejected");
    const error: unknown = lost?.reason;
    expect(error).toBeInstanceOf(AppError);
    if (!(error instanceof AppError)) return;
    expect(error.code).toBe("CONFLICT");
    expect(error.conflict?.theirs).toMatchObject({ readings: aTraverse().readings });
    expect(error.conflict?.yours).toMatchObject({ readings: aTraverse().readings });
    expect(await versions(saved.traverseId)).toHaveLength(2);
  });

  it("withdraws a traverse with its result and puts both back", async () => {
    const { caseId, saved, save } = await start();
    const { traverseId } = saved;
    await withdrawTraverse(technician, { caseId, traverseId, reason: "Wrong mount" });
    const withdrawn = await loadTraverse(database(), traverseId);
    expect(withdrawn).toMatchObject({ isVoid: true, voidReason: "Wrong mount" });
    expect(await citableValues(database(), caseId, ["hardness_result"])).toEqual([]);
    expect((await failure(save(aTraverse({ name: "elsewhere" })))).code).toBe("LOCKED");
    await restoreTraverse(technician, { caseId, traverseId });
    expect(await citableValues(database(), caseId, ["hardness_result"])).not.toEqual([]);
  });
});

describe("who may not", () => {
  it("refuses another role, another client, and a case that is not there", async () => {
    const caseId = await aCase();
    const content = aTraverse();
    const own = await failure(createTraverse(await asRequester(), { caseId, content }));
    expect(own.code).toBe("NOT_ALLOWED");
    const other = await asOtherRequester();
    const foreign = await failure(createTraverse(other, { caseId, content }));
    const absent = await failure(createTraverse(other, { caseId: "case_none", content }));
    expect(foreign.code).toBe(absent.code);
    expect((await failure(listTraverses(other, caseId))).code).toBe("NOT_FOUND");
    const unassigned = await aCase({ withTechnician: false });
    expect((await failure(createTraverse(technician, { caseId: unassigned, content }))).code).toBe(
      "NOT_FOUND",
    );
  });

  it("refuses a traverse of another case under this case's address", async () => {
    const [here, there] = [await aCase(), await aCase()];
    const saved = await createTraverse(technician, { caseId: there, content: aTraverse() });
    const error = await failure(
      saveTraverse(technician, {
        caseId: here,
        traverseId: saved.traverseId,
        seenVersion: 1,
        content: aTraverse({ name: "moved" }),
      }),
    );
    expect(error.code).toBe("NOT_FOUND");
  });

  it("refuses every change after signing", async () => {
    const caseId = await aCase();
    const { traverseId } = await createTraverse(technician, { caseId, content: aTraverse() });
    await setState(caseId, "signed");
    const changed = { caseId, traverseId, seenVersion: 1, content: aTraverse({ name: "late" }) };
    for (const late of [
      () => saveTraverse(technician, changed),
      () => createTraverse(technician, { caseId, content: aTraverse() }),
      () => withdrawTraverse(technician, { caseId, traverseId, reason: "late" }),
    ])
      expect((await failure(late())).code).toBe("LOCKED");
    expect(await versions(traverseId)).toHaveLength(1);
    const station = await listTraverses(await asInvestigator(), caseId);
    expect(station.refusal).toMatch(/signed/);
  });
});

describe("bad input", () => {
  it("keeps words, NaN, a negative depth and a depth that stands twice, and says so", async () => {
    const caseId = await aCase();
    const readings = [
      ...shaftRows(),
      { id: "r9", depth: "abc", d1: "54", d2: "54" },
      { id: "r10", depth: "4.0", d1: "NaN", d2: "78" },
      { id: "r11", depth: "-0.2", d1: "54", d2: "54" },
      { id: "r12", depth: "3.50", d1: "79", d2: "79" },
    ];
    const saved = await createTraverse(technician, { caseId, content: aTraverse({ readings }) });
    const { content, result } = await loadTraverse(database(), saved.traverseId);
    expect(content.readings).toEqual(readings);
    const texts = result.items.filter(({ level }) => level === "must").map(({ text }) => text);
    expect(texts).toEqual(
      expect.arrayContaining([
        "Indent 9: “abc” is not a number.",
        "Indent 10: “NaN” is not a number.",
        "Indent 11: A depth below zero lies outside the piece.",
        expect.stringContaining("Indent 8 has depth 3.5\u00a0mm too"),
      ]),
    );
    const rows = await database()
      .select()
      .from(traverseReadings)
      .where(
        and(eq(traverseReadings.recordId, saved.traverseId), eq(traverseReadings.position, 11)),
      );
    expect(rows).toEqual([]);
  });

  it("takes 10 000 rows, and refuses one more without taking any", async () => {
    const caseId = await aCase();
    const readings = Array.from({ length: 10_000 }, (_, index) => ({
      id: `r${index + 1}`,
      depth: ((index + 1) * 0.3).toFixed(1),
      hardness: String(700 - Math.floor(index / 25)),
    }));
    const saved = await createTraverse(technician, { caseId, content: aTraverse({ readings }) });
    const rows = await database()
      .select({ position: traverseReadings.position })
      .from(traverseReadings)
      .where(
        eq(
          traverseReadings.versionId,
          (await loadTraverse(database(), saved.traverseId)).versionId,
        ),
      );
    expect(rows).toHaveLength(10_000);
    const one = { id: "more", depth: "1", hardness: "300" };
    const error = await failure(
      createTraverse(technician, { caseId, content: aTraverse({ readings: [...readings, one] }) }),
    );
    expect(error.code).toBe("INVALID");
    expect(error.fields?.["content.readings"]).toMatch(/10000 rows/);
  });

  it("gives no value outside the table, with the table's range", async () => {
    const caseId = await aCase();
    const readings = [{ id: "r1", depth: "0.5", hardness: "653" }];
    const saved = await createTraverse(technician, { caseId, content: aTraverse({ readings }) });
    const { result } = await loadTraverse(database(), saved.traverseId);
    const strength = result.readings[0]?.conversions.find(({ to }) => to === "Rm_MPa");
    expect(strength?.value).toBeNull();
    expect(strength?.remarks[0]).toContain("from 80 to 650");
  });

  it("refuses a table that is switched off or of another material", async () => {
    const caseId = await aCase();
    const nickel = aTraverse({
      materialGroup: "nickel-high-nickel",
      tableId: "nickel-e140-table3",
    });
    const off = await failure(createTraverse(technician, { caseId, content: nickel }));
    expect(off.fields?.["content.tableId"]).toMatch(/switched off/);
    const brass = aTraverse({ materialGroup: "cartridge-brass" });
    const other = await failure(createTraverse(technician, { caseId, content: brass }));
    expect(other.fields?.["content.tableId"]).toMatch(/does not hold/);
  });
});

describe("switching a table", () => {
  it("is the administrator's, is recorded, and holds at once", async () => {
    const input = { tableId: "nickel-e140-table3" as const, isOn: true };
    expect((await failure(switchTable(technician, input))).code).toBe("NOT_ALLOWED");
    await switchTable(await asAdministrator(), input);
    const caseId = await aCase();
    const content = aTraverse({ materialGroup: "nickel-high-nickel", tableId: input.tableId });
    const saved = await createTraverse(technician, { caseId, content });
    const { result } = await loadTraverse(database(), saved.traverseId);
    expect(result.tableTitles).toEqual(["ASTM E140 Table 3"]);
    await switchTable(await asAdministrator(), { ...input, isOn: false });
    // A traverse that already names it can still be saved; it converts nothing more.
    await saveTraverse(technician, {
      caseId,
      traverseId: saved.traverseId,
      seenVersion: 1,
      content: { ...content, name: "again" },
    });
    const after = await loadTraverse(database(), saved.traverseId);
    expect(after.result.readings[0]?.conversions[0]).toMatchObject({ value: null });
    expect(after.result.readings[0]?.conversions[0]?.remarks[0]).toMatch(/switched off/);
    const [stored] = await database()
      .select()
      .from(settings)
      .where(eq(settings.name, "hardness.tables"));
    expect(stored?.value).not.toContain(input.tableId);
  });
});
