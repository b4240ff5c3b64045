import { blurred } from "./blur";
import { develop } from "./develop";
import { Grains } from "./grains";
import { electronImage } from "./light";
import { Noise, smoothstep } from "./noise";
import { createRaster, type Raster, type ScaledPicture, type Size } from "./picture";
import { drawSemBar } from "./sem-bar";

/** What decides how striations look at one place on the face. */
export interface StriationField {
  pixelSizeUm: number;
  spacingUm: number;
  /** Direction of growth, degrees clockwise from the top of the picture. */
  growthDeg: number;
  magnification: number;
  barUm: number;
  bits: 8 | 16;
}

/** Mid-depth of the hoist shaft: 0.62 µm per cycle at 2000 times, 16 bit. */
export const striations2000: StriationField = {
  pixelSizeUm: 0.0496,
  spacingUm: 0.62,
  growthDeg: 52,
  magnification: 2000,
  barUm: 10,
  bits: 16,
};

/** Near the last front: 0.87 µm per cycle at 5000 times. */
export const striations5000: StriationField = {
  pixelSizeUm: 0.0198,
  spacingUm: 0.87,
  growthDeg: 64,
  magnification: 5000,
  barUm: 5,
  bits: 8,
};

function heightsOf(size: Size, seed: number, field: StriationField, scale: number): Raster {
  const patches = new Grains(seed, 0.95, 0.35);
  const noise = new Noise(seed + 1);
  const pixelUm = field.pixelSizeUm / scale;
  const period = field.spacingUm / pixelUm;
  // One set of patches is about twenty striations long.
  const patchLong = period * 21;
  const patchWide = period * 11;
  const angle = ((field.growthDeg - 90) * Math.PI) / 180;
  const cos = Math.cos(angle);
  const sin = Math.sin(angle);
  const heights = createRaster(size, 1);
  for (let y = 0; y < size.height; y++) {
    for (let x = 0; x < size.width; x++) {
      const s = (x * cos + y * sin) / period;
      const t = (y * cos - x * sin) / period;
      const torn = noise.fbm(s / 6, t / 4, 3, 0.45);
      const hit = patches.at(
        (s * period) / patchLong + 0.07 * torn,
        (t * period) / patchWide + 0.12 * noise.fbm(s / 7 + 40, t / 5, 3, 0.45),
      );
      const turn = (patches.trait(hit, 1) - 0.5) * 0.5;
      const lean = patches.trait(hit, 2) - 0.5;
      const step = patches.trait(hit, 3) - 0.5;
      const clear = patches.trait(hit, 4);
      const along = s + t * turn;
      const bow = 0.9 * hit.fromY * hit.fromY + 0.55 * noise.fbm(s / 7 + 9, t / 7, 3);
      const phase = along + bow + patches.trait(hit, 5) + 0.35 * noise.at(along / 2.3, 60);
      const cycle = phase - Math.floor(phase);
      const ripple = cycle < 0.68 ? cycle / 0.68 : (1 - cycle) / 0.32;
      const rounded = ripple * ripple * (3 - 2 * ripple);
      const strength = 0.55 + 0.6 * clear + 0.4 * noise.at(s / 3, t / 3 + 20);
      const worn = smoothstep(-0.75, 0.1, noise.fbm(s / 12 + 70, t / 9, 2));
      // Now and then one striation opens into a secondary crack.
      const number = Math.floor(phase);
      const opens = patches.trait({ ...hit, row: hit.row + number * 7 }, 6) > 0.94;
      const length = smoothstep(0.05, 0.4, noise.at(number * 3.7, t / 2.4));
      const crack = opens ? Math.exp(-((cycle - 0.5) ** 2) / 0.016) * length : 0;
      let height = 0.24 * period * rounded * strength * worn;
      height -= 0.45 * period * crack;
      height += period * (1.3 * step + 3.2 * lean * hit.fromY + 2.6 * turn * hit.fromX * 4);
      height += period * (2.2 * noise.fbm(s / 15, t / 8 + 90, 3) + 0.3 * torn);
      height += 0.04 * period * noise.fbm(s * 2.2, t * 2.2, 4, 0.6);
      heights.data[y * size.width + x] = height;
    }
  }
  return heights;
}

/** Fatigue striations of one place. */
export function drawStriations(size: Size, seed: number, field: StriationField): ScaledPicture {
  const scale = size.width / 1280;
  const period = (field.spacingUm / field.pixelSizeUm) * scale;
  const heights = heightsOf(size, seed, field, scale);
  const image = electronImage(blurred(heights, Math.max(1, Math.round(period / 24))), {
    slope: 0.4,
    hollow: 1.1 / period,
    hollowRadiusPx: Math.round(period * 2.2),
    detector: { azimuthDeg: 20, elevationDeg: 20 },
    detectorShare: 0.75,
  });
  const exposure = { bits: field.bits, grain: 0.03, vignette: 0.06, contrast: 1, lift: 0.02 };
  const picture = develop(image, exposure, seed + 3);
  const scaleBar = drawSemBar(picture, {
    pixelSizeUm: field.pixelSizeUm / scale,
    barUm: field.barUm,
    accelerationKv: 15,
    workingDistanceMm: 12.3,
    magnification: field.magnification,
    detector: "SE",
  });
  return { ...picture, scaleBar };
}

export function striations(size: Size, seed: number): ScaledPicture {
  return drawStriations(size, seed, striations2000);
}

export function fineStriations(size: Size, seed: number): ScaledPicture {
  return drawStriations(size, seed, striations5000);
}
