import { between, randomStream } from "./random";
import type { FaceShape } from "./face-geometry";

const STEP_MM = 0.01;

/** What lies along the growth direction, sampled every 0.01 mm of crack depth. */
export class BeachMarks {
  private readonly size: number;
  /** Brightness of each stretch of growth, about -1 to 1. */
  readonly tone: Float32Array;
  /** Dark line at each arrest, 0 to 1. */
  readonly line: Float32Array;
  /** Oxide tint, 0 to 1. */
  readonly tint: Float32Array;
  /** Height of the small step at each arrest, in millimetres. */
  readonly height: Float32Array;

  constructor(shape: FaceShape, seed: number) {
    this.size = Math.ceil((shape.diameterMm * 1.1) / STEP_MM);
    this.tone = new Float32Array(this.size);
    this.line = new Float32Array(this.size);
    this.tint = new Float32Array(this.size);
    this.height = new Float32Array(this.size);
    const random = randomStream(seed + 5);
    const scale = shape.diameterMm / 60;
    let depth = 1.4 * scale;
    while (depth < shape.crackDepthMm) {
      const clear = shape.frontDepthsMm.every((front) => Math.abs(front - depth) > 0.5 * scale);
      if (clear) this.arrest(depth, 0.1 + 0.6 * random() * random(), scale, random);
      depth += between(random, 0.3, 0.95) * scale * (0.6 + depth / shape.diameterMm);
    }
    for (const front of shape.frontDepthsMm) {
      this.arrest(front, between(random, 1.15, 1.4), scale, random);
    }
    this.arrest(shape.crackDepthMm, 0.8, scale, random);
  }

  /** One stop of the crack: a dark line, oxide just before it, a lighter start after it. */
  private arrest(depth: number, strength: number, scale: number, random: () => number): void {
    const width = between(random, 0.12, 0.26) * scale;
    const before = between(random, 0.7, 1.5) * scale;
    const after = between(random, 0.5, 1.3) * scale;
    const lift = between(random, -0.35, 0.6);
    const first = Math.max(0, Math.floor((depth - 4 * before) / STEP_MM));
    const last = Math.min(this.size - 1, Math.ceil((depth + 5 * after) / STEP_MM));
    for (let i = first; i <= last; i++) {
      const from = i * STEP_MM - depth;
      this.line[i]! += strength * Math.exp(-(from * from) / (2 * width * width));
      const tail = from < 0 ? Math.exp(from / before) : Math.exp(-from / (0.3 * before));
      this.tint[i]! += 0.8 * strength * tail;
      if (from > 0) this.tone[i]! += strength * (0.35 + 0.5 * lift) * Math.exp(-from / after);
      const rounded = Math.exp(-(from * from) / (8 * width * width));
      this.height[i]! -= 0.07 * scale * strength * rounded;
    }
  }

  /** Row of the tables for a depth. */
  index(depth: number): number {
    const i = Math.floor(depth / STEP_MM);
    return i < 0 ? 0 : i >= this.size ? this.size - 1 : i;
  }
}
