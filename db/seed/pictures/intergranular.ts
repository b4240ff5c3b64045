import { blurred } from "./blur";
import { develop } from "./develop";
import { electronImage } from "./light";
import { Noise } from "./noise";
import { createRaster, type Raster, type ScaledPicture, type Size } from "./picture";
import { drawSemBar } from "./sem-bar";

/** Micrometres per pixel at 1280 pixels wide. */
export const intergranularPixelUm = 0.099;

const GRAIN_PX = 138;
const LAYERS = 5;

/** Nuclei near one pixel, as lines in height: the nearest nucleus at height z has the least `square - 2 z up`. */
interface Column {
  up: Float64Array;
  square: Float64Array;
  kept: Uint8Array;
  trait: Float64Array;
}

/**
 * Grains in space, some kept on this half and some gone with the other one. What is seen from
 * above is where kept grains meet lost ones, so every facet is a true grain boundary.
 */
function grainHeights(size: Size, seed: number, unit: number): Raster {
  const noise = new Noise(seed);
  const heights = createRaster(size, 1);
  const capacity = 25 * LAYERS;
  const near: Column = {
    up: new Float64Array(capacity),
    square: new Float64Array(capacity),
    kept: new Uint8Array(capacity),
    trait: new Float64Array(capacity),
  };
  for (let y = 0; y < size.height; y++) {
    for (let x = 0; x < size.width; x++) {
      const warp = 0.045;
      const gx = x / unit + warp * noise.fbm((2.2 * x) / unit, (2.2 * y) / unit, 3);
      const gy = y / unit + warp * noise.fbm((2.2 * x) / unit + 31, (2.2 * y) / unit, 3);
      const count = gather(noise, near, gx, gy);
      const surface = descend(near, count);
      const fine = 0.006 * noise.fbm(gx * 9 + surface.trait * 90, gy * 9, 4, 0.6);
      heights.data[y * size.width + x] = unit * (surface.z + fine);
    }
  }
  return heights;
}

function gather(noise: Noise, near: Column, gx: number, gy: number): number {
  const column = Math.floor(gx);
  const row = Math.floor(gy);
  let count = 0;
  for (let j = -2; j <= 2; j++) {
    for (let i = -2; i <= 2; i++) {
      const cx = column + i;
      const cy = row + j;
      for (let layer = 0; layer < LAYERS; layer++) {
        const salt = layer * 5;
        const dx = gx - (cx + 0.5 + 0.95 * (noise.cell(cx, cy, salt + 1) - 0.5));
        const dy = gy - (cy + 0.5 + 0.95 * (noise.cell(cx, cy, salt + 2) - 0.5));
        const square = dx * dx + dy * dy;
        if (square > 2.2) continue;
        const up = layer - LAYERS / 2 + 0.95 * noise.cell(cx, cy, salt + 3);
        // The crack's mean path rolls gently, and takes the odd grain with it.
        const path =
          0.5 * noise.at(cx / 3.3, cy / 3.3) + 0.7 * (noise.cell(cx, cy, salt + 4) - 0.5);
        near.up[count] = up;
        near.square[count] = square + up * up;
        near.kept[count] = up < path || layer === 0 ? 1 : 0;
        near.trait[count] = noise.cell(cx, cy, salt + 5);
        count++;
      }
    }
  }
  return count;
}

/** Goes down the vertical through the grains until it enters one that was kept. */
function descend(near: Column, count: number): { z: number; trait: number } {
  let current = 0;
  for (let i = 1; i < count; i++) if (near.up[i]! > near.up[current]!) current = i;
  let z = LAYERS;
  while (near.kept[current] === 0) {
    let next = -1;
    let crossing = -Infinity;
    for (let i = 0; i < count; i++) {
      const lower = near.up[current]! - near.up[i]!;
      if (lower <= 0) continue;
      const at = (near.square[current]! - near.square[i]!) / (2 * lower);
      if (at > crossing && at <= z) {
        crossing = at;
        next = i;
      }
    }
    if (next < 0) break;
    z = crossing;
    current = next;
  }
  return { z, trait: near.trait[current]! };
}

/** Intergranular facets: whole grains, sharp edges, openings between them. */
export function intergranular(size: Size, seed: number): ScaledPicture {
  const scale = size.width / 1280;
  const unit = GRAIN_PX * scale;
  const heights = grainHeights(size, seed, unit);
  const image = electronImage(blurred(heights, Math.max(1, Math.round(scale))), {
    slope: 0.3,
    hollow: 0.035 / scale,
    hollowRadiusPx: Math.round(34 * scale),
    detector: { azimuthDeg: 50, elevationDeg: 25 },
    detectorShare: 0.42,
  });
  const exposure = { bits: 8, grain: 0.026, vignette: 0.05, contrast: 1.05, lift: 0 } as const;
  const picture = develop(image, exposure, seed + 2);
  const scaleBar = drawSemBar(picture, {
    pixelSizeUm: intergranularPixelUm / scale,
    barUm: 20,
    accelerationKv: 15,
    workingDistanceMm: 9.7,
    magnification: 1000,
    detector: "SE",
  });
  return { ...picture, scaleBar };
}
