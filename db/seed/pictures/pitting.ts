import { blurred, outOfFocus } from "./blur";
import { develop } from "./develop";
import { lit } from "./light";
import { Noise, smoothstep } from "./noise";
import { createRaster, type Picture, type Size } from "./picture";
import { between, randomStream } from "./random";

/** Millimetres per pixel at 1600 pixels wide. */
export const pittingPixelMm = 0.01;

interface Pit {
  x: number;
  y: number;
  wide: number;
  long: number;
  deep: number;
}

/** Ground tooth flank with rolling-contact pits along the pitch line: shells that open downwards. */
export function pitting(size: Size, seed: number): Picture {
  const scale = size.width / 1600;
  const noise = new Noise(seed + 1);
  const random = randomStream(seed + 2);
  const pits: Pit[] = [];
  for (let i = 0; i < 58; i++) {
    const large = Math.pow(random(), 3.4);
    pits.push({
      x: random() * 1600 * scale,
      y: (620 + 300 * (random() + random() - 1)) * scale,
      wide: (9 + 78 * large) * scale,
      long: (10 + 92 * large) * between(random, 0.8, 1.3) * scale,
      deep: (5 + 30 * large) * scale,
    });
  }
  const heights = createRaster(size, 1);
  const opened = createRaster(size, 1);
  for (let y = 0; y < size.height; y++) {
    for (let x = 0; x < size.width; x++) {
      const i = y * size.width + x;
      const sx = x / scale;
      const sy = y / scale;
      const grinding =
        0.8 * noise.fbm(sx / 3.2, sy / 620, 3, 0.6) + 0.5 * noise.at(sx / 9 + 70, sy / 900);
      const polished = Math.exp(-(((sy - 620) / 260) ** 2)) * 0.65;
      const { depth, share } = pitDepth(pits, noise, x, y, scale);
      const crumbled = 6.5 * scale * noise.fbm(sx / 40, sy / 40, 6, 0.56);
      heights.data[i] =
        scale * grinding * (1 - polished) * (1 - share) - depth + share * crumbled * 0.9;
      opened.data[i] = share;
    }
  }
  const light = lit(heights, { azimuthDeg: 300, elevationDeg: 40 }, flankFinish(scale));
  const colour = createRaster(size, 3);
  for (let i = 0; i < light.data.length; i++) {
    const x = i % size.width;
    const y = Math.floor(i / size.width);
    const share = opened.data[i]!;
    const run = 0.5 + 0.5 * noise.fbm(x / (300 * scale) + 9, y / (140 * scale), 3);
    const lamp = 0.84 + 0.3 * Math.exp(-(((x / size.width - 0.36) / 0.4) ** 2));
    const value = light.data[i]! * lamp * (0.78 - 0.26 * share);
    const oil = 0.1 * run * smoothstep(0.2, 0.9, run) * (1 - share);
    colour.data[3 * i] = value * (1 - 0.2 * oil);
    colour.data[3 * i + 1] = value * (0.985 - 0.5 * oil);
    colour.data[3 * i + 2] = value * (0.965 - 1.2 * oil);
  }
  const sharp = blurred(colour, Math.max(1, Math.round(scale)));
  outOfFocus(
    sharp,
    Math.round(9 * scale),
    (_x, y) => (Math.abs(y / size.height - 0.52) - 0.22) * 2.4,
  );
  return develop(
    sharp,
    { bits: 8, grain: 0.01, vignette: 0.22, contrast: 1.05, lift: 0 },
    seed + 3,
  );
}

const flankFinish = (scale: number) => ({
  gloss: 0.14,
  hollow: 0.11 / scale,
  hollowRadiusPx: Math.round(22 * scale),
});

/** Depth of the deepest pit at a point, and 0 to 1 how far inside one it lies. */
function pitDepth(pits: readonly Pit[], noise: Noise, x: number, y: number, scale: number) {
  let depth = 0;
  let share = 0;
  const ragged =
    0.3 * noise.fbm(x / (70 * scale), y / (70 * scale), 2) +
    0.09 * noise.fbm(x / (16 * scale), y / (16 * scale), 3, 0.5);
  for (const pit of pits) {
    const dx = (x - pit.x) / pit.wide;
    const dy = (y - pit.y) / pit.long;
    if (dx < -2 || dx > 2 || dy < -2 || dy > 2) continue;
    // Narrow at the entry, widening like a shell in the rolling direction.
    const open = Math.hypot(dx / (0.86 + 0.14 * Math.max(-1, Math.min(1, dy))), dy) + ragged;
    const inside = 1 - smoothstep(0.86, 1, open);
    if (inside <= 0) continue;
    depth = Math.max(
      depth,
      inside * pit.deep * (0.5 + 0.5 * Math.sqrt(Math.max(0, 1 - open * open)) + 0.12 * dy),
    );
    share = Math.max(share, inside);
  }
  return { depth, share };
}
