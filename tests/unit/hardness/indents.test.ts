import { describe, expect, it } from "vitest";
import { brinellHardness, brinellIndentDepthMm } from "@/lib/hardness/brinell";
import { brinellIndexVerdict } from "@/lib/hardness/brinell-force-index";
import {
  hardnessSymbol,
  testForceN,
  VICKERS_FORCES,
  vickersForceRange,
} from "@/lib/hardness/forces";
import { knoopDiagonalMm, knoopHardness } from "@/lib/hardness/knoop";
import { hardnessStatement, reportedHardness } from "@/lib/hardness/report-rounding";
import { vickersDiagonalMm, vickersHardness } from "@/lib/hardness/vickers";
import { NEWTONS_PER_KGF } from "@/lib/units/force";

function warningCodes(
  result: { verdict: "refuse" } | { warnings: readonly { readonly code: string }[] },
) {
  return "warnings" in result ? result.warnings.map(({ code }) => code) : ["refused"];
}

describe("Vickers", () => {
  it("takes the mean of the two diagonals", () => {
    const result = vickersHardness({ forceN: 9.807, diagonalsMm: [0.0542, 0.0546] });
    expect(result.verdict).toBe("ok");
    expect("hv" in result && result.meanDiagonalMm).toBeCloseTo(0.0544, 10);
    expect("hv" in result && result.hv).toBeCloseTo(626.7, 1);
  });

  it("refuses a size or force that is not above zero, and a curved surface", () => {
    for (const diagonal of [0, -0.1, NaN, Infinity])
      expect(vickersHardness({ forceN: 98.07, diagonalsMm: [0.1, diagonal] }).verdict).toBe(
        "refuse",
      );
    expect(vickersHardness({ forceN: 0, diagonalsMm: [0.1] }).verdict).toBe("refuse");
    const curved = { forceN: 98.07, diagonalsMm: [0.2] as const, isCurvedSurface: true };
    expect(vickersHardness(curved)).toMatchObject({ verdict: "refuse", code: "curved_surface" });
  });

  it("warns of small, large and unequal diagonals but gives the value", () => {
    const of = (...diagonalsMm: [number, number]) =>
      warningCodes(vickersHardness({ forceN: 9.807, diagonalsMm }));
    expect(of(0.019, 0.019)).toEqual(["diagonal_small"]);
    expect(of(1.41, 1.41)).toEqual(["diagonal_large"]);
    expect(of(0.05, 0.053)).toEqual(["diagonals_differ"]);
    expect(of(0.02, 0.02)).toEqual([]);
    expect(of(0.1, 0.105)).toEqual([]);
  });

  it("leads from hardness back to the diagonal", () => {
    expect(vickersDiagonalMm(463.625925, 98.07)).toBeCloseTo(0.2, 6);
    expect(knoopDiagonalMm(569.19828, 0.9807)).toBeCloseTo(0.05, 6);
  });
});

describe("Knoop and Brinell", () => {
  it("refuses sizes that cannot be", () => {
    expect(knoopHardness({ forceN: 1, longDiagonalMm: 0 }).verdict).toBe("refuse");
    const ball = { forceN: 29420, ballDiameterMm: 10 };
    expect(brinellHardness({ ...ball, indentDiameterMm: 10 })).toMatchObject({
      verdict: "refuse",
      code: "indent_not_below_ball",
    });
    expect(brinellHardness({ ...ball, forceN: -1, indentDiameterMm: 4 }).verdict).toBe("refuse");
    expect(brinellIndentDepthMm(0, 4)).toMatchObject({ verdict: "refuse" });
  });

  it("gives a Brinell value outside 0.24 to 0.6 D with a warning", () => {
    const result = brinellHardness({ forceN: 29420, ballDiameterMm: 10, indentDiameterMm: 6.1 });
    expect(warningCodes(result)).toEqual(["diameter_ratio"]);
    expect("hbw" in result && result.hbw).toBeGreaterThan(0);
  });

  it("asks for special agreement when force and ball do not suit the material", () => {
    const verdict = (forceN: number, ballDiameterMm: number, hbw?: number) =>
      warningCodes(brinellIndexVerdict({ forceN, ballDiameterMm, material: "copper", hbw }));
    expect(verdict(9807, 10, 120)).toEqual([]);
    expect(verdict(9807, 10, 35)).toEqual([]);
    expect(verdict(9807, 10, 201)).toEqual(["index_not_for_material"]);
    expect(verdict(9807, 5, 120)).toEqual(["index_not_standard"]);
    expect(verdict(9807, 10)).toEqual(["hardness_not_given"]);
    const iron = { forceN: 294.2, ballDiameterMm: 1, material: "cast_iron", hbw: 180 } as const;
    expect(warningCodes(brinellIndexVerdict(iron))).toEqual(["ball_too_small"]);
  });
});

describe("forces and how a hardness is written", () => {
  it("knows the nominal forces to the four figures printed", () => {
    for (const { forceKgf, forceN, symbol } of VICKERS_FORCES) {
      expect(Math.abs(forceN / (forceKgf * NEWTONS_PER_KGF) - 1)).toBeLessThan(0.0005);
      expect(symbol).toBe(`HV${forceKgf}`);
    }
    expect(testForceN(1)).toBe(9.807);
    expect(testForceN(0.75)).toBeCloseTo(7.3549875, 9);
  });

  it("names the three ranges of force", () => {
    expect([0.9807, 1.961, 9.807, 49.03].map(vickersForceRange)).toEqual([
      "micro",
      "low force",
      "low force",
      "macro",
    ]);
  });

  it("writes load and unusual dwell with the symbol", () => {
    expect(hardnessSymbol({ method: "vickers", loadKgf: 1 })).toBe("HV1");
    expect(hardnessSymbol({ method: "knoop", loadKgf: 0.5, dwellS: 15 })).toBe("HK0.5");
    expect(hardnessSymbol({ method: "vickers", loadKgf: 30, dwellS: 20 })).toBe("HV30/20");
    expect(hardnessSymbol({ method: "vickers", loadKgf: 0.75 })).toBe("HV (7.355\u00a0N)");
    expect(hardnessStatement(463.63, "HV", "HV10")).toBe("464\u00a0HV10");
  });

  it.each([
    [99.96, "HV", "100"],
    [9.996, "HV", "10.0"],
    [412.5, "HV", "412"],
    [99.96, "HBW", "100"],
    [8.123, "HBW", "8.12"],
  ] as const)("reports %s %s as %s", (value, scale, text) => {
    expect(reportedHardness(value, scale)).toBe(text);
  });

  it("reports no number that is not one", () => {
    expect(reportedHardness(NaN, "HV")).toBeNull();
  });
});
