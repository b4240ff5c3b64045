import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { circleThrough, isRound } from "@/lib/imaging/circle";
import { frontDepth } from "@/lib/imaging/front";
import type { Point } from "@/lib/imaging/point";
import { scaleBar, scaleBarUnit } from "@/lib/imaging/scale-bar";

const onCircle = (centre: Point, radius: number, turnsDeg: readonly number[]): Point[] =>
  turnsDeg.map((turn) => [
    centre[0] + radius * Math.cos((turn * Math.PI) / 180),
    centre[1] + radius * Math.sin((turn * Math.PI) / 180),
  ]);

describe("a circle through points", () => {
  it("is the one circle through three, known from geometry", () => {
    // Through (0,0), (8,0), (0,6) with its right angle at the first: centre (4,3), radius 5 (Thales).
    const circle = circleThrough([
      [0, 0],
      [8, 0],
      [0, 6],
    ]);
    expect(circle?.centre[0]).toBeCloseTo(4, 10);
    expect(circle?.centre[1]).toBeCloseTo(3, 10);
    expect(circle?.radiusPx).toBeCloseTo(5, 10);
    expect(circle?.residualPx).toBeCloseTo(0, 10);
  });

  it("is found again from any arc of it, near the corner of the picture or far off", () => {
    fc.assert(
      fc.property(
        fc.tuple(fc.integer({ min: 0, max: 20_000 }), fc.integer({ min: 0, max: 20_000 })),
        fc.integer({ min: 20, max: 9000 }),
        fc.integer({ min: 60, max: 360 }),
        (centre, radius, sweepDeg) => {
          const turns = Array.from({ length: 9 }, (_, i) => (i * sweepDeg) / 9);
          const circle = circleThrough(onCircle(centre, radius, turns));
          expect(circle?.radiusPx).toBeCloseTo(radius, 3);
          expect(circle?.centre[0]).toBeCloseTo(centre[0], 3);
          expect(circle?.centre[1]).toBeCloseTo(centre[1], 3);
        },
      ),
    );
  });

  it("says how far the points lie off it", () => {
    // By hand: eight points by turns 1 px outside and 1 px inside a radius of 100.
    const turns = [0, 45, 90, 135, 180, 225, 270, 315];
    const rough = turns.flatMap((turn, i) => onCircle([500, 500], i % 2 === 0 ? 101 : 99, [turn]));
    const circle = circleThrough(rough);
    expect(circle?.radiusPx).toBeCloseTo(100, 1);
    expect(circle?.residualPx).toBeCloseTo(1, 2);
  });

  it("is none through fewer than three points, one place or a line", () => {
    expect(circleThrough([])).toBeNull();
    expect(
      circleThrough([
        [0, 0],
        [5, 5],
      ]),
    ).toBeNull();
    expect(
      circleThrough([
        [4, 4],
        [4, 4],
        [4, 4],
      ]),
    ).toBeNull();
    expect(
      circleThrough([
        [0, 0],
        [5, 5],
        [90, 90],
      ]),
    ).toBeNull();
  });

  const corners = (count: number) =>
    onCircle(
      [500, 500],
      100,
      Array.from({ length: count }, (_, i) => (360 * i) / count),
    );
  const round = (outline: readonly Point[]) => {
    const circle = circleThrough(outline);
    return circle !== null && isRound(circle, outline);
  };

  it("is called round within three per cent of its radius", () => {
    const circle = { centre: [500, 500] as const, radiusPx: 100 };
    expect(isRound({ ...circle, residualPx: 3 }, corners(36))).toBe(true);
    expect(isRound({ ...circle, residualPx: 3.01 }, corners(36))).toBe(false);
  });

  it("is not called round for the corners of a square or a hexagon, which lie on one", () => {
    const square = corners(4);
    expect(circleThrough(square)?.residualPx).toBeCloseTo(0, 8);
    expect([3, 4, 5, 6, 7, 8, 12, 120].map((count) => round(corners(count)))).toEqual([
      false,
      false,
      false,
      false,
      true,
      true,
      true,
      true,
    ]);
    const bar: Point[] = [
      [0, 0],
      [300, 0],
      [300, 100],
      [0, 100],
    ];
    expect(round(bar)).toBe(false);
  });

  it("is not called round with a flat cut off it", () => {
    // A segment of 60 degrees gone: its chord lies 1 - cos(30°) = 13 % inside.
    const cut = corners(36).filter((_, i) => i === 0 || i >= 6);
    expect(round(cut)).toBe(false);
    expect(round(corners(36).filter((_, i) => i === 0 || i >= 4))).toBe(true);
  });
});

describe("the depth of a front", () => {
  /** A half circle of radius 100 about (200, 0), its ends on the line y = 0. */
  const half = onCircle(
    [200, 0],
    100,
    Array.from({ length: 181 }, (_, i) => i),
  );

  it("is its radius for a half circle, from its chord and from its centre alike", () => {
    const fromChord = frontDepth(half, null);
    expect(fromChord?.from).toBe("chord");
    expect(fromChord?.depthPx).toBeCloseTo(100, 10);
    expect(fromChord?.at[0]).toBeCloseTo(200, 8);
    const fromOrigin = frontDepth(half, [200, 0]);
    expect(fromOrigin?.from).toBe("origin");
    expect(fromOrigin?.depthPx).toBeCloseTo(100, 8);
  });

  it("is read along the growth line from an origin off the middle", () => {
    // From (230, 0) straight in: root(100^2 - 30^2).
    expect(frontDepth(half, [230, 0])?.depthPx).toBeCloseTo(Math.sqrt(9100), 1);
    // An origin 40 px beneath the chord, on the far side of the front: 140.
    expect(frontDepth(half, [200, -40])?.depthPx).toBeCloseTo(140, 8);
  });

  it("falls back to the chord where the growth line misses the front", () => {
    expect(frontDepth(half, [900, 0])).toMatchObject({ from: "chord" });
  });

  it("meets the front where it is farthest when it bends back", () => {
    const bent: Point[] = [
      [0, 0],
      [40, 50],
      [60, 20],
      [100, 0],
    ];
    expect(frontDepth(bent, [50, 0])).toMatchObject({ from: "origin", depthPx: 35, at: [50, 35] });
  });

  it("is 0 for a straight front and none where both ends are one point", () => {
    expect(
      frontDepth(
        [
          [0, 0],
          [5, 0],
          [10, 0],
        ],
        null,
      )?.depthPx,
    ).toBe(0);
    expect(
      frontDepth(
        [
          [0, 0],
          [5, 9],
          [0, 0],
        ],
        null,
      ),
    ).toBeNull();
    expect(frontDepth([[0, 0]], [5, 5])).toBeNull();
    expect(frontDepth([], null)).toBeNull();
  });

  it("does not depend on how the picture is turned", () => {
    const turn = ([x, y]: Point): Point => [-y + 900, x + 50];
    expect(frontDepth(half.map(turn), turn([230, 0]))?.depthPx).toBeCloseTo(
      frontDepth(half, [230, 0])?.depthPx ?? NaN,
      8,
    );
  });
});

describe("a scale bar", () => {
  // 160 px at most; lengths by hand.
  it.each([
    [10, 1000, 100],
    [12.5, 2000, 160],
    [44, 5000, 5000 / 44],
    [0.05, 5, 100],
    [1000, 100_000, 100],
  ])("at %d µm a pixel is %d µm, %d px wide", (umPerPx, lengthUm, widthPx) => {
    const bar = scaleBar(umPerPx);
    expect(bar?.lengthUm).toBeCloseTo(lengthUm, 9);
    expect(bar?.widthPx).toBeCloseTo(widthPx, 9);
  });

  it("is always 1, 2 or 5 of its unit and 64 to 160 px wide", () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-4, max: 1e5, noNaN: true }), (umPerPx) => {
        const bar = scaleBar(umPerPx);
        if (!bar) throw new Error("no bar");
        expect(bar.widthPx).toBeGreaterThanOrEqual(64 * (1 - 1e-9));
        expect(bar.widthPx).toBeLessThanOrEqual(160 * (1 + 1e-9));
        const { value } = scaleBarUnit(bar.lengthUm);
        expect([1, 2, 5]).toContain(value / 10 ** Math.floor(Math.log10(value)));
      }),
    );
  });

  it("is none without a scale", () => {
    for (const umPerPx of [0, -1, NaN, Infinity]) expect(scaleBar(umPerPx)).toBeNull();
  });

  it.each([
    [10_000, 10, "mm"],
    [500, 500, "µm"],
    [0.2, 200, "nm"],
    [2_000_000, 2, "m"],
    [1000, 1, "mm"],
  ])("of %d µm reads %d %s", (lengthUm, value, unit) => {
    expect(scaleBarUnit(lengthUm)).toEqual({ value, unit });
  });
});
