import { blurred } from "./blur";
import { develop } from "./develop";
import { electronImage } from "./light";
import { Noise } from "./noise";
import { createRaster, type ScaledPicture, type Size } from "./picture";
import { between, randomStream } from "./random";
import { drawSemBar } from "./sem-bar";

/** Micrometres per pixel at 1280 pixels wide. */
export const dimplesPixelUm = 0.066;

interface Void {
  x: number;
  y: number;
  radius: number;
  particle: number;
}

const BUCKET = 24;

/** Equiaxed dimples: each is a cup grown from one particle until it met its neighbours. */
export function dimples(size: Size, seed: number): ScaledPicture {
  const scale = size.width / 1280;
  const random = randomStream(seed);
  const noise = new Noise(seed + 1);
  const bucket = BUCKET * scale;
  const columns = Math.ceil(size.width / bucket) + 4;
  const rows = Math.ceil(size.height / bucket) + 4;
  const buckets: Void[][] = Array.from({ length: columns * rows }, () => []);
  const add = (count: number, low: number, high: number, particles: number): void => {
    for (let i = 0; i < count; i++) {
      const x = between(random, -2, columns - 2.001) * bucket;
      const y = between(random, -2, rows - 2.001) * bucket;
      // Voids grow in colonies, so small and large ones are not evenly mixed.
      const colony = 1 + 0.35 * noise.at(x / (260 * scale), y / (260 * scale));
      const radius = (low + (high - low) * Math.pow(random(), 2.2)) * scale * colony;
      const particle = random() < particles ? radius * between(random, 0.16, 0.3) : 0;
      const index =
        (Math.floor(y / bucket) + 2) * columns + Math.min(columns - 1, Math.floor(x / bucket) + 2);
      buckets[index]!.push({ x, y, radius, particle });
    }
  };
  const area = (columns * rows * bucket * bucket) / (scale * scale);
  add(Math.round(area / 5200), 30, 84, 0.24);
  add(Math.round(area / 560), 11, 38, 0.03);

  const heights = createRaster(size, 1);
  const around = 5;
  for (let y = 0; y < size.height; y++) {
    for (let x = 0; x < size.width; x++) {
      const wx = x + 3.5 * scale * noise.fbm(x / (30 * scale), y / (30 * scale), 2);
      const wy = y + 3.5 * scale * noise.fbm(x / (30 * scale) + 70, y / (30 * scale), 2);
      const column = Math.floor(wx / bucket) + 2;
      const row = Math.floor(wy / bucket) + 2;
      let lowest = 90 * scale;
      let ball = -Infinity;
      for (let j = Math.max(0, row - around); j <= Math.min(rows - 1, row + around); j++) {
        for (
          let i = Math.max(0, column - around);
          i <= Math.min(columns - 1, column + around);
          i++
        ) {
          for (const cup of buckets[j * columns + i]!) {
            const dx = wx - cup.x;
            const dy = wy - cup.y;
            const square = dx * dx + dy * dy;
            const cupHeight = (1.15 * square) / cup.radius - 0.75 * cup.radius;
            if (cupHeight < lowest) {
              lowest = cupHeight;
              const left = cup.particle * cup.particle - square;
              ball =
                left > 0 ? Math.sqrt(left) + cup.particle * 0.4 - 0.75 * cup.radius : -Infinity;
            }
          }
        }
      }
      const rolling = 60 * scale * noise.fbm(x / (420 * scale) + 5, y / (420 * scale), 3);
      const fine = 0.7 * scale * noise.fbm(x / (7 * scale), y / (7 * scale), 3);
      heights.data[y * size.width + x] = Math.max(lowest, ball) + rolling + fine;
    }
  }
  const image = electronImage(blurred(heights, Math.round(scale)), {
    slope: 0.5,
    hollow: 0.075 / scale,
    hollowRadiusPx: Math.round(26 * scale),
    detector: { azimuthDeg: 40, elevationDeg: 25 },
    detectorShare: 0.22,
  });
  const exposure = { bits: 8, grain: 0.028, vignette: 0.05, contrast: 1.15, lift: -0.02 } as const;
  const picture = develop(image, exposure, seed + 2);
  const pixelSizeUm = dimplesPixelUm / scale;
  const scaleBar = drawSemBar(picture, {
    pixelSizeUm,
    barUm: 10,
    accelerationKv: 15,
    workingDistanceMm: 11.8,
    magnification: 1500,
    detector: "SE",
  });
  return { ...picture, scaleBar };
}
