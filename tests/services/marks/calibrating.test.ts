import { beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import type { Actor } from "@/lib/auth/actor";
import { calibrateImage } from "@/lib/images/calibrate-image";
import { changeMark } from "@/lib/images/change-mark";
import { deleteMark } from "@/lib/images/delete-mark";
import { placeMark } from "@/lib/images/place-mark";
import { restoreMark } from "@/lib/images/restore-mark";
import { staleVersionIds } from "@/lib/records/stale";
import { failureOf, whileFailing } from "../../helpers/failing-database";
import { asInvestigator, asTechnician } from "../../helpers/people";
import { refusal } from "../../helpers/refusal";
import {
  aPicture,
  aScale,
  eventsOf,
  LENGTH,
  marksOf,
  SQUARE,
  theMark,
  valueOf,
  versionsOf,
} from "./a-picture";

let technician: Actor;
let investigator: Actor;
let caseId: string;
let imageId: string;
beforeEach(async () => {
  [technician, investigator] = [await asTechnician(), await asInvestigator()];
  ({ caseId, imageId } = await aPicture());
});
const place = (geometry: object) => placeMark(technician, { imageId, geometry });
const value = (label: string, key: string) => valueOf(technician, imageId, label, key);

describe("setting the scale", () => {
  it("keeps where it is from and how sure it is, worked out by hand", async () => {
    expect(await calibrateImage(technician, aScale(imageId))).toMatchObject({
      label: "S1",
      number: 1,
      recomputed: 0,
    });
    const { scale } = await marksOf(technician, imageId);
    // root(0.012^2 + (root(2) / 1000)^2) = 0.012 083.
    expect(scale?.content.umPerPx).toBe(10);
    expect(scale?.content.relativeUncertainty).toBeCloseTo(0.012_083, 6);
    expect(scale?.pixelText.replaceAll("\u00a0", " ")).toBe("0.01000 ± 0.00012 mm");
    expect(scale).toMatchObject({ by: technician.name, label: "S1" });
    expect((await eventsOf(caseId)).at(-1)).toMatchObject({
      action: "image.calibrate",
      subjectLabel: "IM-01 S1",
      before: null,
      after: { umPerPx: 10, recomputed: 0 },
    });
  });

  it("works out every length and area that was refused before, and touches nothing else", async () => {
    await place(LENGTH);
    await place(SQUARE);
    await place({ tool: "count", points: [[1, 1]] });
    await place({ tool: "note", point: [1, 1] });
    expect(await value("D1", "length")).toBe("not calibrated");
    expect(await calibrateImage(investigator, aScale(imageId))).toMatchObject({ recomputed: 2 });
    expect(await value("D1", "length")).toBe("10.00 ± 0.12 mm");
    expect(await value("A1", "area")).toBe("25.0 ± 0.6 mm²");
    const { marks } = await marksOf(technician, imageId);
    expect(Object.fromEntries(marks.map(({ label, number }) => [label, number]))).toEqual({
      D1: 2,
      A1: 2,
      C1: 1,
      N1: 1,
    });
  });

  it("anew gives every value anew, with the reason, and makes the old versions stale", async () => {
    await calibrateImage(technician, aScale(imageId));
    const { recordId, versionId } = await place(LENGTH);
    await place(SQUARE);
    expect(await calibrateImage(investigator, aScale(imageId, 1, 20))).toMatchObject({
      number: 2,
      recomputed: 2,
    });
    // Twice the millimetres to the pixel: twice the length, four times the area. The distance is
    // now known to 0.6 %, so 1.23 mm2 from the scale and 0.28 mm2 from the picks, together 1.27.
    expect(await value("D1", "length")).toMatch(/^20\.00 ± 0\.1\d mm$/);
    expect(await value("A1", "area")).toMatch(/^100\.0 ± 1\.3 mm²$/);
    const versions = await versionsOf(recordId);
    expect(versions.map(({ number, reason }) => [number, reason])).toEqual([
      [1, null],
      [2, "Recomputed: scale S1 was changed"],
    ]);
    expect(
      await staleVersionIds(
        database(),
        versions.map(({ id }) => id),
      ),
    ).toEqual(new Set([versionId]));
  });

  it("that is the same again changes no value but is kept as a version", async () => {
    await calibrateImage(technician, aScale(imageId));
    await place(LENGTH);
    await calibrateImage(investigator, aScale(imageId, 1));
    expect(await value("D1", "length")).toBe("10.00 ± 0.12 mm");
  });

  it("as a whole or not at all", async () => {
    await place(LENGTH);
    const failed: unknown = await whileFailing("auditLog", () =>
      calibrateImage(technician, aScale(imageId)).then(
        () => null,
        (reason: unknown) => reason,
      ),
    );
    expect(failureOf(failed)).toContain("the disk is full");
    const { scale } = await marksOf(technician, imageId);
    expect(scale).toBeNull();
    expect(await theMark(technician, imageId, "D1")).toMatchObject({ number: 1 });
    expect(await value("D1", "length")).toBe("not calibrated");
  });

  it("is told to the second of two who set it, one after the other or at once", async () => {
    await calibrateImage(technician, aScale(imageId));
    const late = await refusal(calibrateImage(investigator, aScale(imageId, null, 11)));
    expect(late).toMatchObject({
      code: "CONFLICT",
      conflict: {
        yours: { settings: { knownDistanceMm: 11 } },
        theirs: { settings: { knownDistanceMm: 10 } },
        changedBy: technician.name,
      },
    });
    const ends = await Promise.allSettled([
      calibrateImage(technician, aScale(imageId, 1, 12)),
      calibrateImage(investigator, aScale(imageId, 1, 13)),
    ]);
    expect(ends.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    expect((await marksOf(technician, imageId)).scale?.number).toBe(2);
  });

  it("at once for the first time makes one scale", async () => {
    const ends = await Promise.allSettled([
      calibrateImage(technician, aScale(imageId)),
      calibrateImage(investigator, aScale(imageId)),
    ]);
    expect(ends.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    expect((await marksOf(technician, imageId)).scale?.number).toBe(1);
  });

  it.each([
    [
      "points in one place",
      {
        points: [
          [5, 5],
          [5, 5],
        ],
      },
    ],
    [
      "points too near each other",
      {
        points: [
          [5, 5],
          [20, 5],
        ],
      },
    ],
    [
      "a point off the picture",
      {
        points: [
          [5, 5],
          [5000, 5],
        ],
      },
    ],
    [
      "a point that is no number",
      {
        points: [
          [NaN, 5],
          [500, 5],
        ],
      },
    ],
    ["no distance", { knownDistanceMm: 0 }],
    ["a distance without end", { knownDistanceMm: Infinity }],
    ["a distance that is no number", { knownDistanceMm: NaN }],
    ["a distance below zero", { knownDistanceMm: -1 }],
    ["an uncertainty below zero", { knownDistanceUncertaintyMm: -1 }],
    ["no uncertainty of picking", { pickUncertaintyPx: 0 }],
    ["a tilt past flat", { tiltDeg: 91 }],
    ["no uncertainty of the file", { source: "file_resolution", relativeUncertaintyPercent: 0 }],
    ["a source that there is not", { source: "guess" }],
  ])("is refused for %s, and everything is as it was", async (_what, wrong) => {
    await place(LENGTH);
    const error = await refusal(calibrateImage(technician, { ...aScale(imageId), ...wrong }));
    expect(error.code).toBe("INVALID");
    expect((await marksOf(technician, imageId)).scale).toBeNull();
    expect(await value("D1", "length")).toBe("not calibrated");
  });
});

describe("values that rest on other marks", () => {
  const half = {
    tool: "area",
    points: [
      [200, 200],
      [700, 200],
      [700, 450],
      [200, 450],
    ],
  };

  it("follow the section outline when it moves, goes and comes back", async () => {
    const outline = await place({ ...SQUARE, isOutline: true });
    await place(half);
    expect(await value("A2", "share")).toMatch(/^50\.0/);
    await changeMark(investigator, {
      markId: outline.recordId,
      seenVersion: 1,
      geometry: {
        tool: "area",
        isOutline: true,
        points: [
          [200, 200],
          [1200, 200],
          [1200, 700],
          [200, 700],
        ],
      },
    });
    expect(await value("A2", "share")).toMatch(/^25\.0/);
    await deleteMark(technician, { markId: outline.recordId, seenVersion: 2 });
    expect(await value("A2", "share")).toBe("no section outline");
    await restoreMark(technician, { markId: outline.recordId });
    expect(await value("A2", "share")).toMatch(/^25\.0/);
  });

  it("refuse a share larger than the outline", async () => {
    await place({ ...half, isOutline: true });
    await place(SQUARE);
    expect(await value("A2", "share")).toBe("larger than the section outline");
  });

  it("read the depth of a front from the origin, and from its chord without one", async () => {
    await calibrateImage(technician, aScale(imageId));
    await place({
      tool: "front",
      points: [
        [500, 500],
        [600, 600],
        [700, 500],
      ],
    });
    expect(await value("B1", "depth")).toMatch(/^1\.000 ± /);
    const origin = await place({ tool: "origin", point: [600, 400] });
    // From (600, 400) to (600, 600): 200 px.
    expect(await value("B1", "depth")).toMatch(/^2\.00\d? ± /);
    await deleteMark(technician, { markId: origin.recordId, seenVersion: 1 });
    expect(await value("B1", "depth")).toMatch(/^1\.000 ± /);
  });

  it("give clock angles about the centre of a round outline, clockwise from the landmark", async () => {
    const round = Array.from({ length: 36 }, (_, i) => {
      const turn = (i * Math.PI) / 18;
      return [1000 + 500 * Math.cos(turn), 700 + 500 * Math.sin(turn)];
    });
    await place({ tool: "area", points: round, isOutline: true });
    // At three o'clock, and six o'clock from a landmark at three.
    await place({ tool: "origin", point: [1500, 700] });
    expect(await value("O1", "clockAngle")).toMatch(/^90\.\d+ ± 0\.\d+°$/);
    await place({
      tool: "origin",
      point: [1000, 1200],
      landmark: { point: [1500, 700], name: "keyway" },
    });
    expect(await value("O2", "clockAngle")).toMatch(/^90\.\d+ ± 0\.\d+°$/);
    await place({
      tool: "ratchet",
      lines: [
        [
          [1500, 700],
          [1400, 700],
        ],
        [
          [1000, 1200],
          [1000, 1100],
        ],
      ],
    });
    expect(await value("R1", "count")).toBe("2");
    expect(await value("R1", "arc")).toMatch(/^90\.\d+ ± 0\.\d+°$/);
  });

  it("give no clock angle on a square section", async () => {
    await place({ ...SQUARE, isOutline: true });
    await place({ tool: "origin", point: [300, 300] });
    expect(await value("O1", "clockAngle")).toBe("the section outline is not round");
  });
});
