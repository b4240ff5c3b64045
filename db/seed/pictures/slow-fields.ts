import type { FaceGeometry } from "./face-geometry";
import { smoothstep, type Noise } from "./noise";

const FIELDS = 9;
const STEP_MM = 0.1;

/** Places of the fields in `SlowFields.values`. */
export const PATCHES = 0;
export const WAVER = 1;
export const SMEAR = 2;
export const SWELL = 3;
export const LUMPS = 4;
export const SHIFT_X = 5;
export const SHIFT_Y = 6;
export const RAY_GAIN = 7;
export const SHOWN = 8;

/**
 * Everything on a face that changes over millimetres. Worked out every 0.1 mm along a row and
 * drawn straight between, which saves most of the noise calls in a large picture.
 */
export class SlowFields {
  readonly values = new Float64Array(FIELDS);
  private left = new Float64Array(FIELDS);
  private right = new Float64Array(FIELDS);
  private node = NaN;

  constructor(
    private readonly noise: Noise,
    private readonly geometry: FaceGeometry,
    private readonly unit: number,
  ) {}

  startRow(): void {
    this.node = NaN;
  }

  /** Fills `values` for a point; points of a row are to be asked from left to right. */
  update(x: number, y: number): void {
    const step = STEP_MM * this.unit;
    const node = Math.floor(x / step);
    if (node !== this.node) {
      if (node === this.node + 1) {
        const spare = this.left;
        this.left = this.right;
        this.right = spare;
      } else {
        this.compute(node * step, y, this.left);
      }
      this.compute((node + 1) * step, y, this.right);
      this.node = node;
    }
    const share = x / step - node;
    for (let i = 0; i < FIELDS; i++) {
      this.values[i] = this.left[i]! + share * (this.right[i]! - this.left[i]!);
    }
  }

  private compute(x: number, y: number, out: Float64Array): void {
    const { noise, unit, geometry } = this;
    const ox = x - geometry.origin.x;
    const oy = y - geometry.origin.y;
    const u = ox * geometry.along.x + oy * geometry.along.y;
    const v = ox * geometry.across.x + oy * geometry.across.y;
    out[PATCHES] = noise.fbm(x / (11 * unit), y / (11 * unit), 2);
    out[WAVER] = geometry.waverAt(u, v);
    out[SMEAR] = noise.fbm(x / (6 * unit) + 50, y / (6 * unit), 3);
    out[SWELL] = noise.fbm(x / (14 * unit) + 20, y / (14 * unit) + 20, 3, 0.45);
    out[LUMPS] = noise.at(x / (3.1 * unit) + 80, y / (3.1 * unit));
    out[SHIFT_X] = noise.at(x / (2.2 * unit) + 9, y / (2.2 * unit));
    out[SHIFT_Y] = noise.at(x / (2.2 * unit), y / (2.2 * unit) + 9);
    const depth = geometry.depthAt(u, v) + out[WAVER]!;
    const heading = headingAt(u, v, depth, unit);
    const uneven = 0.5 + 0.5 * noise.at(heading * 5 + 3, depth / (6 * unit));
    const away = smoothstep(0.5 * unit, 14 * unit, depth);
    const patchy = (0.14 + 0.62 * away) * (0.1 + 1.1 * uneven * uneven);
    out[RAY_GAIN] = Math.sqrt(Math.max(0, depth) * unit) * patchy;
    out[SHOWN] = Math.max(0.15, 0.72 + 0.75 * noise.at(heading * 3.1, depth / (3.4 * unit)));
  }
}

/** Direction of growth at a point, in radians off the line of growth; rays follow lines of equal heading. */
export function headingAt(u: number, v: number, depth: number, unit: number): number {
  return Math.atan2(v, u + 5 * unit + (0.012 * depth * depth) / unit);
}
