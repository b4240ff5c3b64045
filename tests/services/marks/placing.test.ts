import { beforeAll, describe, expect, it } from "vitest";
import type { Actor } from "@/lib/auth/actor";
import { calibrateImage } from "@/lib/images/calibrate-image";
import { deleteMark } from "@/lib/images/delete-mark";
import { MAX_POINTS } from "@/lib/images/mark-schemas";
import { placeMark } from "@/lib/images/place-mark";
import { restoreMark } from "@/lib/images/restore-mark";
import { withdrawImage } from "@/lib/images/withdraw-image";
import { asInvestigator, asTechnician } from "../../helpers/people";
import { refusal } from "../../helpers/refusal";
import {
  aPicture,
  aScale,
  eventsOf,
  LENGTH,
  marksOf,
  SIZE,
  SQUARE,
  theMark,
  valueOf,
} from "./a-picture";

let technician: Actor;
let investigator: Actor;
let imageId: string;
let caseId: string;
beforeAll(async () => {
  [technician, investigator] = [await asTechnician(), await asInvestigator()];
  ({ imageId, caseId } = await aPicture());
});

describe("placing a mark", () => {
  it("names it by kind and number, keeps who said what, and records the event", async () => {
    const { imageId: image, caseId: home } = await aPicture();
    const first = await placeMark(technician, {
      imageId: image,
      geometry: { tool: "note", point: [5, 5] },
      name: " Oxide ",
      confidence: "sure",
      note: "Blue to straw.",
    });
    const second = await placeMark(investigator, {
      imageId: image,
      geometry: { tool: "note", point: [9, 9] },
    });
    expect([first, second]).toMatchObject([
      { label: "N1", number: 1 },
      { label: "N2", number: 1 },
    ]);
    expect(await theMark(technician, image, "N1")).toMatchObject({
      by: technician.name,
      content: { name: "Oxide", confidence: "sure", note: "Blue to straw.", tool: "note" },
    });
    const told = (await eventsOf(home)).filter((event) => event.action === "image.mark");
    expect(told).toMatchObject([
      { actorId: technician.id, subjectLabel: "IM-01 N1", before: null },
      { actorId: investigator.id, subjectLabel: "IM-01 N2", before: null },
    ]);
  });

  it("gives each kind its values, worked out by hand", async () => {
    const { imageId: image } = await aPicture();
    await calibrateImage(technician, aScale(image));
    const place = (geometry: object) => placeMark(technician, { imageId: image, geometry });
    await place(LENGTH);
    // 1000 px of 10 µm: 10 mm. Scale: u(D)/D 0.6 %, u(N)/N 0.0707 %, so 0.0604 mm; both picks
    // 0.0071 mm; root of squares 0.0608 mm, k = 2: 0.12.
    expect(await valueOf(technician, image, "D1", "length")).toBe("10.00 ± 0.12 mm");
    await place(SQUARE);
    // 500 px of 10 µm squared: 25 mm2; 2 x 0.604 % of it, k = 2: 0.60.
    expect(await valueOf(technician, image, "A1", "area")).toBe("25.0 ± 0.6 mm²");
    expect(await valueOf(technician, image, "A1", "share")).toBe("no section outline");
    await place({
      tool: "angle",
      points: [
        [100, 0],
        [100, 100],
        [200, 100],
      ],
    });
    expect(await valueOf(technician, image, "G1", "angle")).toMatch(/^90\.0 ± 1\.1°$/);
    await place({
      tool: "count",
      points: [
        [1, 1],
        [2, 2],
        [3, 3],
      ],
    });
    expect(await valueOf(technician, image, "C1", "count")).toBe("3");
    await place({
      tool: "front",
      points: [
        [500, 500],
        [600, 560],
        [700, 500],
      ],
    });
    // 60 px under its chord: 0.6 mm.
    expect(await valueOf(technician, image, "B1", "depth")).toMatch(/^0\.600 ± 0\.0\d+ mm$/);
    expect(await valueOf(technician, image, "B1", "chord")).toMatch(/^2\.00\d? ± 0\.0\d+ mm$/);
  });

  it("refuses lengths without a scale, and gives what needs none", async () => {
    await placeMark(technician, { imageId, geometry: LENGTH });
    await placeMark(technician, { imageId, geometry: { ...SQUARE, isOutline: true } });
    await placeMark(technician, {
      imageId,
      geometry: {
        tool: "area",
        points: [
          [200, 200],
          [700, 200],
          [700, 450],
          [200, 450],
        ],
      },
    });
    const d1 = (await theMark(technician, imageId, "D1")).content.measurements;
    expect(d1).toMatchObject([{ value: null, text: "–", refused: "not calibrated" }]);
    expect(JSON.stringify(d1)).not.toContain("1000");
    expect(await valueOf(technician, imageId, "A1", "area")).toBe("not calibrated");
    expect(await valueOf(technician, imageId, "A2", "area")).toBe("not calibrated");
    // Half of the outline, as a ratio of pixels.
    expect(await valueOf(technician, imageId, "A2", "share")).toMatch(/^50\.0\d* ± 0\.\d+ %$/);
  });

  it("takes one section outline and no second", async () => {
    const { imageId: image } = await aPicture();
    await placeMark(technician, { imageId: image, geometry: { ...SQUARE, isOutline: true } });
    const error = await refusal(
      placeMark(technician, { imageId: image, geometry: { ...SQUARE, isOutline: true } }),
    );
    expect(error).toMatchObject({ code: "INVALID" });
    expect(error.message).toMatch(/^A1 is the section outline already/);
    await deleteMark(technician, {
      markId: (await theMark(technician, image, "A1")).id,
      seenVersion: 1,
    });
    await expect(
      placeMark(technician, { imageId: image, geometry: { ...SQUARE, isOutline: true } }),
    ).resolves.toMatchObject({ label: "A2" });
    const back = await refusal(
      restoreMark(technician, { markId: (await theMark(technician, image, "A1")).id }),
    );
    expect(back.message).toMatch(/^A2 is the section outline already/);
  });

  it("is refused on a picture that was withdrawn", async () => {
    const { imageId: image } = await aPicture();
    await withdrawImage(technician, { imageId: image, reason: "Wrong part." });
    expect(
      await refusal(placeMark(technician, { imageId: image, geometry: LENGTH })),
    ).toMatchObject({
      code: "LOCKED",
    });
    expect((await marksOf(technician, image)).marks).toEqual([]);
  });
});

describe("a shape that is no shape", () => {
  const line = (points: unknown) => ({ tool: "length", points });
  const area = (points: unknown) => ({ tool: "area", points });
  const cases: [string, unknown][] = [
    [
      "no number",
      line([
        [NaN, 1],
        [5, 5],
      ]),
    ],
    [
      "a number without end",
      line([
        [Infinity, 1],
        [5, 5],
      ]),
    ],
    [
      "a number below zero without end",
      line([
        [1, -Infinity],
        [5, 5],
      ]),
    ],
    [
      "a place left of the picture",
      line([
        [-0.01, 1],
        [5, 5],
      ]),
    ],
    [
      "a place right of the picture",
      line([
        [SIZE.widthPx + 0.01, 1],
        [5, 5],
      ]),
    ],
    [
      "a place beneath the picture",
      line([
        [1, SIZE.heightPx + 1],
        [5, 5],
      ]),
    ],
    [
      "a place a world away",
      line([
        [1e300, 1],
        [5, 5],
      ]),
    ],
    [
      "numbers as text",
      line([
        ["1", "1"],
        [5, 5],
      ]),
    ],
    [
      "a point of three numbers",
      line([
        [1, 1, 1],
        [5, 5],
      ]),
    ],
    ["one point", line([[1, 1]])],
    [
      "one place twice",
      line([
        [7, 7],
        [7, 7],
      ]),
    ],
    ["no points", { tool: "count", points: [] }],
    [
      "more points than a mark may have",
      line(Array.from({ length: MAX_POINTS + 1 }, (_, i) => [i % 2000, 3])),
    ],
    [
      "an edge that crosses itself",
      area([
        [0, 0],
        [100, 100],
        [100, 0],
        [0, 100],
      ]),
    ],
    [
      "corners on one line",
      area([
        [0, 0],
        [50, 50],
        [100, 100],
      ]),
    ],
    [
      "two corners and one of them again",
      area([
        [0, 0],
        [50, 50],
        [50, 50],
      ]),
    ],
    [
      "an arm without length",
      {
        tool: "angle",
        points: [
          [5, 5],
          [5, 5],
          [9, 9],
        ],
      },
    ],
    [
      "a ratchet mark without length",
      {
        tool: "ratchet",
        lines: [
          [
            [5, 5],
            [5, 5],
          ],
        ],
      },
    ],
    [
      "a front in one place",
      {
        tool: "front",
        points: [
          [5, 5],
          [5, 5],
          [5, 5],
        ],
      },
    ],
    [
      "an origin on a landmark off the picture",
      { tool: "origin", point: [5, 5], landmark: { point: [9999, 5], name: "keyway" } },
    ],
    ["a radius below zero", { tool: "origin", point: [5, 5], radiusPx: -3 }],
    ["a tool that there is not", { tool: "circle", point: [5, 5] }],
    ["nothing", null],
  ];

  it.each(cases)("is refused: %s", async (_what, geometry) => {
    const before = await marksOf(technician, imageId);
    const events = (await eventsOf(caseId)).length;
    const error = await refusal(placeMark(technician, { imageId, geometry }));
    expect(error.code).toBe("INVALID");
    expect(Object.keys(error.fields ?? {}).join()).toMatch(/^geometry/);
    expect(await marksOf(technician, imageId)).toEqual(before);
    expect(await eventsOf(caseId)).toHaveLength(events);
  });

  it("but an area with a corner given twice is one", async () => {
    const { imageId: image } = await aPicture();
    const [first = [0, 0], second = [0, 0], ...rest] = SQUARE.points;
    const points = [first, second, second, ...rest];
    await calibrateImage(technician, aScale(image));
    await placeMark(technician, { imageId: image, geometry: { tool: "area", points } });
    expect(await valueOf(technician, image, "A1", "area")).toBe("25.0 ± 0.6 mm²");
  });

  it("but one with the most points is taken and measured", async () => {
    const { imageId: image } = await aPicture();
    await calibrateImage(technician, aScale(image));
    // A circle of radius 500 px of 10 µm: 78.5 mm2.
    const points = Array.from({ length: MAX_POINTS }, (_, i) => {
      const turn = (2 * Math.PI * i) / MAX_POINTS;
      return [1000 + 500 * Math.cos(turn), 700 + 500 * Math.sin(turn)];
    });
    await placeMark(technician, { imageId: image, geometry: { tool: "area", points } });
    expect(await valueOf(technician, image, "A1", "area")).toMatch(/^78\.5 ± 1\.9 mm²$/);
  });
});
