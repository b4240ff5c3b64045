import type { MarkTool } from "./constants";

/** Where a feature is read: by eye and stereo microscope, in the electron microscope, or both. */
export const FEATURE_SCALES = ["macro", "sem", "both", "section"] as const;
export type FeatureScale = (typeof FEATURE_SCALES)[number];
export const FEATURE_SCALE_NAMES: Record<FeatureScale, string> = {
  macro: "by eye",
  sem: "electron microscope",
  both: "by eye and electron microscope",
  section: "section",
};

export type Feature = {
  readonly name: string;
  readonly scale: FeatureScale;
  readonly indicates: string;
  /** Completes "Do not conclude …"; null where nothing is often read into it. */
  readonly doNotConclude: string | null;
  /** Tools of the bench that draw it; the first is the usual one. */
  readonly tools: readonly [MarkTool, ...MarkTool[]];
  /** What looks the same. */
  readonly couldAlsoBe?: readonly string[];
};

/** What is often taken for striations and beach marks (common practice). */
const LOOK_ALIKES = [
  "pearlite lamellae",
  "slip traces",
  "Wallner lines",
  "rub marks",
  "machining marks",
  "colour bands of stress corrosion or hydrogen arrest",
  "deformation steps",
] as const;

const feature = (
  name: string,
  scale: FeatureScale,
  tools: Feature["tools"],
  indicates: string,
  doNotConclude: string | null,
  couldAlsoBe?: readonly string[],
): Feature => ({
  name,
  scale,
  tools,
  indicates,
  doNotConclude,
  ...(couldAlsoBe && { couldAlsoBe }),
});

/**
 * Features of fracture surfaces with what they indicate and what must not be read into them.
 * Feature set and reading as in ASM Handbook volume 12, Fractography (from memory); what to measure
 * and the cautions: common practice.
 */
export const FEATURES = {
  ORG: feature(
    "Origin",
    "both",
    ["origin"],
    "where the crack started",
    "that the cause is there without looking at the stress",
  ),
  BCH: feature(
    "Beach marks",
    "macro",
    ["front"],
    "successive positions of the crack front, from changes of load or environment; typical of fatigue in service",
    "that one mark is one cycle; thousands of striations may lie between two marks",
    LOOK_ALIKES,
  ),
  RCH: feature(
    "Ratchet marks",
    "macro",
    ["ratchet"],
    "steps between neighbouring origins; their count is that of the origins or one fewer",
    "which origin was first",
  ),
  RAD: feature(
    "Radial marks",
    "macro",
    ["length", "ratchet"],
    "fast fracture running outward from the origin",
    "the mechanism",
  ),
  CHV: feature(
    "Chevrons",
    "macro",
    ["angle", "length"],
    "brittle-looking fast fracture in a plate or section; they point back to the origin",
    "the mechanism or the temperature",
  ),
  SHL: feature(
    "Shear lip",
    "macro",
    ["area", "length"],
    "last, ductile rim at 45°; a region of plane stress",
    "that overload was the cause",
  ),
  FFZ: feature(
    "Final fracture",
    "macro",
    ["area"],
    "its size and place give the nominal stress and the sense of rotation",
    "which load event exactly",
  ),
  FAT: feature("Fatigue zone", "macro", ["area"], "area of progressive cracking", null),
  STR: feature(
    "Striations",
    "sem",
    ["front", "count", "length"],
    "crack front at each cycle, in the order of a micrometre; growth runs at right angles to them",
    "that their absence rules fatigue out; near the threshold, at high strength, after rubbing or under variable load they may not show",
    LOOK_ALIKES,
  ),
  TRK: feature(
    "Tyre tracks",
    "sem",
    ["count", "length"],
    "impressions of a particle or an edge in fatigue, at low cycles or high stress",
    "that their count is the number of cycles",
  ),
  FIS: feature(
    "Fish-eye",
    "both",
    ["area", "origin"],
    "fatigue origin below the surface at an inclusion, or a hydrogen flake",
    "a cause at the surface",
  ),
  DIM: feature(
    "Equiaxed dimples",
    "sem",
    ["area", "count"],
    "coalescence of microvoids in tension",
    "that the whole failure is ductile when they are only in the final zone",
  ),
  DSH: feature(
    "Elongated dimples",
    "sem",
    ["length", "area"],
    "shear or tearing; the same direction on the mating face is tearing, the opposite is shear",
    null,
  ),
  CLV: feature(
    "Cleavage facets",
    "sem",
    ["area", "count"],
    "crystallographic break of low energy",
    "that the temperature was low",
  ),
  RIV: feature(
    "River pattern",
    "sem",
    ["length"],
    "local direction of the crack; the lines run together downstream",
    null,
  ),
  QCL: feature(
    "Quasi-cleavage",
    "sem",
    ["area"],
    "facets mixed with tear ridges in tempered martensite; also hydrogen",
    "hydrogen from this alone",
  ),
  IGF: feature(
    "Intergranular facets",
    "sem",
    ["area", "count"],
    "boundary weaker than the grain: hydrogen, stress corrosion, temper embrittlement, quench cracking, creep, liquid metal or overheating",
    "which of them it was",
  ),
  IGD: feature(
    "Dimpled intergranular",
    "sem",
    ["area"],
    "growth of voids on boundaries: overheating, sulphides or creep",
    null,
  ),
  TWN: feature(
    "Cleavage tongues, twins",
    "sem",
    ["note", "count"],
    "twinning at low temperature or high rate",
    null,
  ),
  SEC: feature(
    "Secondary cracks",
    "both",
    ["length", "count"],
    "environment, hydrogen or brittle stock",
    null,
  ),
  OXI: feature(
    "Oxide or heat tint",
    "both",
    ["area"],
    "the crack was open at temperature; relative age",
    "an exact time",
  ),
  DEC: feature(
    "Decarburised flank",
    "section",
    ["area", "length"],
    "the crack was there before or during austenitising",
    null,
  ),
  PIT: feature(
    "Corrosion pit",
    "both",
    ["area", "length"],
    "local starting point",
    "that the pit is the cause",
  ),
  DEP: feature(
    "Deposit",
    "both",
    ["area"],
    "transport of fluid; which species",
    "the time in service",
  ),
  INC: feature(
    "Inclusion",
    "both",
    ["area", "length"],
    "site of an origin; cleanliness",
    "that it is outside the specification by itself",
  ),
  POR: feature(
    "Porosity or shrinkage",
    "both",
    ["area", "count"],
    "casting, weld or powder metal",
    null,
  ),
  LAP: feature(
    "Fold, lap or seam",
    "section",
    ["length"],
    "flaw from manufacture, there before service",
    null,
  ),
  TOO: feature("Tool mark or sharp radius", "macro", ["length"], "stress raiser", null),
  FRT: feature(
    "Fretting scar",
    "macro",
    ["area"],
    "rubbing of small amplitude; reddish debris on steel",
    "that fatigue is certain",
  ),
  RUB: feature(
    "Rub or smear",
    "both",
    ["area"],
    "damage after fracture; evidence was lost there",
    null,
  ),
  HAM: feature("Impact or handling mark", "macro", ["area", "note"], "came after the event", null),
  NCK: feature("Necking or distortion", "macro", ["length", "angle"], "ductility", null),
  SLP: feature(
    "Slip bands",
    "sem",
    ["count", "length"],
    "movement of dislocations; start of fatigue",
    null,
  ),
  STZ: feature(
    "Stretch zone",
    "sem",
    ["length", "area"],
    "blunting of the crack before overload",
    null,
  ),
  WLN: feature(
    "Wallner or rib lines",
    "both",
    ["front"],
    "dynamic fracture of glassy or ceramic material",
    "fatigue beach marks",
  ),
  MIX: feature(
    "Mixed modes",
    "sem",
    ["count", "area"],
    "shares of the modes, by counting points",
    null,
  ),
} as const satisfies Record<string, Feature>;

export type FeatureCode = keyof typeof FEATURES;
export const FEATURE_CODES = Object.keys(FEATURES) as [FeatureCode, ...FeatureCode[]];

/** A feature by its code as stored. */
export function featureOf(code: FeatureCode | null): Feature | null {
  return code === null ? null : FEATURES[code];
}

/** Codes that a tool draws: those it is the usual tool for come first. */
export function codesForTool(tool: MarkTool): FeatureCode[] {
  const codes = FEATURE_CODES.filter((code) =>
    (FEATURES[code].tools as readonly MarkTool[]).includes(tool),
  );
  const usual = (code: FeatureCode) => FEATURES[code].tools[0] === tool;
  return [...codes.filter(usual), ...codes.filter((code) => !usual(code))];
}
