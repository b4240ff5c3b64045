import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  angleDeg,
  anglePickUncertaintyDeg,
  bearingDeg,
  smallestArcDeg,
  wrapDeg,
} from "@/lib/imaging/angle";
import type { Point } from "@/lib/imaging/point";

const place = fc.tuple(fc.integer({ min: 0, max: 4000 }), fc.integer({ min: 0, max: 4000 }));

describe("an angle at a corner", () => {
  // Angles of well-known triangles; mathematics.
  it.each<[string, Point, Point, Point, number]>([
    ["a right angle", [10, 0], [0, 0], [0, 10], 90],
    ["half of one", [10, 0], [0, 0], [10, 10], 45],
    ["a straight line", [10, 0], [0, 0], [-10, 0], 180],
    ["two arms on one line", [10, 0], [0, 0], [25, 0], 0],
    ["the corner of an equilateral triangle", [2, 0], [0, 0], [1, Math.sqrt(3)], 60],
    ["the smaller angle of 3, 4, 5", [4, 0], [0, 0], [4, 3], 36.869_897_645_844],
  ])("of %s", (_what, arm, corner, otherArm, expected) => {
    expect(angleDeg(arm, corner, otherArm)).toBeCloseTo(expected, 10);
    expect(angleDeg(otherArm, corner, arm)).toBeCloseTo(expected, 10);
  });

  it("is refused where an arm has no length", () => {
    expect(angleDeg([1, 1], [1, 1], [5, 5])).toBeNull();
    expect(angleDeg([5, 5], [1, 1], [1, 1])).toBeNull();
    expect(anglePickUncertaintyDeg([1, 1], [1, 1], [5, 5], 0.5)).toBeNull();
  });

  it("sums to 180 degrees in every triangle", () => {
    fc.assert(
      fc.property(place, place, place, (a, b, c) => {
        const all = [angleDeg(b, a, c), angleDeg(a, b, c), angleDeg(a, c, b)];
        const known = all.filter((angle) => angle !== null);
        if (known.length === 3) {
          expect(known.reduce((sum, angle) => sum + angle, 0)).toBeCloseTo(180, 6);
        }
      }),
    );
  });

  it("is uncertain by what its three points are, worked out by hand for a right angle", () => {
    // Arms of 100 px: the ends give 1/100 each, the corner root of 2/100^2 at 90 degrees, so
    // u = 0.5 root(4) / 100 rad = 0.01 rad = 0.573 degrees.
    expect(anglePickUncertaintyDeg([100, 0], [0, 0], [0, 100], 0.5)).toBeCloseTo(0.572_957_8, 6);
    // Straight on, the corner counts double: root(1 + 1 + 4) = 2.449.
    expect(anglePickUncertaintyDeg([100, 0], [0, 0], [-100, 0], 1)).toBeCloseTo(1.403_454_2, 6);
    // Ten times the arms, a tenth of the uncertainty.
    const near = anglePickUncertaintyDeg([30, 0], [0, 0], [20, 20], 1) ?? NaN;
    const far = anglePickUncertaintyDeg([300, 0], [0, 0], [200, 200], 1) ?? NaN;
    expect(near / far).toBeCloseTo(10, 10);
  });
});

describe("a direction on a picture", () => {
  // y goes down, so up is less y: a clock face.
  it.each<[Point, number]>([
    [[50, 0], 0],
    [[100, 50], 90],
    [[50, 100], 180],
    [[0, 50], 270],
    [[0, 0], 315],
  ])("to %s is %i degrees from straight up, clockwise", (to, expected) => {
    expect(bearingDeg([50, 50], to)).toBeCloseTo(expected, 10);
  });

  it("is none between a place and itself", () => {
    expect(bearingDeg([3, 3], [3, 3])).toBeNull();
  });

  it("stays from 0 up to 360 degrees", () => {
    expect([-90, 360, 725, -720, -1e-15].map(wrapDeg)).toEqual([270, 0, 5, 0, 0]);
    fc.assert(
      fc.property(place, place, (from, to) => {
        const bearing = bearingDeg(from, to);
        if (bearing !== null) {
          expect(bearing).toBeGreaterThanOrEqual(0);
          expect(bearing).toBeLessThan(360);
        }
      }),
    );
  });
});

describe("the arc that holds all directions", () => {
  it.each([
    [[], null],
    [[40], 0],
    [[10, 55], 45],
    [[350, 10], 20],
    [[0, 180], 180],
    [[200, 222, 245, 249], 49],
    [[0, 120, 240], 240],
    [[90, 90, 90], 0],
  ])("of %j is %j degrees", (directions, expected) => {
    expect(smallestArcDeg(directions)).toBe(expected);
  });

  it("is the same however the picture is turned and whichever was drawn first", () => {
    const directions = fc.array(fc.integer({ min: 0, max: 359 }), { minLength: 1, maxLength: 12 });
    fc.assert(
      fc.property(directions, fc.integer({ min: 0, max: 719 }), (given, turn) => {
        const turned = given.map((direction) => direction + turn).reverse();
        expect(smallestArcDeg(turned)).toBe(smallestArcDeg(given));
      }),
    );
  });
});
