import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { crossesItself, segmentsMeet } from "@/lib/imaging/crossing";
import type { Point } from "@/lib/imaging/point";
import {
  isInside,
  polygonAreaPx2,
  polygonCentroid,
  polygonPickUncertaintyPx2,
} from "@/lib/imaging/polygon";

const SQUARE: Point[] = [
  [0, 0],
  [10, 0],
  [10, 10],
  [0, 10],
];
/** Two squares of 10 with a common corner of 5 by 5 missing: an L of area 75. */
const ELL: Point[] = [
  [0, 0],
  [10, 0],
  [10, 5],
  [5, 5],
  [5, 10],
  [0, 10],
];
const regular = (corners: number, radius = 100): Point[] =>
  Array.from({ length: corners }, (_, i) => {
    const turn = (2 * Math.PI * i) / corners;
    return [500 + radius * Math.cos(turn), 500 + radius * Math.sin(turn)];
  });

describe("area of a shape", () => {
  it("is that of plane geometry", () => {
    expect(polygonAreaPx2(SQUARE)).toBe(100);
    expect(polygonAreaPx2(ELL)).toBe(75);
    expect(
      polygonAreaPx2([
        [0, 0],
        [30, 0],
        [0, 40],
      ]),
    ).toBe(600);
    // Regular polygon: n r^2 sin(2 pi / n) / 2, which for a hexagon of radius 100 is 25 980.76.
    expect(polygonAreaPx2(regular(6))).toBeCloseTo(25_980.762, 3);
    // With a thousand corners it is a circle to 1 part in 100 000.
    expect(polygonAreaPx2(regular(1000)) / (Math.PI * 100 ** 2)).toBeCloseTo(1, 4);
  });

  it("is 0 on a line, and the same whichever way round and wherever it starts", () => {
    expect(
      polygonAreaPx2([
        [0, 0],
        [5, 5],
        [9, 9],
      ]),
    ).toBe(0);
    expect(polygonAreaPx2([])).toBe(0);
    expect(polygonAreaPx2(ELL.toReversed())).toBe(75);
    expect(polygonAreaPx2([...ELL.slice(2), ...ELL.slice(0, 2)])).toBe(75);
  });

  it("has its centre of gravity where the parts balance", () => {
    expect(polygonCentroid(SQUARE)).toEqual([5, 5]);
    expect(
      polygonCentroid([
        [0, 0],
        [30, 0],
        [0, 30],
      ]),
    ).toEqual([10, 10]);
    // By hand: (50 at 5, 2.5) and (25 at 2.5, 7.5), so x = y = 312.5 / 75.
    const [x, y] = polygonCentroid(ELL) ?? [NaN, NaN];
    expect(x).toBeCloseTo(312.5 / 75, 10);
    expect(y).toBeCloseTo(312.5 / 75, 10);
    expect(
      polygonCentroid([
        [0, 0],
        [5, 5],
        [9, 9],
      ]),
    ).toBeNull();
  });

  it("holds what lies inside and nothing else", () => {
    expect(isInside([2, 8], ELL)).toBe(true);
    expect(isInside([8, 2], ELL)).toBe(true);
    expect(isInside([8, 8], ELL)).toBe(false);
    expect(isInside([-1, 5], ELL)).toBe(false);
    expect(isInside([5, 5], [])).toBe(false);
  });
});

describe("uncertainty of an area from picking its corners", () => {
  it("is worked out by hand for a square", () => {
    // Each corner of a square of side a moves the area by a/2 in x and in y; four corners:
    // u(A) = u root(4 (2 (a/2)^2)) = u a root(2).
    expect(polygonPickUncertaintyPx2(SQUARE, 0.5)).toBeCloseTo(0.5 * 10 * Math.SQRT2, 12);
  });

  it("counts a corner given twice in a row once", () => {
    const doubled = SQUARE.flatMap((corner) => [corner, corner]);
    expect(polygonPickUncertaintyPx2(doubled, 0.5)).toBe(polygonPickUncertaintyPx2(SQUARE, 0.5));
  });
});

describe("two pieces of line", () => {
  it.each<[string, [Point, Point, Point, Point], boolean]>([
    [
      "cross",
      [
        [0, 0],
        [10, 10],
        [0, 10],
        [10, 0],
      ],
      true,
    ],
    [
      "lie apart",
      [
        [0, 0],
        [10, 0],
        [0, 5],
        [10, 5],
      ],
      false,
    ],
    [
      "would cross if they were longer",
      [
        [0, 0],
        [4, 4],
        [0, 10],
        [10, 0],
      ],
      false,
    ],
    [
      "share an end",
      [
        [0, 0],
        [5, 5],
        [5, 5],
        [9, 0],
      ],
      true,
    ],
    [
      "touch with an end in the middle",
      [
        [0, 0],
        [10, 0],
        [5, 0],
        [5, 8],
      ],
      true,
    ],
    [
      "lie on one line and overlap",
      [
        [0, 0],
        [6, 0],
        [4, 0],
        [9, 0],
      ],
      true,
    ],
    [
      "lie on one line apart",
      [
        [0, 0],
        [3, 0],
        [4, 0],
        [9, 0],
      ],
      false,
    ],
  ])("that %s", (_what, [a, b, c, d], meet) => {
    expect(segmentsMeet(a, b, c, d)).toBe(meet);
    expect(segmentsMeet(c, d, a, b)).toBe(meet);
    expect(segmentsMeet(b, a, d, c)).toBe(meet);
  });
});

describe("an edge that goes round once", () => {
  const bowTie: Point[] = [
    [0, 0],
    [10, 10],
    [10, 0],
    [0, 10],
  ];
  const star = [0, 2, 4, 1, 3].map((i): Point => regular(5)[i] ?? [0, 0]);

  it.each<[string, Point[], boolean]>([
    ["a square", SQUARE, false],
    ["an L", ELL, false],
    [
      "a triangle",
      [
        [0, 0],
        [9, 0],
        [0, 9],
      ],
      false,
    ],
    ["a bow tie", bowTie, true],
    ["a five-pointed star", star, true],
    [
      "a spike that runs back along itself",
      [
        [0, 0],
        [10, 0],
        [20, 0],
        [10, 0],
        [10, 10],
      ],
      true,
    ],
    [
      "a waist that touches itself",
      [
        [0, 0],
        [10, 0],
        [5, 5],
        [10, 10],
        [0, 10],
        [5, 5],
      ],
      true,
    ],
    [
      "corners in the middle of a straight side",
      [
        [0, 0],
        [5, 0],
        [10, 0],
        [10, 10],
      ],
      false,
    ],
    ["a corner given twice", [...SQUARE.slice(0, 2), [10, 0], ...SQUARE.slice(2)], false],
    ["every corner given three times", SQUARE.flatMap((c): Point[] => [c, c, c]), false],
    ["an edge closed with its first corner", [...SQUARE, [0, 0]], false],
    ["a bow tie with corners given twice", bowTie.flatMap((c) => [c, c]), true],
    [
      "one place",
      [
        [3, 3],
        [3, 3],
        [3, 3],
      ],
      false,
    ],
  ])("%s", (_what, points, crosses) => {
    expect(crossesItself(points)).toBe(crosses);
    expect(crossesItself(points.toReversed())).toBe(crosses);
  });

  it("does not change its answer for repeated corners, whatever the shape", () => {
    const place = fc.tuple(fc.integer({ min: 0, max: 12 }), fc.integer({ min: 0, max: 12 }));
    fc.assert(
      fc.property(
        fc.array(place, { minLength: 3, maxLength: 9 }),
        fc.nat(8),
        fc.integer({ min: 2, max: 4 }),
        (points, at, times) => {
          const repeated = points.flatMap((point, i) =>
            i === at % points.length ? Array.from({ length: times }, () => point) : [point],
          );
          expect(crossesItself(repeated)).toBe(crossesItself(points));
        },
      ),
    );
  });

  it("agrees with comparing every side with every other", () => {
    const place = fc.tuple(fc.integer({ min: 0, max: 30 }), fc.integer({ min: 0, max: 30 }));
    fc.assert(
      fc.property(
        fc.uniqueArray(place, { minLength: 4, maxLength: 9, selector: String }),
        (all) => {
          const count = all.length;
          const at = (i: number): Point => all[i % count] ?? [0, 0];
          let meets = false;
          for (let i = 0; i < count; i += 1) {
            for (let j = i + 2; j < count; j += 1) {
              if ((j + 1) % count !== i) meets ||= segmentsMeet(at(i), at(i + 1), at(j), at(j + 1));
            }
          }
          if (meets) expect(crossesItself(all)).toBe(true);
          // Without two sides that meet, only neighbours that fold back are left.
          else if (crossesItself(all)) {
            const folds = all.some((_, i) => {
              const [a, b, c] = [at(i), at(i + 1), at(i + 2)];
              return (
                (b[0] - a[0]) * (c[1] - a[1]) === (b[1] - a[1]) * (c[0] - a[0]) &&
                (a[0] - b[0]) * (c[0] - b[0]) + (a[1] - b[1]) * (c[1] - b[1]) > 0
              );
            });
            expect(folds).toBe(true);
          }
        },
      ),
    );
  });

  it("answers for the most corners a mark may have", () => {
    expect(crossesItself(regular(5000, 400))).toBe(false);
    const crossed = regular(5000, 400);
    [crossed[10], crossed[2400]] = [crossed[2400] ?? [0, 0], crossed[10] ?? [0, 0]];
    expect(crossesItself(crossed)).toBe(true);
  });
});
