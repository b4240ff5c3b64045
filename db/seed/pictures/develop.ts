import { normal, randomStream } from "./random";
import type { Picture, Raster } from "./picture";

const GRAIN_TABLE = 65536;

/** Repeatable normal deviates, quick enough for tens of millions of pixels. */
export class Grain {
  private readonly table = new Float32Array(GRAIN_TABLE);
  private state: number;

  constructor(seed: number) {
    const random = randomStream(seed);
    for (let i = 0; i < GRAIN_TABLE; i++) this.table[i] = normal(random);
    this.state = (seed * 2654435761 + 1) >>> 0 || 1;
  }

  next(): number {
    this.state ^= this.state << 13;
    this.state ^= this.state >>> 17;
    this.state ^= this.state << 5;
    return this.table[this.state & (GRAIN_TABLE - 1)]!;
  }
}

/** What the camera or detector adds. */
export interface Exposure {
  bits: 8 | 16;
  /** Standard deviation of noise as a share of white; brighter parts carry more. */
  grain: number;
  /** Share of light lost in the corners. */
  vignette: number;
  /** Gain about mid-grey; 1 leaves contrast as it is. */
  contrast: number;
  /** Added to every sample before clipping. */
  lift: number;
}

/** Turns work samples into a finished picture. */
export function develop(raster: Raster, exposure: Exposure, seed: number): Picture {
  const { width, height, channels } = raster;
  const white = exposure.bits === 16 ? 65535 : 255;
  const data =
    exposure.bits === 16 ? new Uint16Array(raster.data.length) : new Uint8Array(raster.data.length);
  const grain = new Grain(seed);
  const reach = width * width + height * height;
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const ox = 2 * x - width;
      const oy = 2 * y - height;
      const fall = 1 - (exposure.vignette * (ox * ox + oy * oy)) / reach;
      const shared = grain.next();
      for (let channel = 0; channel < channels; channel++) {
        const i = (y * width + x) * channels + channel;
        const toned = 0.5 + (raster.data[i]! + exposure.lift - 0.5) * exposure.contrast;
        const clean = Math.max(0, toned * fall);
        const own = channels === 1 ? shared : 0.75 * shared + 0.45 * grain.next();
        const noisy = clean + exposure.grain * (0.4 + 0.9 * Math.sqrt(clean)) * own;
        data[i] = Math.round(Math.min(1, Math.max(0, noisy)) * white);
      }
    }
  }
  return { width, height, channels, data };
}
