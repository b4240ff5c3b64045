import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { distancePx, type Point, polylineLengthPx, withoutRepeats } from "@/lib/imaging/point";
import { combined, lengthPickUncertaintyPx, tiltShortfall } from "@/lib/imaging/uncertainty";

describe("lengths in pixels", () => {
  // Pythagorean triples; mathematics.
  it.each<[Point, Point, number]>([
    [[0, 0], [3, 4], 5],
    [[-2, 7], [-2, 7], 0],
    [[10, 10], [5, -2], 13],
    [[1e6, 0], [0, 0], 1e6],
  ])("from %s to %s are %d px", (a, b, apart) => {
    expect(distancePx(a, b)).toBe(apart);
    expect(distancePx(b, a)).toBe(apart);
  });

  it("of a line are the sum of its pieces, and 0 for fewer than two points", () => {
    expect(polylineLengthPx([])).toBe(0);
    expect(polylineLengthPx([[9, 9]])).toBe(0);
    // 5 and 12, added by hand.
    const line: Point[] = [
      [0, 0],
      [3, 4],
      [3, 16],
    ];
    expect(polylineLengthPx(line)).toBe(17);
    expect(polylineLengthPx(line.toReversed())).toBe(17);
  });

  it("leave out corners that repeat the one before, round the end too", () => {
    const square: Point[] = [
      [0, 0],
      [4, 0],
      [4, 4],
      [0, 4],
    ];
    expect(withoutRepeats(square)).toEqual(square);
    expect(withoutRepeats(square.flatMap((corner) => [corner, corner]))).toEqual(square);
    expect(withoutRepeats([...square, [0, 0]])).toHaveLength(4);
    expect(withoutRepeats([[1, 1]])).toEqual([[1, 1]]);
    expect(withoutRepeats([])).toEqual([]);
  });
});

describe("uncertainty of a length from picking its points", () => {
  it("adds independent parts as a root of squares", () => {
    expect(combined(3, 4)).toBe(5);
    expect(combined(1, 2, 2)).toBe(3);
    expect(combined()).toBe(0);
  });

  it("is root two of one pick for two ends", () => {
    // By hand: each end moves the length one for one along the line, and not at all across it.
    const line: Point[] = [
      [0, 0],
      [100, 0],
    ];
    expect(lengthPickUncertaintyPx(line, 0.5)).toBeCloseTo(Math.SQRT2 * 0.5, 12);
  });

  it("leaves out a point in the middle of a straight line, and counts it twice at a hairpin", () => {
    const straight: Point[] = [
      [0, 0],
      [50, 0],
      [100, 0],
    ];
    expect(lengthPickUncertaintyPx(straight, 1)).toBeCloseTo(Math.SQRT2, 12);
    // By hand: ends 1 and 1, the turning point 2; root of 1 + 1 + 4.
    const hairpin: Point[] = [
      [0, 0],
      [100, 0],
      [0, 0],
    ];
    expect(lengthPickUncertaintyPx(hairpin, 1)).toBeCloseTo(Math.sqrt(6), 12);
    // By hand: a right angle moves both pieces, each one for one, at right angles: root of 2.
    const corner: Point[] = [
      [0, 0],
      [100, 0],
      [100, 100],
    ];
    expect(lengthPickUncertaintyPx(corner, 1)).toBeCloseTo(2, 12);
  });

  it("is a number still where two points are one", () => {
    const doubled: Point[] = [
      [0, 0],
      [0, 0],
      [10, 0],
    ];
    expect(lengthPickUncertaintyPx(doubled, 1)).toBeCloseTo(Math.SQRT2, 12);
  });

  it("agrees with moving every point by chance", () => {
    // A plain simulation with a fixed row of normal deviates stands against the propagation.
    const line: Point[] = [
      [0, 0],
      [400, 90],
      [700, 500],
      [650, 900],
    ];
    let seed = 7;
    const uniform = () => (seed = (seed * 48_271) % 2_147_483_647) / 2_147_483_647;
    const normal = () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
    const truth = polylineLengthPx(line);
    let squares = 0;
    const runs = 20_000;
    for (let i = 0; i < runs; i += 1) {
      const moved = line.map(([x, y]): Point => [x + 0.5 * normal(), y + 0.5 * normal()]);
      squares += (polylineLengthPx(moved) - truth) ** 2;
    }
    expect(Math.sqrt(squares / runs) / lengthPickUncertaintyPx(line, 0.5)).toBeCloseTo(1, 1);
  });
});

describe("a tilted face", () => {
  // 1 - cos; cosines of a mathematical table.
  it.each([
    [0, 0],
    [10, 0.0152],
    [30, 0.134],
    [45, 0.2929],
    [60, 0.5],
  ])("at %i degrees reads short by %d of the length across the tilt", (tiltDeg, share) => {
    expect(tiltShortfall(tiltDeg)).toBeCloseTo(share, 4);
  });

  it("reads short by the same to either side, and never long", () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 80, noNaN: true }), (tiltDeg) => {
        expect(tiltShortfall(-tiltDeg)).toBe(tiltShortfall(tiltDeg));
        expect(tiltShortfall(tiltDeg)).toBeGreaterThanOrEqual(0);
      }),
    );
  });
});
