import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { caseDepth, twoDepthCaseDepth } from "@/lib/hardness/case-depth";
import { hardnessAtDepth, iterateCore } from "@/lib/hardness/core-hardness";
import { decarburizationDepth } from "@/lib/hardness/decarburization";
import { isChdLimitStep, proposedDepthKind } from "@/lib/hardness/depth-limits";
import { depthExpandedUncertaintyMm } from "@/lib/hardness/depth-uncertainty";
import { orderTraverse, taperDepthMm, trackMeans } from "@/lib/hardness/traverse-points";

const points = (...pairs: [number, number][]) =>
  pairs.map(([depthMm, hardness]) => ({ depthMm, hardness }));

describe("case depth", () => {
  it("lies on the straight line between the two readings around the limit", () => {
    const depth = caseDepth({ points: points([1, 533], [0.8, 601]), limit: 550 });
    expect(depth).toMatchObject({ verdict: "ok" });
    expect("depthMm" in depth && depth.depthMm).toBeCloseTo(0.95, 10);
  });

  it("counts a reading on the limit as reaching it", () => {
    const depth = caseDepth({ points: points([0.5, 550], [1, 500]), limit: 550 });
    expect("depthMm" in depth && depth.depthMm).toBe(0.5);
    const never = caseDepth({ points: points([0.5, 600], [1, 550]), limit: 550 });
    expect(never).toEqual({ verdict: "beyond_last_reading", deepestMm: 1 });
  });

  it("does not turn a limit that is never reached into zero", () => {
    expect(caseDepth({ points: points([0.1, 500], [0.2, 480]), limit: 550 })).toEqual({
      verdict: "not_reached",
    });
  });

  it("gives the first of several crossings and names the last", () => {
    const depth = caseDepth({
      points: points([0.15, 700], [0.3, 540], [0.5, 600], [0.7, 500]),
      limit: 550,
    });
    expect(depth).toMatchObject({ verdict: "warn", warnings: [{ code: "several_crossings" }] });
    expect("crossings" in depth && depth.crossings).toHaveLength(2);
  });

  it("remarks upon a soft skin", () => {
    const depth = caseDepth({ points: points([0.1, 540], [0.2, 600], [0.4, 500]), limit: 550 });
    expect(depth).toMatchObject({ warnings: [{ code: "surface_below_limit" }] });
  });

  it("always lies between the readings that bracket it", () => {
    const hardness = fc.double({ min: 200, max: 900, noNaN: true });
    fc.assert(
      fc.property(fc.array(hardness, { minLength: 2, maxLength: 30 }), (values) => {
        const series = values.map((value, index) => ({
          depthMm: (index + 1) / 10,
          hardness: value,
        }));
        const depth = caseDepth({ points: series, limit: 550 });
        if (!("crossings" in depth)) return;
        for (const { depthMm, above, below } of depth.crossings) {
          expect(depthMm).toBeGreaterThanOrEqual(above.depthMm);
          expect(depthMm).toBeLessThanOrEqual(below.depthMm);
        }
      }),
    );
  });

  it.each([
    [points([0.1, 600]), "too_few_readings"],
    [points([0.1, 600], [0.2, NaN]), "not_a_number"],
    [points([0.1, 600], [0.2, 0]), "not_a_number"],
    [points([-0.1, 600], [0.2, 500]), "negative_depth"],
    [points([0.2, 600], [0.2, 500]), "equal_depths"],
  ])("refuses readings that make no curve (%#)", (series, code) => {
    expect(caseDepth({ points: series, limit: 550 })).toMatchObject({ verdict: "refuse", code });
  });

  it("takes equal depths only from different tracks", () => {
    const series = (tracks: (string | undefined)[]) =>
      tracks.map((track) => ({ depthMm: 0.2, hardness: 600, track }));
    expect(orderTraverse(series(["1", "2"])).verdict).toBe("ok");
    expect(orderTraverse(series(["1", "1"])).verdict).toBe("refuse");
    expect(orderTraverse(series(["1", undefined])).verdict).toBe("refuse");
    expect(orderTraverse(series([undefined, "1"])).verdict).toBe("refuse");
  });

  it("averages tracks only at equal depths", () => {
    const series = [
      { depthMm: 0.5, hardness: 640, track: "1" },
      { depthMm: 0.5, hardness: 650, track: "2" },
      { depthMm: 0.7, hardness: 580, track: "1" },
    ];
    expect(trackMeans(series)).toEqual(points([0.5, 645], [0.7, 580]));
  });

  it("asks for the angle of a taper section", () => {
    expect(taperDepthMm(2, undefined)).toMatchObject({ code: "no_section_angle" });
    expect(taperDepthMm(2, Math.sin(Math.PI / 6))).toBeCloseTo(1, 10);
  });
});

describe("two-depth method", () => {
  const five = (value: number) => [value, value, value, value, value];
  const ask = (d1: number, h1: number[], d2: number, h2: number[]) =>
    twoDepthCaseDepth({
      shallow: { depthMm: d1, hardness: h1 },
      deep: { depthMm: d2, hardness: h2 },
      limit: 550,
    });

  it("takes depths up to 0.3 mm apart, five indents at each", () => {
    expect(ask(0.8, five(601), 1.1, five(533))).toMatchObject({ verdict: "ok" });
    expect(ask(0.8, five(601), 1.11, five(533))).toMatchObject({ code: "depths_too_far_apart" });
    expect(ask(0.8, [601, 600], 1, five(533))).toMatchObject({ code: "too_few_readings" });
    expect(ask(0.8, five(540), 1, five(533))).toMatchObject({ code: "limit_not_between" });
    expect(ask(1, five(601), 0.8, five(533))).toMatchObject({ code: "not_a_number" });
  });
});

describe("core hardness", () => {
  it("asks for a core value when no reading lies deeper than three depths", () => {
    const short = points([0.1, 800], [0.2, 700], [0.3, 420], [0.4, 400]);
    expect(iterateCore(short)).toMatchObject({ verdict: "refuse", code: "no_core_readings" });
  });

  it("warns when the core rests on one or two readings", () => {
    const found = iterateCore(points([0.1, 800], [0.2, 330], [0.4, 320], [1, 322]));
    expect(found).toMatchObject({ verdict: "warn", warnings: [{ code: "few_core_readings" }] });
  });

  it("reads the curve between readings and never beyond them", () => {
    const series = points([0.5, 600], [1, 500]);
    expect(hardnessAtDepth(series, 0.75)).toBe(550);
    expect(hardnessAtDepth(series, 1)).toBe(500);
    expect(hardnessAtDepth(series, 0.4)).toBeNull();
    expect(hardnessAtDepth(series, 1.01)).toBeNull();
  });
});

describe("limits of depth", () => {
  it("proposes the depth from the process", () => {
    expect(
      (["induction", "flame", "carburized", "carbonitrided", "nitrided", "none"] as const).map(
        proposedDepthKind,
      ),
    ).toEqual(["SHD", "SHD", "CHD", "CHD", "NHD", "none"]);
  });

  it("takes agreed CHD limits in steps of 25 HV", () => {
    expect([525, 600, 513].map(isChdLimitStep)).toEqual([true, true, false]);
  });
});

describe("uncertainty of a depth", () => {
  const bracket = {
    above: { depthMm: 1, hardness: 600 },
    below: { depthMm: 1.2, hardness: 500 },
    aboveStandardUncertainty: 10,
    belowStandardUncertainty: 10,
    positionStandardUncertaintyMm: 0,
  };

  it("is the uncertainty of the reading over the slope where the limit meets a reading", () => {
    // Slope 500 HV/mm; 10 HV gives 0.02 mm, k = 2 gives 0.04 mm. Worked by hand.
    expect(depthExpandedUncertaintyMm({ ...bracket, limit: 600 })).toBeCloseTo(0.04, 10);
  });

  it("is smaller between two independent readings, and grows with that of position and limit", () => {
    const middle = depthExpandedUncertaintyMm({ ...bracket, limit: 550 });
    expect(middle).toBeCloseTo(0.04 / Math.SQRT2, 10);
    const placed = { ...bracket, limit: 550, positionStandardUncertaintyMm: 0.02 };
    expect(depthExpandedUncertaintyMm(placed)).toBeCloseTo(0.04, 10);
    const limited = { ...bracket, limit: 600, limitStandardUncertainty: 10 };
    expect(depthExpandedUncertaintyMm(limited)).toBeCloseTo(0.04 * Math.SQRT2, 10);
  });
});

describe("decarburization", () => {
  const series = points(
    [0.1, 250],
    [0.2, 345],
    [0.3, 402],
    [0.4, 411],
    [0.6, 409],
    [0.9, 413],
    [1.2, 410],
  );
  const ask = (coreFromMm: number, kind = { kind: "plateau" } as const, from = series) =>
    decarburizationDepth({ points: from, coreFromMm, criterion: kind });

  it("says so when nothing falls outside the core, or everything still does", () => {
    expect(ask(0.4, { kind: "plateau" }, series.slice(3))).toMatchObject({
      verdict: "not_reached",
    });
    const offset = { kind: "offset_from_core", offsetHv: 50 } as const;
    const fell = points([0.1, 400], [0.2, 400], [0.3, 400], [0.4, 200]);
    expect(
      decarburizationDepth({ points: fell, coreFromMm: 0.1, criterion: offset }),
    ).toMatchObject({
      verdict: "beyond_last_reading",
      deepestMm: 0.4,
    });
  });

  it("needs four readings on the plateau and one in the core", () => {
    expect(ask(0.6)).toMatchObject({ code: "too_few_plateau_readings" });
    expect(ask(2)).toMatchObject({ code: "no_core_readings" });
  });
});
