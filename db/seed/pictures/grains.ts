import { Noise } from "./noise";

/** Where a point lies in a pattern of grains. */
export interface GrainHit {
  /** Column and row of the cell that the grain's nucleus sits in. */
  column: number;
  row: number;
  /** Distance to the nearest boundary, in mean grain widths. */
  edge: number;
  /** Vector from the nucleus to the point, in mean grain widths. */
  fromX: number;
  fromY: number;
}

/** Grains grown from one nucleus in each unit cell, with unequal sizes. */
export class Grains {
  private readonly noise: Noise;
  private readonly hit: GrainHit = { column: 0, row: 0, edge: 0, fromX: 0, fromY: 0 };
  private readonly nx = new Float64Array(25);
  private readonly ny = new Float64Array(25);
  private readonly power = new Float64Array(25);

  /** `jitter` 0 to 1 moves nuclei from the cell centres; `spread` makes sizes unequal. */
  constructor(
    seed: number,
    private readonly jitter = 0.9,
    private readonly spread = 0.25,
  ) {
    this.noise = new Noise(seed);
  }

  /** Random number in [0, 1) that belongs to a grain. */
  trait(hit: GrainHit, salt: number): number {
    return this.noise.cell(hit.column, hit.row, salt + 11);
  }

  /** The grain at a point. The answer is one object used again by the next call. */
  at(x: number, y: number): GrainHit {
    const column = Math.floor(x);
    const row = Math.floor(y);
    const weights = this.spread;
    let best = Infinity;
    let bestIndex = 0;
    let index = 0;
    const power = this.power;
    for (let j = -2; j <= 2; j++) {
      for (let i = -2; i <= 2; i++) {
        const cx = column + i;
        const cy = row + j;
        const dx = x - (cx + 0.5 + this.jitter * (this.noise.cell(cx, cy, 1) - 0.5));
        // Every second column is half a cell lower, so that no square grid shows.
        const lower = cx & 1 ? 0.75 : 0.25;
        const dy = y - (cy + lower + this.jitter * (this.noise.cell(cx, cy, 2) - 0.5));
        const measure = dx * dx + dy * dy - weights * this.noise.cell(cx, cy, 3);
        this.nx[index] = dx;
        this.ny[index] = dy;
        power[index] = measure;
        if (measure < best) {
          best = measure;
          bestIndex = index;
        }
        index++;
      }
    }
    let edge = Infinity;
    const bx = this.nx[bestIndex]!;
    const by = this.ny[bestIndex]!;
    for (let i = 0; i < 25; i++) {
      if (i === bestIndex) continue;
      const ddx = this.nx[i]! - bx;
      const ddy = this.ny[i]! - by;
      const apart = Math.sqrt(ddx * ddx + ddy * ddy);
      edge = Math.min(edge, (power[i]! - best) / (2 * apart));
    }
    this.hit.column = column + (bestIndex % 5) - 2;
    this.hit.row = row + Math.floor(bestIndex / 5) - 2;
    this.hit.edge = edge;
    this.hit.fromX = bx;
    this.hit.fromY = by;
    return this.hit;
  }
}
