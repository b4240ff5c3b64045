import { BeachMarks } from "./beach-marks";
import { FaceGeometry, ratchetLine, type FacePoint, type FaceShape } from "./face-geometry";
import { Noise, smoothstep } from "./noise";
import {
  headingAt,
  LUMPS,
  PATCHES,
  RAY_GAIN,
  SHIFT_X,
  SHIFT_Y,
  SHOWN,
  SlowFields,
  SMEAR,
  SWELL,
  WAVER,
} from "./slow-fields";

/** One point of the face: height in millimetres and how it takes light. */
export interface FaceSample {
  height: number;
  /** Reflectance, about 0.2 to 0.8. */
  tone: number;
  /** Oxide tint, 0 to 1. */
  tint: number;
  /** 0 in the fatigue part, 1 in the final fracture. */
  final: number;
  gloss: number;
}

/** How the two parts of a face look. */
export interface FaceCharacter {
  /** Relief of the fatigue part and of the final part; 1 is usual. */
  fatigueRelief: number;
  finalRelief: number;
  /** Radial lines that run through the final part, 0 for a fibrous one. */
  finalRays: number;
  /** Strength of beach marks, 0 to 1. */
  beach: number;
  /** Darkening of the whole fatigue part by oxide, 0 to 1. */
  oxide: number;
}

/** Height and tone of a round fracture face, anywhere and at any pixel size. */
export class FaceSurface {
  readonly geometry: FaceGeometry;
  private readonly marks: BeachMarks;
  private readonly rough: Noise;
  private readonly rays: Noise;
  private readonly slow: Noise;
  private readonly fields: SlowFields;
  private readonly ratchets: Array<{ from: FacePoint; to: FacePoint; lengthMm: number }>;
  private readonly fineOctaves: number;
  private readonly unit: number;
  private lastDepth = 0;

  constructor(
    shape: FaceShape,
    private readonly character: FaceCharacter,
    pixelSizeMm: number,
    seed: number,
  ) {
    this.geometry = new FaceGeometry(shape, seed);
    this.marks = new BeachMarks(shape, seed);
    this.rough = new Noise(seed + 1);
    this.rays = new Noise(seed + 2);
    this.slow = new Noise(seed + 3);
    this.unit = shape.diameterMm / 60;
    this.fields = new SlowFields(this.slow, this.geometry, this.unit);
    // Detail finer than two pixels would only add noise.
    this.fineOctaves = Math.min(
      7,
      Math.max(1, Math.floor(Math.log2((0.9 * this.unit) / (2.2 * pixelSizeMm))) + 1),
    );
    this.ratchets = shape.ratchets.map((mark) => {
      const [from, to] = ratchetLine(this.geometry, mark);
      return { from, to, lengthMm: mark.lengthMm };
    });
  }

  /** Starts a new row: the next point is not a neighbour of the last one. */
  startRow(): void {
    this.fields.startRow();
    this.lastDepth = 0;
  }

  sample(x: number, y: number, sample: FaceSample): void {
    const { geometry, character, unit } = this;
    const ox = x - geometry.origin.x;
    const oy = y - geometry.origin.y;
    const u = ox * geometry.along.x + oy * geometry.along.y;
    const v = ox * geometry.across.x + oy * geometry.across.y;
    const ideal = geometry.depthAt(u, v, this.lastDepth);
    this.lastDepth = ideal > 0.5 ? ideal : 0;
    this.fields.update(x, y);
    const slow = this.fields.values;
    const depth = ideal + slow[WAVER]!;
    const limit = geometry.shape.crackDepthMm;
    const grown = Math.min(1, Math.max(0, depth / limit));

    const patches = slow[PATCHES]!;
    const heading = headingAt(u, v, depth, unit);
    const coarse = this.rays.at(heading * 21, depth / (9 * unit));
    const fine = this.rays.at(heading * 64 + 31, depth / (5 * unit));
    const hair = this.rays.at(heading * 170 + 7, depth / (2.6 * unit) + 40);
    const rays = (0.045 * coarse + 0.016 * fine + 0.006 * hair) * slow[RAY_GAIN]!;

    const jitter = (0.1 * fine + 0.05 * hair) * unit;
    const inFinal = smoothstep(-0.16 * unit, 0.16 * unit, depth + 1.6 * jitter - limit);

    let height = 0;
    let tone = 0.5;
    let tint = 0;
    let gloss = 0.1;
    if (inFinal < 1) {
      const grit = this.rough.fbm(x / (0.9 * unit), y / (0.9 * unit), this.fineOctaves, 0.56);
      const roughness = (0.02 + 0.055 * grown + 0.012 * patches) * character.fatigueRelief * unit;
      const i = this.marks.index(depth + jitter);
      const beach = character.beach * slow[SHOWN]!;
      const smear = smoothstep(0.1, 0.75, slow[SMEAR]!);
      height = rays * character.fatigueRelief + roughness * grit * (1 - 0.55 * smear);
      height += beach * this.marks.height[i]! + this.ratchetHeight(x, y);
      height += 0.5 * unit * slow[SWELL]!;
      const near = Math.exp(-depth / (5 * unit));
      tone = 0.55 + 0.1 * near - 0.06 * grown + 0.05 * patches + 0.055 * smear + 0.03 * grit;
      tone += beach * (0.16 * this.marks.tone[i]! - 0.2 * this.marks.line[i]!);
      tint = beach * Math.min(1, this.marks.tint[i]!) * (0.7 + 0.5 * patches);
      tint += character.oxide * (0.75 + 0.4 * patches);
      tone -= 0.2 * character.oxide * (0.8 + 0.6 * patches);
      gloss = 0.08 + 0.1 * smear + 0.1 * near;
    }
    if (inFinal > 0) {
      const torn = this.finalSample(x, y, heading, rays);
      const rim = geometry.radiusMm - Math.hypot(x, y);
      const lip = 1 - smoothstep(0.4 * unit, 1.5 * unit, rim + 0.5 * unit * coarse);
      const finalHeight = torn * (1 - 0.75 * lip) + 0.3 * lip * rim + 0.12 * unit;
      height += inFinal * (finalHeight - height);
      tone += inFinal * (0.37 + 0.05 * patches + 0.1 * lip + 0.05 * torn - tone);
      tint *= 1 - inFinal;
      gloss += inFinal * (0.16 - gloss);
    }
    sample.height = height;
    sample.tone = tone;
    sample.tint = tint;
    sample.final = inFinal;
    sample.gloss = gloss;
  }

  private finalSample(x: number, y: number, heading: number, rays: number): number {
    const { unit, character } = this;
    const wx = x / (1.05 * unit) + 0.3 * this.fields.values[SHIFT_X]!;
    const wy = y / (1.05 * unit) + 0.3 * this.fields.values[SHIFT_Y]!;
    const grit = this.rough.fbm(wx + 300, wy + 100, Math.min(7, this.fineOctaves + 1), 0.6);
    const crests = this.rough.ridged(1.3 * wx + 40, 1.3 * wy + 70, 3, 0.55);
    const lumps = this.fields.values[LUMPS]!;
    const streaks = this.rays.at(heading * 48 + 90, Math.hypot(x, y) / (7 * unit));
    const fibrous = (0.17 * grit + 0.06 * crests + 0.2 * lumps) * unit * character.finalRelief;
    return fibrous + 0.06 * streaks * unit + character.finalRays * (rays * 2.6);
  }

  /** Small steps where neighbouring cracks met, highest at the rim and dying out inward. */
  private ratchetHeight(x: number, y: number): number {
    let height = 0;
    for (const mark of this.ratchets) {
      const dx = mark.to.x - mark.from.x;
      const dy = mark.to.y - mark.from.y;
      const along = ((x - mark.from.x) * dx + (y - mark.from.y) * dy) / mark.lengthMm;
      if (along < -1 || along > mark.lengthMm * 1.4) continue;
      let off = ((x - mark.from.x) * dy - (y - mark.from.y) * dx) / mark.lengthMm;
      if (Math.abs(off) > 4 * this.unit) continue;
      off += 0.14 * this.unit * this.slow.fbm(along / (2.2 * this.unit), mark.from.x * 7, 4);
      const beside = 1 - smoothstep(2 * this.unit, 3.4 * this.unit, Math.abs(off));
      const fade = beside * (1 - smoothstep(0.35 * mark.lengthMm, 1.35 * mark.lengthMm, along));
      const cliff =
        Math.tanh(off / (0.16 * this.unit)) * Math.exp(-Math.abs(off) / (1.1 * this.unit));
      const side = mark.from.x * dy - mark.from.y * dx > 0 ? 1 : -1;
      const broken = 0.7 + 0.5 * this.slow.at(along / (0.8 * this.unit) + 5, mark.from.y * 3);
      height += 0.12 * this.unit * fade * broken * cliff * side;
    }
    return height;
  }
}
