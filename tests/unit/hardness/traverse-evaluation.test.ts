import { describe, expect, it } from "vitest";
import { evaluateTraverse } from "@/lib/hardness/traverse-evaluation";
import type { TraverseInput, TraverseReading } from "@/lib/hardness/traverse-input";

/** Depth mm, d1 um, d2 um of an induction hardened shaft at its fillet; invented. */
const SHAFT: readonly [number, number, number][] = [
  [0.1, 56.2, 55.2],
  [0.3, 54.2, 54.6],
  [0.5, 53.6, 53.0],
  [0.7, 54.3, 54.1],
  [0.9, 54.3, 55.1],
  [1.1, 55.4, 55.0],
  [1.3, 55.6, 56.2],
  [1.5, 57.4, 56.6],
  [1.7, 60.2, 58.4],
  [1.9, 62.9, 63.5],
  [2.06, 68.5, 67.5],
  [2.3, 72.4, 72.8],
  [2.55, 76.0, 75.4],
  [2.8, 77.1, 77.9],
  [3.1, 78.6, 78.2],
  [3.5, 79.0, 78.8],
  [4.0, 78.3, 78.7],
];

function shaftReadings(
  changes: Readonly<Record<number, Partial<TraverseReading>>> = {},
): TraverseReading[] {
  const edge = { leftOut: { reason: "too near the edge" } };
  return SHAFT.map(([depthMm, d1Um, d2Um], index) => {
    const number = index + 1;
    const change = { ...(number === 1 ? edge : {}), ...changes[number] };
    return { id: `r${number}`, depthMm, d1Um, d2Um, ...change };
  });
}

const shaft: TraverseInput = {
  method: "vickers",
  loadKgf: 1,
  spacingClass: "steel_copper",
  edgeReference: "surface",
  processKind: "induction",
  depthKind: "SHD",
  minSurfaceHv: 560,
  requiredDepthMm: { min: 2.5, max: 4 },
  diagonalUncertaintyUm: 0.37,
  positionUncertaintyMm: 0.025,
  surfaceReadingIds: ["r2", "r3", "r4", "r5"],
  coreReadingIds: ["r15", "r16", "r17"],
  readings: shaftReadings(),
};

const typed = (
  rows: readonly [depthMm: number, hardness: number, track?: string][],
): TraverseReading[] =>
  rows.map(([depthMm, enteredHardness, track], index) => ({
    id: `r${index + 1}`,
    depthMm,
    enteredHardness,
    track,
  }));

const codes = (items: readonly { readonly code: string }[]) => items.map(({ code }) => code);

describe("a surface hardened shaft", () => {
  const result = evaluateTraverse(shaft);

  it("computes each hardness from its two diagonals with its expanded uncertainty", () => {
    const rounded = result.readings.map(({ hardness }) => Math.round(hardness ?? NaN));
    expect(rounded).toEqual([
      598, 627, 653, 631, 620, 609, 593, 571, 527, 464, 401, 352, 324, 309, 302, 298, 301,
    ]);
    // U = 2 H (2 u / d) = 2 x 626.7 x 2 x 0.37 / 54.4, by hand.
    expect(result.readings[1]?.expandedUncertainty).toBeCloseTo(17.05, 2);
    expect(result.symbol).toBe("HV1");
  });

  it("finds the one pair that is too near: 0.160 mm against 2.5 d = 0.170 mm", () => {
    const pairs = result.spacing.findings.filter(({ kind }) => kind === "spacing");
    expect(pairs).toHaveLength(1);
    expect(pairs[0]).toMatchObject({ readingIds: ["r10", "r11"], standard: "ISO 2639" });
    expect(pairs[0]?.distanceMm).toBeCloseTo(0.16, 9);
    expect(pairs[0]?.requiredMm).toBeCloseTo(0.17, 9);
    expect(result.toSettle).toHaveLength(1);
    expect(result.toSettle[0]?.text).toBe(
      "Indents 10 and 11 are 0.160\u00a0mm apart. 2.5 × d is 0.170\u00a0mm (ISO 2639). SHD rests on both.",
    );
  });

  it("notes the indent left out near the edge", () => {
    expect(result.noted).toContainEqual({
      code: "too_near_edge",
      level: "noted",
      text: "Indent 1 is 0.10\u00a0mm from the edge. 2.5 × d is 0.139\u00a0mm (ISO 6507-1). Left out of the curve.",
      readingIds: ["r1"],
    });
  });

  it("states the depth to 0.8 of the minimum surface hardness, and that it fails", () => {
    const { depth } = result;
    expect(depth?.limit).toMatchObject({ limit: 448, basis: "448\u00a0HV = 0.8 of 560" });
    // 1.90 + 0.16 (464.3 - 448) / (464.3 - 401.1), by hand.
    expect(depth?.depth).toMatchObject({ verdict: "ok" });
    expect(depth && "depthMm" in depth.depth && depth.depth.depthMm).toBeCloseTo(1.9413, 3);
    expect(depth?.expandedUncertaintyMm).toBeGreaterThan(0.03);
    expect(depth?.expandedUncertaintyMm).toBeLessThan(0.06);
    expect(depth?.restsOn).toEqual(["r10", "r11"]);
    expect(depth?.requirement).toMatchObject({ word: "fail", isWithinUncertainty: false });
  });

  it("takes the shallowest valid indent as surface, and the mean that was asked for", () => {
    expect(result.surface.shallowest).toMatchObject({ readingId: "r2", depthMm: 0.3 });
    expect(result.surface.mean?.n).toBe(4);
    expect(result.surface.mean?.mean).toBeCloseTo(632.6, 1);
    expect(result.surface.requirement).toMatchObject({ word: "pass" });
  });

  it("gives the core with its number of readings and uncertainty", () => {
    expect(result.core).toMatchObject({ source: "readings", n: 3, remark: null });
    expect(result.core.hardness).toBeCloseTo(300.3, 0);
    expect(result.core.expandedUncertainty).toBeGreaterThan(5);
  });

  it("has no core of its own when the traverse ends before three depths", () => {
    const { core } = evaluateTraverse({ ...shaft, coreReadingIds: undefined });
    expect(core).toMatchObject({ source: null, hardness: null });
    expect(core.remark).toContain("three times the depth");
  });

  it("keeps a pair that was settled on the list, with its reason", () => {
    const readings = shaftReadings({ 11: { keptReason: "set in zigzag" } });
    const { toSettle, settled } = evaluateTraverse({ ...shaft, readings });
    expect(toSettle).toEqual([]);
    expect(settled).toHaveLength(1);
    expect(settled[0]?.text).toMatch(/Kept: set in zigzag$/);
  });

  it("judges a zigzag by the distance between centres", () => {
    const readings = shaftReadings({ 10: { lateralMm: 0 }, 11: { lateralMm: 0.06 } });
    expect(evaluateTraverse({ ...shaft, readings }).toSettle).toEqual([]);
  });

  it("only notes a pair that the depth does not rest on", () => {
    const readings = shaftReadings({ 14: { depthMm: 2.7 } });
    const { toSettle, noted } = evaluateTraverse({ ...shaft, readings });
    expect(toSettle).toHaveLength(1);
    const pair = noted.find(({ readingIds }) => readingIds.includes("r14"));
    expect(pair?.text).toMatch(/SHD rests on neither\.$/);
  });

  it("judges by 3 d where no depth is wanted, and asks to settle every pair", () => {
    const { toSettle } = evaluateTraverse({ ...shaft, depthKind: "none" });
    expect(toSettle.filter(({ code }) => code === "too_near_another").length).toBeGreaterThan(0);
    expect(toSettle.some(({ text }) => text.includes("3 × d is 0.204"))).toBe(true);
  });
});

describe("readings that cannot be used", () => {
  const withReading = (reading: Partial<TraverseReading>) =>
    evaluateTraverse({ ...shaft, readings: shaftReadings({ 5: reading }) });

  it.each([
    [{ depthMm: null }, "no_depth"],
    [{ depthMm: NaN }, "no_depth"],
    [{ depthMm: -0.2 }, "negative_depth"],
    [{ d1Um: null, d2Um: null }, "no_hardness"],
    [{ d2Um: null }, "one_diagonal_missing"],
    [{ d1Um: 0 }, "not_positive"],
    [{ d1Um: NaN }, "not_positive"],
    [{ d1Um: null, d2Um: null, enteredHardness: -3 }, "not_positive"],
  ])("asks to mend %j and leaves it out of the curve", (reading, code) => {
    const { readings, toSettle, depth } = withReading(reading);
    expect(readings[4]).toMatchObject({ isInCurve: false });
    expect(codes(toSettle)).toContain(code);
    expect(depth?.depth.verdict).toBe("ok");
  });

  it("remarks upon unequal diagonals and an entered value that differs", () => {
    expect(codes(withReading({ d1Um: 54, d2Um: 57 }).noted)).toContain("diagonals_differ");
    expect(codes(withReading({ enteredHardness: 700 }).noted)).toContain("entered_differs");
  });

  it("asks for tracks when a depth is there twice", () => {
    const { depth, toSettle } = withReading({ depthMm: 0.7 });
    expect(depth?.depth).toMatchObject({ verdict: "refuse", code: "equal_depths" });
    expect(codes(toSettle)).toContain("equal_depths");
    expect(depth?.requirement).toMatchObject({ word: "cannot_be_decided" });
  });

  it("has nothing to say about no readings", () => {
    const { depth, surface } = evaluateTraverse({ ...shaft, readings: [] });
    expect(depth?.depth).toMatchObject({ verdict: "refuse", code: "too_few_readings" });
    expect(surface.shallowest).toBeNull();
  });
});

describe("other depths and limits", () => {
  const base: TraverseInput = {
    ...shaft,
    minSurfaceHv: undefined,
    requiredDepthMm: { min: 0.9, max: 1 },
    surfaceReadingIds: undefined,
    coreReadingIds: undefined,
    processKind: "carburized",
    depthKind: "CHD",
    readings: typed([
      [0.15, 742],
      [0.4, 712],
      [0.8, 601],
      [1, 533],
      [1.5, 410],
      [2, 372],
      [3, 368],
    ]),
  };

  it("takes 550 HV for CHD and checks the core at three depths", () => {
    const { depth, core } = evaluateTraverse(base);
    expect(depth && "depthMm" in depth.depth && depth.depth.depthMm).toBeCloseTo(0.95, 10);
    expect(depth?.requirement).toMatchObject({ word: "pass", isWithinUncertainty: true });
    expect(core).toMatchObject({ source: "beyond_three_depths", n: 1, hardness: 368 });
    expect(core.remark).toContain("one reading");
  });

  it("asks for a reason when the depth is not the one of the process", () => {
    const induction = { ...base, processKind: "induction" } as const;
    expect(codes(evaluateTraverse(induction).toSettle)).toEqual(["depth_kind_differs"]);
    const { toSettle, settled } = evaluateTraverse({
      ...induction,
      depthKindReason: "as on the drawing",
    });
    expect([codes(toSettle), codes(settled)]).toEqual([[], ["depth_kind_differs"]]);
  });

  it("warns of an agreed limit that is no step of 25 HV, and of a hard core", () => {
    expect(codes(evaluateTraverse({ ...base, agreedLimit: 560 }).noted)).toContain(
      "limit_not_a_step",
    );
    expect(codes(evaluateTraverse({ ...base, coreHv: 460 }).noted)).toContain("core_too_hard");
    const short = { ...base, readings: base.readings.slice(0, 5) };
    expect(codes(evaluateTraverse(short).noted)).toContain("core_not_checked");
  });

  it("does not call a depth zero when no reading reaches the limit, and fails it by what it saw", () => {
    const soft = {
      ...base,
      readings: typed([
        [0.15, 520],
        [0.3, 500],
        [0.6, 450],
      ]),
    };
    const { depth } = evaluateTraverse(soft);
    expect(depth?.depth).toEqual({ verdict: "not_reached" });
    expect(depth?.requirement?.word).toBe("fail");
  });

  it("decides a traverse that ends above the limit only as far as it went", () => {
    const hard = {
      ...base,
      readings: typed([
        [0.15, 720],
        [0.5, 690],
        [1, 640],
      ]),
    };
    const word = (requiredDepthMm: TraverseInput["requiredDepthMm"]) =>
      evaluateTraverse({ ...hard, requiredDepthMm }).depth?.requirement?.word;
    expect(word({ min: 0.9 })).toBe("pass");
    expect(word({ min: 1.2 })).toBe("cannot_be_decided");
    expect(word({ min: 0.5, max: 2 })).toBe("cannot_be_decided");
    expect(word({ max: 0.8 })).toBe("fail");
    expect(word(undefined)).toBeUndefined();
  });

  it("evaluates each track, states the smaller depth and says so", () => {
    const readings = typed([
      [0.5, 640, "1"],
      [0.5, 650, "2"],
      [0.7, 580, "1"],
      [0.7, 590, "2"],
      [0.9, 500, "1"],
      [0.9, 520, "2"],
    ]);
    const { depth, noted } = evaluateTraverse({ ...base, readings });
    expect(depth?.tracks).toHaveLength(2);
    expect(depth?.track).toBe("1");
    expect(depth && "depthMm" in depth.depth && depth.depth.depthMm).toBeCloseTo(0.775, 10);
    expect(codes(noted)).toContain("tracks_differ");
    const means = evaluateTraverse({ ...base, readings, tracks: "means" }).depth;
    expect(means && "depthMm" in means.depth && means.depth.depthMm).toBeCloseTo(0.79333, 4);
    const mixed = readings.map((reading, index) =>
      index === 1 ? { ...reading, track: null } : reading,
    );
    expect(evaluateTraverse({ ...base, readings: mixed }).depth?.depth).toMatchObject({
      code: "track_missing",
    });
  });

  it("rests NHD on the core beyond three depths, or on the value entered", () => {
    const nitrided: TraverseInput = {
      ...base,
      processKind: "nitrided",
      depthKind: "NHD",
      loadKgf: 0.5,
      readings: typed([
        [0.09, 880],
        [0.12, 790],
        [0.16, 640],
        [0.2, 520],
        [0.25, 430],
        [0.3, 380],
        [0.4, 340],
        [0.6, 325],
        [0.9, 318],
        [1, 322],
        [1.2, 320],
        [1.5, 319],
      ]),
    };
    const { depth } = evaluateTraverse(nitrided);
    expect(depth && "depthMm" in depth.depth && depth.depth.depthMm).toBeCloseTo(0.32417, 4);
    expect(depth?.limit?.core?.readingIds).toEqual(["r10", "r11", "r12"]);
    const lowLoad = evaluateTraverse({ ...nitrided, coreHv: 320, coreLoadKgf: 0.3 });
    expect(codes(lowLoad.toSettle)).toContain("core_load_too_low");
    const short = evaluateTraverse({ ...nitrided, readings: nitrided.readings.slice(0, 6) });
    expect(codes(short.toSettle)).toContain("no_core_readings");
  });

  it("asks for what a limit lacks", () => {
    const shd = { ...base, processKind: "induction", depthKind: "SHD" } as const;
    expect(codes(evaluateTraverse(shd).toSettle)).toContain("no_limit");
    expect(codes(evaluateTraverse({ ...base, edgeReference: "none" }).toSettle)).toContain(
      "no_reference_edge",
    );
  });

  it("counts depth perpendicular to the surface of a taper section", () => {
    const taper = { ...base, edgeReference: "taper_section", sectionAngleDeg: 30 } as const;
    const { depth } = evaluateTraverse(taper);
    expect(depth && "depthMm" in depth.depth && depth.depth.depthMm).toBeCloseTo(0.475, 10);
    const without = evaluateTraverse({ ...taper, sectionAngleDeg: undefined });
    expect(codes(without.toSettle)).toContain("no_section_angle");
  });

  it("leaves a requirement in another scale undecided", () => {
    const inHrc = { ...base, requiredSurface: { scale: "HRC", min: 58 } } as const;
    const { surface } = evaluateTraverse(inHrc);
    expect(surface.requirement).toMatchObject({ word: "cannot_be_decided" });
    expect(surface.requirement?.reason).toContain("measure in HRC");
  });
});

describe("Knoop", () => {
  const knoop: TraverseInput = {
    ...shaft,
    method: "knoop",
    loadKgf: 0.5,
    minSurfaceHv: undefined,
    processKind: "none",
    depthKind: "CHD",
    requiredDepthMm: undefined,
    readings: [
      { id: "a", depthMm: 0.1, d1Um: 100 },
      { id: "b", depthMm: 0.14, d1Um: 110 },
      { id: "c", depthMm: 0.3, d1Um: 130 },
    ],
  };

  it("needs the long diagonal alone and gives HK", () => {
    const { readings, symbol } = evaluateTraverse(knoop);
    expect(readings[0]?.hardness).toBeCloseTo(711.4, 0);
    expect(symbol).toBe("HK0.5");
  });

  it("does not hold a limit in HV against readings in HK", () => {
    expect(codes(evaluateTraverse(knoop).toSettle)).toContain("limit_in_another_scale");
    const agreed = evaluateTraverse({ ...knoop, agreedLimit: 542 });
    expect(agreed.depth?.depth.verdict).toBe("ok");
  });

  it("judges spacing by gaps in short diagonals", () => {
    const pairs = evaluateTraverse(knoop).spacing.findings.filter(({ kind }) => kind === "spacing");
    expect(pairs.map(({ readingIds }) => readingIds)).toEqual([["a", "b"]]);
    const [first, second, third] = knoop.readings;
    if (!first || !second || !third) throw new Error("three readings");
    const apart = [{ ...first, lateralMm: 0 }, { ...second, lateralMm: 0.3 }, third];
    expect(evaluateTraverse({ ...knoop, readings: apart }).spacing.findings).toEqual([]);
  });
});

describe("a long block", () => {
  it("evaluates ten thousand dense readings without listing every pair", () => {
    const readings = Array.from({ length: 10_000 }, (_, index) => ({
      id: `r${index}`,
      depthMm: index / 1000,
      enteredHardness: 700 - index / 50,
    }));
    const { spacing, toSettle } = evaluateTraverse({ ...shaft, readings });
    expect(spacing.findings).toHaveLength(200);
    expect(spacing.unlisted).toBeGreaterThan(100_000);
    expect(codes(toSettle)).toContain("more_spacing_findings");
  });
});
