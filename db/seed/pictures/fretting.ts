import { blurred, outOfFocus } from "./blur";
import { develop } from "./develop";
import { lit } from "./light";
import { Noise, smoothstep } from "./noise";
import { createRaster, type Picture, type Size } from "./picture";

/** Millimetres per pixel at 1600 pixels wide, along the shaft. */
export const frettingPixelMm = 0.025;

/** Shaft seat under a hub: turned surface, a worn band with red-brown oxide and black patches. */
export function fretting(size: Size, seed: number): Picture {
  const scale = size.width / 1600;
  const noise = new Noise(seed + 1);
  const heights = createRaster(size, 1);
  const colour = createRaster(size, 3);
  const rust = new Float32Array(size.width * size.height);
  const worn = new Float32Array(size.width * size.height);
  for (let y = 0; y < size.height; y++) {
    for (let x = 0; x < size.width; x++) {
      const i = y * size.width + x;
      const sx = x / scale;
      const sy = y / scale;
      const wander = 46 * noise.fbm(sx / 240, sy / 150, 4, 0.55);
      const seat =
        smoothstep(330, 372, sx + 0.5 * wander) * (1 - smoothstep(1225, 1290, sx + wander));
      const patch = noise.fbm(sx / 210, sy / 120 + 30, 5, 0.58);
      const oxide = 0.85 * seat * smoothstep(-0.25, 0.75, patch + 0.35 * edgeOf(sx));
      const rubbed = seat * smoothstep(0.05, 0.5, noise.fbm(sx / 90 + 50, sy / 240, 4, 0.55));
      const turning =
        0.7 * Math.sin(sx * 0.52 + 1.6 * noise.at(sx / 40, 3)) + 0.8 * noise.at(sx / 2.4, sy / 700);
      const scar = noise.fbm(sx / 9, sy / 16, 5, 0.6);
      const crater = Math.max(0, noise.fbm(sx / 34 + 9, sy / 26, 4, 0.55) - 0.25) * seat;
      heights.data[i] =
        scale *
        (0.55 * turning * (1 - 0.85 * seat) + seat * (1.5 * scar * (0.3 + oxide) - 6 * crater));
      rust[i] = oxide;
      worn[i] = rubbed * (1 - oxide);
    }
  }
  const finish = { gloss: 0.16, hollow: 0.16 / scale, hollowRadiusPx: Math.round(14 * scale) };
  const light = lit(heights, { azimuthDeg: 285, elevationDeg: 48 }, finish);
  for (let y = 0; y < size.height; y++) {
    // The seat is a cylinder lying across the picture: bright line above the middle, dark edges.
    const turn = Math.min(1, Math.max(-1, (y / size.height - 0.5) * 1.9));
    const facing = Math.sqrt(1 - turn * turn);
    const towards = Math.max(0, facing * 0.84 - turn * 0.54);
    const body = 0.22 + 0.72 * towards;
    const streak = 0.5 * Math.pow(towards, 26);
    for (let x = 0; x < size.width; x++) {
      const i = y * size.width + x;
      const oxide = rust[i]!;
      const dark =
        oxide * smoothstep(0.1, 0.55, noise.fbm(x / (40 * scale) + 99, y / (30 * scale), 4));
      const value =
        light.data[i]! * body * (0.86 + 0.1 * worn[i]! - 0.16 * oxide) +
        0.75 * streak * (1 - 0.8 * oxide) * 0.4;
      const depth = 1 - 0.42 * oxide - 0.28 * dark;
      colour.data[3 * i] = value * depth * (1 + 0.12 * oxide - 0.12 * dark);
      colour.data[3 * i + 1] = value * depth * (0.985 - 0.16 * oxide + 0.06 * dark);
      colour.data[3 * i + 2] = value * depth * (0.96 - 0.34 * oxide + 0.2 * dark);
    }
  }
  const sharp = blurred(colour, Math.max(1, Math.round(scale)));
  outOfFocus(
    sharp,
    Math.round(12 * scale),
    (_x, y) => (Math.abs(y / size.height - 0.48) - 0.26) * 3,
  );
  return develop(
    sharp,
    { bits: 8, grain: 0.011, vignette: 0.2, contrast: 1.08, lift: 0.01 },
    seed + 3,
  );
}

/** Oxide gathers at the two ends of a seat. */
function edgeOf(sx: number): number {
  return Math.exp(-(((sx - 400) / 90) ** 2)) + Math.exp(-(((sx - 1190) / 110) ** 2)) - 0.35;
}
