import { blurred } from "./blur";
import { develop } from "./develop";
import { Grains } from "./grains";
import { Noise, smoothstep } from "./noise";
import { createRaster, type Picture, type Size } from "./picture";
import { exposureOfMicrograph, warmTint } from "./tempered-martensite";

/** Micrometres per pixel at 1600 pixels wide; written into the file's resolution. */
export const grainBoundariesPixelUm = 0.2;

/** Side of the square cell that holds one grain nucleus, so grains per area follow from it. */
export const grainCellUm = 21;

/** Prior austenite grain boundaries, picric acid etch: fine dark lines, unevenly attacked. */
export function grainBoundaries(size: Size, seed: number): Picture {
  const scale = size.width / 1600;
  const grains = new Grains(seed, 1, 0.5);
  const noise = new Noise(seed + 1);
  const um = grainBoundariesPixelUm / scale;
  const grey = createRaster(size, 1);
  for (let y = 0; y < size.height; y++) {
    for (let x = 0; x < size.width; x++) {
      const mx = x * um;
      const my = y * um;
      const bend = 0.075;
      const hit = grains.at(
        mx / grainCellUm + bend * noise.fbm(mx / 17, my / 17, 4, 0.42),
        my / grainCellUm + bend * noise.fbm(mx / 17 + 80, my / 17, 4, 0.42),
      );
      const edge = hit.edge * grainCellUm;
      const attack = noise.fbm(mx / 13 + 200, my / 13, 3);
      const depth = smoothstep(-0.95, 0.35, attack);
      const width = 0.3 + 0.26 * depth + 0.1 * noise.at(mx / 2.1, my / 2.1);
      const line = Math.exp(-((edge / width) ** 2)) * (0.18 + 0.82 * depth);
      const halo = Math.exp(-edge / 1.5) * depth;
      const turn = grains.trait(hit, 1) * Math.PI;
      const cross = my * Math.cos(turn) - mx * Math.sin(turn);
      const along = mx * Math.cos(turn) + my * Math.sin(turn);
      const ghost = noise.fbm(along / 5 + grains.trait(hit, 2) * 99, cross / 1.1, 3, 0.6);
      const mottle = noise.fbm(mx / 1.6 + 7, my / 1.6, 3, 0.6);
      const stain = noise.fbm(mx / 90, my / 90, 3);
      let value = 0.73 + 0.04 * (grains.trait(hit, 3) - 0.5) + 0.05 * stain;
      value += 0.028 * ghost + 0.026 * mottle;
      value -= 0.46 * line + 0.05 * halo;
      value -= inclusion(noise, mx, my);
      grey.data[y * size.width + x] = value;
    }
  }
  return develop(
    warmTint(blurred(grey, Math.max(1, Math.round(scale)))),
    exposureOfMicrograph,
    seed + 3,
  );
}

/** A few sulphides stretched along the rolling direction, and round oxides. */
function inclusion(noise: Noise, mx: number, my: number): number {
  let dark = 0;
  const column = Math.floor(mx / 34);
  const row = Math.floor(my / 34);
  for (let j = -1; j <= 1; j++) {
    for (let i = -1; i <= 1; i++) {
      const cx = column + i;
      const cy = row + j;
      if (noise.cell(cx, cy, 1) > 0.22) continue;
      const long = noise.cell(cx, cy, 2) > 0.45;
      const half = 0.5 + 1.1 * noise.cell(cx, cy, 3);
      const dx = (mx - (cx + noise.cell(cx, cy, 4)) * 34) / (long ? half * 3.4 : half);
      const dy = (my - (cy + noise.cell(cx, cy, 5)) * 34) / (long ? half * 0.45 : half);
      const from = Math.hypot(dx, dy) + 0.2 * noise.at(mx * 1.4, my * 1.4);
      dark = Math.max(dark, (long ? 0.34 : 0.5) * (1 - smoothstep(0.75, 1.1, from)));
    }
  }
  return dark;
}
