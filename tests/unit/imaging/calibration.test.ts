import { describe, expect, it } from "vitest";
import {
  areaMm2,
  LEAST_SCALE_PX,
  lengthMm,
  pixelSizeFromFile,
  pixelSizeFromTwoPoints,
} from "@/lib/imaging/calibration";
import type { Point } from "@/lib/imaging/point";
import { COVERAGE_FACTOR } from "@/lib/imaging/uncertainty";

/** 10 mm over 1000 px: 10 µm a pixel. */
const TEN_MM = {
  points: [
    [100, 500],
    [1100, 500],
  ] as [Point, Point],
  knownDistanceMm: 10,
  knownDistanceUncertaintyMm: 0.02,
  pickUncertaintyPx: 1,
};

function size(input: Partial<typeof TEN_MM>) {
  const answer = pixelSizeFromTwoPoints({ ...TEN_MM, ...input });
  if ("verdict" in answer) throw new Error(answer.reason);
  return answer;
}

describe("the scale from two points", () => {
  it("is distance over pixels, uncertain by both, worked out by hand", () => {
    // u(D)/D = 0.01 / 10 = 0.001; u(N)/N = root(2) 0.5 / 1000 = 0.000 707 1;
    // together 0.001 224 7, times k = 2.
    expect(size({}).umPerPx).toBe(10);
    expect(size({}).relativeUncertainty).toBeCloseTo(2 * 0.001_224_744_9, 9);
  });

  it("is that of the distance alone where picking costs nothing, and of the picks alone for an exact distance", () => {
    expect(size({ pickUncertaintyPx: 0 }).relativeUncertainty).toBeCloseTo(0.002, 12);
    expect(size({ knownDistanceUncertaintyMm: 0 }).relativeUncertainty).toBeCloseTo(
      Math.SQRT2 / 1000,
      12,
    );
  });

  it("is taken along a slanted line as well", () => {
    // 3, 4, 5: 1500 px for 15 mm.
    const slanted: [Point, Point] = [
      [0, 0],
      [900, 1200],
    ];
    expect(size({ points: slanted, knownDistanceMm: 15 }).umPerPx).toBe(10);
  });

  it("is refused for points too near each other", () => {
    const apart = (px: number) =>
      pixelSizeFromTwoPoints({
        ...TEN_MM,
        points: [
          [0, 0],
          [px, 0],
        ],
      });
    expect(apart(LEAST_SCALE_PX - 0.5)).toMatchObject({ verdict: "refuse", code: "too_near" });
    expect(apart(0)).toMatchObject({ verdict: "refuse", code: "too_near" });
    expect(apart(LEAST_SCALE_PX)).toMatchObject({ umPerPx: 500 });
  });

  it.each([
    ["no distance", { knownDistanceMm: 0 }, "not_positive"],
    ["a distance below zero", { knownDistanceMm: -3 }, "not_positive"],
    ["a distance that is no number", { knownDistanceMm: NaN }, "not_positive"],
    ["a distance without end", { knownDistanceMm: Infinity }, "not_positive"],
    ["an uncertainty below zero", { knownDistanceUncertaintyMm: -0.1 }, "bad_uncertainty"],
    ["an uncertainty that is no number", { knownDistanceUncertaintyMm: NaN }, "bad_uncertainty"],
    ["a pick below zero", { pickUncertaintyPx: -1 }, "bad_uncertainty"],
    ["a pick without end", { pickUncertaintyPx: Infinity }, "bad_uncertainty"],
    [
      "a point that is no place",
      {
        points: [
          [NaN, 0],
          [9, 9],
        ] as [Point, Point],
      },
      "not_a_place",
    ],
    [
      "a point without end",
      {
        points: [
          [Infinity, 0],
          [9, 9],
        ] as [Point, Point],
      },
      "not_a_place",
    ],
  ])("is refused for %s", (_what, change, code) => {
    const answer = pixelSizeFromTwoPoints({ ...TEN_MM, ...change });
    expect(answer).toMatchObject({ verdict: "refuse", code });
    expect(answer).not.toHaveProperty("umPerPx");
  });
});

describe("the scale from the file", () => {
  it("is the mean of both directions with the uncertainty that a person states", () => {
    expect(pixelSizeFromFile({ umPerPxX: 10, umPerPxY: 10.04 }, 0.02)).toEqual({
      umPerPx: 10.02,
      relativeUncertainty: 0.02,
    });
  });

  it.each([
    [null, 10, 0.02, "no_resolution"],
    [10, null, 0.02, "no_resolution"],
    [0, 10, 0.02, "no_resolution"],
    [NaN, 10, 0.02, "no_resolution"],
    [10, 10.06, 0.02, "not_square"],
    [20, 10, 0.02, "not_square"],
    [10, 10, -0.02, "bad_uncertainty"],
    [10, 10, NaN, "bad_uncertainty"],
  ])("is refused for %s by %s with %s", (umPerPxX, umPerPxY, stated, code) => {
    expect(pixelSizeFromFile({ umPerPxX, umPerPxY }, stated)).toMatchObject({
      verdict: "refuse",
      code,
    });
  });
});

describe("lengths and areas in millimetres", () => {
  const scale = { umPerPx: 10, relativeUncertainty: 0.01 };

  it("gives a length with what the scale and the picks leave open, worked out by hand", () => {
    // 1000 px of 10 µm: 10 mm. From the scale 10 x 0.005 = 0.05, from the picks 0.01 x 3 = 0.03;
    // root of squares 0.058 31, times 2.
    const { value, expandedUncertainty } = lengthMm(1000, 3, scale);
    expect(value).toBe(10);
    expect(expandedUncertainty).toBeCloseTo(COVERAGE_FACTOR * 0.058_309_519, 8);
  });

  it("gives an area with twice the share of the scale", () => {
    // 1000 px2 of (10 µm)2: 0.1 mm2; from the scale 2 x 0.1 x 0.005 = 0.001, from the picks
    // 40 px2 x 0.0001 = 0.004; root of squares 0.004 123, times 2.
    const { value, expandedUncertainty } = areaMm2(1000, 40, scale);
    expect(value).toBeCloseTo(0.1, 12);
    expect(expandedUncertainty).toBeCloseTo(COVERAGE_FACTOR * 0.004_123_106, 8);
  });

  it("finds the known distance again between the points it was set from", () => {
    const set = size({});
    const { value } = lengthMm(1000, 0, set);
    expect(value).toBeCloseTo(TEN_MM.knownDistanceMm, 12);
  });
});
