import { randomStream } from "./random";

const CELLS = 4096;
const MASK = CELLS - 1;
const DIRECTIONS = 256;

/** Lattice noise over the plane. Cell size is 1; it repeats only after 4096 cells. */
export class Noise {
  private readonly order = new Uint16Array(CELLS);
  private readonly gradientX = new Float64Array(DIRECTIONS);
  private readonly gradientY = new Float64Array(DIRECTIONS);

  constructor(seed: number) {
    const random = randomStream(seed);
    for (let i = 0; i < CELLS; i++) this.order[i] = i;
    for (let i = CELLS - 1; i > 0; i--) {
      const j = Math.floor(random() * (i + 1));
      const held = this.order[i]!;
      this.order[i] = this.order[j]!;
      this.order[j] = held;
    }
    for (let i = 0; i < DIRECTIONS; i++) {
      // 1.5 brings the usual span of gradient noise to about -1 to 1.
      this.gradientX[i] = 1.5 * Math.cos((2 * Math.PI * i) / DIRECTIONS);
      this.gradientY[i] = 1.5 * Math.sin((2 * Math.PI * i) / DIRECTIONS);
    }
  }

  /** Random number in [0, 1) that belongs to one cell; `salt` gives further ones. */
  cell(column: number, row: number, salt: number): number {
    const first = this.order[(column + salt * 811) & MASK]!;
    return this.order[(first + row) & MASK]! / CELLS;
  }

  /** Smooth noise, about -1 to 1, mean 0. */
  at(x: number, y: number): number {
    const column = Math.floor(x);
    const row = Math.floor(y);
    const fx = x - column;
    const fy = y - row;
    const left = this.order[column & MASK]!;
    const right = this.order[(column + 1) & MASK]!;
    const a = this.order[(left + row) & MASK]! & 255;
    const b = this.order[(right + row) & MASK]! & 255;
    const c = this.order[(left + row + 1) & MASK]! & 255;
    const d = this.order[(right + row + 1) & MASK]! & 255;
    const gx = this.gradientX;
    const gy = this.gradientY;
    const sx = fx * fx * fx * (fx * (fx * 6 - 15) + 10);
    const sy = fy * fy * fy * (fy * (fy * 6 - 15) + 10);
    const na = gx[a]! * fx + gy[a]! * fy;
    const nb = gx[b]! * (fx - 1) + gy[b]! * fy;
    const nc = gx[c]! * fx + gy[c]! * (fy - 1);
    const nd = gx[d]! * (fx - 1) + gy[d]! * (fy - 1);
    const top = na + sx * (nb - na);
    const bottom = nc + sx * (nd - nc);
    return top + sy * (bottom - top);
  }

  /** Sum of octaves, each half as wide; the lattice is turned between them so no axis shows. */
  fbm(x: number, y: number, octaves: number, gain = 0.5): number {
    let sum = 0;
    let amplitude = 1;
    for (let octave = 0; octave < octaves; octave++) {
      sum += amplitude * this.at(x, y);
      const turned = 1.6 * x + 1.2 * y;
      y = 1.6 * y - 1.2 * x + 17.3;
      x = turned + 9.1;
      amplitude *= gain;
    }
    return sum;
  }

  /** As `fbm`, folded so that sharp crests appear; about 0 to 1, crests high. */
  ridged(x: number, y: number, octaves: number, gain = 0.5): number {
    let sum = 0;
    let amplitude = 1;
    let total = 0;
    for (let octave = 0; octave < octaves; octave++) {
      const folded = 1 - Math.abs(this.at(x, y));
      sum += amplitude * folded * folded;
      total += amplitude;
      const turned = 1.6 * x + 1.2 * y;
      y = 1.6 * y - 1.2 * x + 17.3;
      x = turned + 9.1;
      amplitude *= gain;
    }
    return sum / total;
  }
}

/** 0 below `low`, 1 above `high`, smooth between. */
export function smoothstep(low: number, high: number, value: number): number {
  const t = Math.min(1, Math.max(0, (value - low) / (high - low)));
  return t * t * (3 - 2 * t);
}
