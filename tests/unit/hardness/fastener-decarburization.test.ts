import { describe, expect, it } from "vitest";
import { effectiveCaseHrc } from "@/lib/hardness/effective-case";
import {
  fastenerSurfaceVerdict,
  hardnessMethodApplies,
  leastThreadHeightUm,
  threadHeightVerdict,
  threePointVerdict,
} from "@/lib/hardness/fastener-decarburization";

describe("decarburization of fasteners", () => {
  it("computes the least height for a pitch that is not printed", () => {
    // H1 = (17/24)(sqrt 3 / 2) 1.1 = 0.675 mm, half of it 0.3375, by hand.
    expect(leastThreadHeightUm(1.1, "8.8")).toBe(338);
    expect(leastThreadHeightUm(0, "8.8")).toMatchObject({ verdict: "refuse" });
  });

  it("keeps every printed height within a micrometre of the thread geometry", () => {
    for (const pitch of [0.5, 0.8, 1, 1.25, 2, 3, 4]) {
      const h1 = (17 / 24) * (Math.sqrt(3) / 2) * pitch * 1000;
      expect(Math.abs(Number(leastThreadHeightUm(pitch, "10.9")) - (2 / 3) * h1)).toBeLessThan(
        1.01,
      );
      expect(Math.abs(Number(leastThreadHeightUm(pitch, "12.9")) - (3 / 4) * h1)).toBeLessThan(
        1.01,
      );
    }
  });

  it("compares heights in whole micrometres", () => {
    const ask = (heightMm: number) =>
      threadHeightVerdict({ pitchMm: 1, propertyClass: "10.9", heightMm });
    expect([ask(0.4089), ask(0.409), ask(0.4084)]).toEqual(["pass", "pass", "fail"]);
    expect(ask(NaN)).toMatchObject({ verdict: "refuse" });
  });

  it("names both conditions when both fail", () => {
    expect(threePointVerdict(390, 350, 425)).toBe("fail_decarburized+carburized");
    expect(threePointVerdict(390, 0, 425)).toMatchObject({ verdict: "refuse" });
  });

  it("points softer classes to the microscopic method", () => {
    expect(hardnessMethodApplies(2, "5.6")).toMatchObject({ code: "use_microscopic_method" });
  });

  it("limits the surface of class 8.8 by its core alone", () => {
    const verdict = (surfaceHv: number) =>
      fastenerSurfaceVerdict({ coreHv: 380, surfaceHv, propertyClass: "8.8" });
    expect([verdict(410), verdict(411)]).toEqual(["pass", "fail"]);
  });
});

describe("effective case of flame and induction hardened parts", () => {
  it("rounds carbon as decimal text before the look-up", () => {
    expect(["0.275", "0.285", "0.52", "0.525", "0.60"].map(effectiveCaseHrc)).toEqual([
      35, 35, 45, 45, 50,
    ]);
    expect(effectiveCaseHrc("low")).toMatchObject({ verdict: "refuse" });
  });
});
