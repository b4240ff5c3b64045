import { describe, expect, it } from "vitest";
import { isSecondPress } from "@/components/viewer/double-press";
import {
  afterPress,
  closesArea,
  completeAt,
  type DrawingOptions,
  leastPoints,
  PLAIN_OPTIONS,
  shapeOf,
  withoutPoint,
  withPointAfter,
  withPointMoved,
} from "@/components/viewer/drawing";
import type { DrawingTool } from "@/components/viewer/tools";
import { ontoPicture, toPicture, toScreen } from "@/components/viewer/view";
import { type Geometry, pointsOf } from "@/lib/images/mark-schemas";
import type { Point } from "@/lib/imaging/point";

type Step = Point | "again";

/** Presses one after the other; "again" is the second press of a double press. */
function draw(tool: DrawingTool, steps: readonly Step[], options: DrawingOptions = PLAIN_OPTIONS) {
  let points: readonly Point[] = [];
  let at: Point = [0, 0];
  const done: Geometry[] = [];
  for (const step of steps) {
    const isSecond = step === "again";
    if (!isSecond) at = step;
    const next = afterPress({ tool, points, options }, at, { isSecond, scale: 1 });
    points = next.points;
    if (next.done) {
      done.push(next.done);
      points = [];
    }
  }
  return { points, done };
}
const P = (n: number): Point => [n * 100, n * n * 10];

describe("pressing", () => {
  it.each<[DrawingTool, number]>([
    ["origin", 1],
    ["length", 2],
    ["angle", 3],
  ])("%s is whole at %i points, and is then saved", (tool, all) => {
    const steps = Array.from({ length: all }, (_, i) => P(i + 1));
    expect(draw(tool, steps.slice(0, -1)).done).toEqual([]);
    const { done, points } = draw(tool, steps);
    expect(done).toHaveLength(1);
    expect(done[0] && pointsOf(done[0])).toEqual(steps);
    expect(points).toEqual([]);
  });

  it("an origin with a landmark takes a second point", () => {
    const options = { ...PLAIN_OPTIONS, hasLandmark: true, landmarkName: " keyway " };
    expect(draw("origin", [P(1)], options).done).toEqual([]);
    expect(draw("origin", [P(1), P(2)], options).done).toEqual([
      { tool: "origin", point: P(1), landmark: { point: P(2), name: "keyway" } },
    ]);
  });

  it("a note waits for its words, and another press moves it", () => {
    expect(draw("note", [P(1)])).toEqual({ done: [], points: [P(1)] });
    expect(draw("note", [P(1), P(2)])).toEqual({ done: [], points: [P(2)] });
  });

  it("a scale waits for its length, and a third press begins it again", () => {
    expect(draw("scale", [P(1), P(2)])).toEqual({ done: [], points: [P(1), P(2)] });
    expect(draw("scale", [P(1), P(2), P(3)]).points).toEqual([P(3)]);
  });

  it("a length that was whole but not saved is drawn anew, not made longer", () => {
    const next = afterPress(
      { tool: "length", points: [P(1), P(2)], options: PLAIN_OPTIONS },
      P(3),
      { isSecond: false, scale: 1 },
    );
    expect(next).toEqual({ points: [P(3)], done: null });
  });

  it("an area closes on its first point, by the distance on the screen", () => {
    const corners: Point[] = [
      [0, 0],
      [100, 0],
      [100, 100],
    ];
    expect(draw("area", [...corners, [4, 4]]).done).toEqual([
      { tool: "area", points: corners, isOutline: false },
    ]);
    expect(draw("area", [...corners, [40, 40]]).done).toEqual([]);
    // 40 px of the picture are 8 on the screen at a fifth of its size.
    expect(closesArea("area", corners, [40, 0], 0.2)).toBe(true);
    expect(closesArea("area", corners.slice(0, 2), [0, 0], 1)).toBe(false);
    expect(closesArea("front", corners, [0, 0], 1)).toBe(false);
  });
});

describe("a double press", () => {
  it("ends a count with as many as were pressed, not one more", () => {
    const { done } = draw("count", [P(1), P(2), P(3), "again"]);
    expect(done).toEqual([{ tool: "count", points: [P(1), P(2), P(3)] }]);
  });

  it("ends ratchet marks with each line from its own rim to its own inner end", () => {
    const { done } = draw("ratchet", [P(1), P(2), P(3), P(4), "again"]);
    expect(done).toEqual([
      {
        tool: "ratchet",
        lines: [
          [P(1), P(2)],
          [P(3), P(4)],
        ],
      },
    ]);
  });

  it("ends an area and a front without a point given twice", () => {
    const area = draw("area", [[0, 0], [90, 0], [90, 90], "again"]).done[0];
    expect(area && pointsOf(area)).toHaveLength(3);
    const front = draw("front", [P(1), P(2), P(3), "again"]).done[0];
    expect(front && pointsOf(front)).toHaveLength(3);
  });

  it("sets one point of a shape with a fixed number and ends nothing", () => {
    expect(draw("length", [P(1), "again"])).toEqual({ done: [], points: [P(1)] });
    expect(draw("angle", [P(1), "again", P(2), "again"]).points).toEqual([P(1), P(2)]);
    expect(draw("scale", [P(1), "again", P(2), "again"]).points).toEqual([P(1), P(2)]);
    // The first press of it places the origin; the second begins no other.
    expect(draw("origin", [P(1), "again"])).toEqual({
      done: [{ tool: "origin", point: P(1), landmark: null }],
      points: [],
    });
  });

  it("with too few points ends nothing and keeps them", () => {
    expect(draw("area", [P(1), P(2), "again"])).toEqual({ done: [], points: [P(1), P(2)] });
    expect(draw("ratchet", [P(1), "again"])).toEqual({ done: [], points: [P(1)] });
  });

  it("is two presses in one place, soon after each other", () => {
    const first = { at: [100, 100] as Point, timeMs: 1000, isTouch: false };
    const press = (x: number, timeMs: number, isTouch = false) =>
      isSecondPress(first, { at: [x, 100], timeMs, isTouch });
    expect(isSecondPress(null, first)).toBe(false);
    expect(press(100, 1250)).toBe(true);
    expect(press(105, 1400)).toBe(true);
    expect(press(100, 1401)).toBe(false);
    // Dimples six pixels apart, counted fast, are two.
    expect(press(106, 1150)).toBe(false);
    expect(press(118, 1150, true)).toBe(true);
    expect(press(121, 1150, true)).toBe(false);
  });
});

describe("the shape of points", () => {
  it.each<[DrawingTool, number]>([
    ["origin", 1],
    ["note", 1],
    ["count", 1],
    ["length", 2],
    ["front", 2],
    ["ratchet", 2],
    ["scale", 2],
    ["area", 3],
    ["angle", 3],
  ])("of %s needs %i", (tool, least) => {
    expect(leastPoints(tool, PLAIN_OPTIONS)).toBe(least);
    const points = Array.from({ length: least }, (_, i) => P(i + 1));
    expect(shapeOf(tool, points.slice(1), PLAIN_OPTIONS)).toBeNull();
    const shape = shapeOf(tool, points, PLAIN_OPTIONS);
    if (tool === "scale") expect(shape).toBeNull();
    else expect(shape && pointsOf(shape)).toEqual(points);
  });

  it("along several points is ended by the person", () => {
    const along = { ...PLAIN_OPTIONS, isAlongLine: true };
    expect(completeAt("length", along)).toBeNull();
    expect(draw("length", [P(1), P(2), P(3), "again"], along).done).toEqual([
      { tool: "length", points: [P(1), P(2), P(3)] },
    ]);
  });
});

describe("points of a shape that is there", () => {
  const shapes: Geometry[] = [
    { tool: "origin", point: [1, 1], landmark: { point: [2, 2], name: "keyway" } },
    { tool: "note", point: [1, 1] },
    {
      tool: "ratchet",
      lines: [
        [
          [1, 1],
          [2, 2],
        ],
        [
          [3, 3],
          [4, 4],
        ],
      ],
    },
    {
      tool: "angle",
      points: [
        [1, 1],
        [2, 2],
        [3, 3],
      ],
    },
    {
      tool: "area",
      points: [
        [1, 1],
        [2, 2],
        [3, 3],
        [4, 4],
      ],
      isOutline: true,
    },
    {
      tool: "length",
      points: [
        [1, 1],
        [2, 2],
      ],
    },
    { tool: "count", points: [[1, 1]] },
  ];

  it.each(shapes)("of $tool move one at a time", (shape) => {
    const before = pointsOf(shape);
    before.forEach((_, moved) => {
      const after = pointsOf(withPointMoved(shape, moved, [50, 60]));
      expect(after).toEqual(before.map((point, i) => (i === moved ? [50, 60] : point)));
    });
  });

  it("are never fewer than the shape needs", () => {
    const left = shapes.map((shape) => {
      const fewer = withoutPoint(shape, 0);
      return fewer && pointsOf(fewer).length;
    });
    expect(left).toEqual([null, null, 2, null, 3, null, null]);
  });

  it("are added half way to the next, round the corner of an area too", () => {
    expect(withPointAfter(shapes[5] as Geometry, 0)).toEqual({
      tool: "length",
      points: [
        [1, 1],
        [1.5, 1.5],
        [2, 2],
      ],
    });
    expect(withPointAfter(shapes[5] as Geometry, 1)).toBeNull();
    const area = withPointAfter(shapes[4] as Geometry, 3);
    expect(area && pointsOf(area).at(-1)).toEqual([2.5, 2.5]);
    expect(withPointAfter(shapes[3] as Geometry, 0)).toBeNull();
  });
});

describe("picture and screen", () => {
  it("go over into each other", () => {
    const view = { scale: 0.49, x: 84, y: 56 };
    const [x, y] = toPicture(toScreen([1234, 567], view), view);
    expect(x).toBeCloseTo(1234, 9);
    expect(y).toBeCloseTo(567, 9);
  });

  it("keep a press on the picture, to a hundredth of a pixel", () => {
    const size = { widthPx: 100, heightPx: 50 };
    expect(ontoPicture([-3, 77], size)).toEqual([0, 50]);
    expect(ontoPicture([12.345_678, 9.994_9], size)).toEqual([12.35, 9.99]);
  });
});
