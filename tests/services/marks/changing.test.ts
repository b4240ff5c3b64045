import { beforeEach, describe, expect, it } from "vitest";
import { canonicalJson } from "@/lib/canonical-json";
import type { Actor } from "@/lib/auth/actor";
import { changeMark } from "@/lib/images/change-mark";
import { deleteMark } from "@/lib/images/delete-mark";
import { placeMark } from "@/lib/images/place-mark";
import { restoreMark } from "@/lib/images/restore-mark";
import { withdrawImage } from "@/lib/images/withdraw-image";
import { AppError } from "@/lib/errors";
import { asInvestigator, asTechnician } from "../../helpers/people";
import { refusal } from "../../helpers/refusal";
import { aPicture, eventsOf, LENGTH, marksOf, theMark, versionsOf } from "./a-picture";

const lengthTo = (x: number) => ({
  tool: "length" as const,
  points: [
    [100, 100],
    [x, 100],
  ],
});

let technician: Actor;
let investigator: Actor;
let caseId: string;
let imageId: string;
let markId: string;
beforeEach(async () => {
  [technician, investigator] = [await asTechnician(), await asInvestigator()];
  ({ caseId, imageId } = await aPicture());
  ({ recordId: markId } = await placeMark(technician, {
    imageId,
    geometry: LENGTH,
    name: "Crack",
  }));
});
const change = (actor: Actor, seenVersion: number, x: number, more: object = {}) =>
  changeMark(actor, { markId, seenVersion, geometry: lengthTo(x), name: "Crack", ...more });

describe("changing a mark", () => {
  it("adds a version and leaves the one before as it was", async () => {
    const [before] = await versionsOf(markId);
    expect(await change(investigator, 1, 900)).toMatchObject({ label: "D1", number: 2 });
    const versions = await versionsOf(markId);
    expect(versions).toHaveLength(2);
    expect(versions[0]).toEqual(before);
    expect(versions[1]).toMatchObject({
      madeById: investigator.id,
      content: { geometry: lengthTo(900) },
    });
    expect((await eventsOf(caseId)).at(-1)).toMatchObject({
      action: "image.mark",
      actorId: investigator.id,
      before: { version: 1, geometry: LENGTH },
      after: { version: 2, geometry: lengthTo(900) },
    });
  });

  it("answers a stale version with both, who and when, and writes nothing", async () => {
    await change(investigator, 1, 900, { note: "To the edge." });
    const [versions, events] = [await versionsOf(markId), await eventsOf(caseId)];
    const error = await refusal(change(technician, 1, 800));
    expect(error).toMatchObject({
      code: "CONFLICT",
      conflict: {
        yours: { tool: "length", geometry: lengthTo(800), name: "Crack" },
        theirs: { tool: "length", geometry: lengthTo(900), note: "To the edge." },
        changedBy: investigator.name,
        changedAt: versions[1]?.madeAt.toISOString(),
      },
    });
    expect(error.message).toMatch(/^D1 was not saved\. Investigator Person changed it/);
    expect(await versionsOf(markId)).toEqual(versions);
    expect(await eventsOf(caseId)).toEqual(events);
  });

  it("keeps mine over theirs with the newest number, and theirs in the history", async () => {
    await change(investigator, 1, 900);
    await refusal(change(technician, 1, 800));
    await change(technician, 2, 800);
    const shapes = (await versionsOf(markId)).map(
      ({ content }) => (content as { geometry: unknown }).geometry,
    );
    expect(shapes).toEqual([LENGTH, lengthTo(900), lengthTo(800)]);
  });

  it("by two at once: exactly one wins, the other is told", async () => {
    for (let round = 0; round < 4; round += 1) {
      const seen = (await theMark(technician, imageId, "D1")).number;
      const ends = await Promise.allSettled([
        change(technician, seen, 700 + round),
        change(investigator, seen, 800 + round),
      ]);
      const lost = ends.flatMap((end) => (end.status === "rejected" ? [end.reason] : []));
      expect(lost).toHaveLength(1);
      expect(lost[0]).toBeInstanceOf(AppError);
      expect(lost[0]).toMatchObject({ code: "CONFLICT" });
      const { number, content, by } = await theMark(technician, imageId, "D1");
      expect(number).toBe(seen + 1);
      const won = ends[0].status === "fulfilled" ? technician : investigator;
      expect(by).toBe(won.name);
      expect(content.geometry).toEqual(lengthTo((won === technician ? 700 : 800) + round));
      expect((lost[0] as AppError).conflict?.theirs).toMatchObject({ geometry: content.geometry });
    }
  });

  it.each([0, -1, 1.5, 99, null])("with a version seen as %s is refused", async (seenVersion) => {
    const error = await refusal(
      changeMark(technician, { markId, seenVersion, geometry: lengthTo(5) }),
    );
    expect(["INVALID", "CONFLICT"]).toContain(error.code);
    expect((await theMark(technician, imageId, "D1")).number).toBe(1);
  });

  it("never turns it into another kind, and takes no shape off the picture", async () => {
    const other = { markId, seenVersion: 1, geometry: { tool: "note", point: [5, 5] } };
    expect((await refusal(changeMark(technician, other))).message).toMatch(
      /^D1 cannot turn into another kind of mark/,
    );
    expect(await refusal(change(technician, 1, 9999))).toMatchObject({ code: "INVALID" });
    expect(await versionsOf(markId)).toHaveLength(1);
  });

  it("names no origin that is not there", async () => {
    const error = await refusal(change(technician, 1, 500, { originId: "rec_none" }));
    expect(error).toMatchObject({ code: "INVALID" });
  });
});

describe("deleting and restoring", () => {
  it("takes it off, keeps it, and gives its label to no other", async () => {
    await deleteMark(technician, { markId, seenVersion: 1, reason: "Drawn twice." });
    const { marks, deleted } = await marksOf(technician, imageId);
    expect([marks.length, deleted.map(({ label }) => label)]).toEqual([0, ["D1"]]);
    const next = await placeMark(technician, { imageId, geometry: LENGTH });
    expect(next.label).toBe("D2");
    expect(await versionsOf(markId)).toHaveLength(1);
    expect(
      (await eventsOf(caseId)).filter(({ action }) => action === "image.mark")[1],
    ).toMatchObject({
      subjectLabel: "IM-01 D1",
      after: { state: "void", reason: "Drawn twice." },
    });
  });

  it("is undone as a whole by restoring", async () => {
    const before = await theMark(technician, imageId, "D1");
    await deleteMark(technician, { markId, seenVersion: 1 });
    expect(await restoreMark(investigator, { markId })).toEqual({ label: "D1" });
    expect(canonicalJson(await theMark(technician, imageId, "D1"))).toBe(canonicalJson(before));
    expect((await marksOf(technician, imageId)).deleted).toEqual([]);
  });

  it("is told to the one who deletes what another changed", async () => {
    await change(investigator, 1, 900);
    const error = await refusal(deleteMark(technician, { markId, seenVersion: 1 }));
    expect(error).toMatchObject({
      code: "CONFLICT",
      conflict: { theirs: { geometry: lengthTo(900) }, changedBy: investigator.name },
    });
    expect((await marksOf(technician, imageId)).labels).toEqual(["D1"]);
  });

  it("happens once when two do it at once", async () => {
    const verbs = [deleteMark, restoreMark] as const;
    for (const verb of verbs) {
      const ends = await Promise.allSettled([
        verb(technician, { markId, seenVersion: 1 }),
        verb(investigator, { markId, seenVersion: 1 }),
      ]);
      expect(ends.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
      const lost = ends.find((end) => end.status === "rejected");
      expect(lost?.reason).toMatchObject({ code: "CONFLICT" });
    }
    expect((await marksOf(technician, imageId)).labels).toEqual(["D1"]);
  });

  it("leaves a deleted mark closed to changes, with the way on", async () => {
    await deleteMark(technician, { markId, seenVersion: 1 });
    const error = await refusal(change(technician, 1, 500));
    expect(error).toMatchObject({ code: "LOCKED" });
    expect(error.message).toContain("Put it back first");
  });

  it("is refused for a picture that was withdrawn", async () => {
    await withdrawImage(technician, { imageId, reason: "Wrong part." });
    expect(await refusal(deleteMark(technician, { markId, seenVersion: 1 }))).toMatchObject({
      code: "LOCKED",
    });
    expect(await refusal(change(technician, 1, 500))).toMatchObject({ code: "LOCKED" });
  });
});
