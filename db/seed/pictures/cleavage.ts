import { blurred } from "./blur";
import { develop } from "./develop";
import { Grains } from "./grains";
import { electronImage } from "./light";
import { Noise, smoothstep } from "./noise";
import { createRaster, type ScaledPicture, type Size } from "./picture";
import { drawSemBar } from "./sem-bar";

/** Micrometres per pixel at 1280 pixels wide. */
export const cleavagePixelUm = 0.124;

const GRAIN_PX = 235;

/** Flat facets, one or two to a grain, with steps that run together in the direction of growth. */
export function cleavage(size: Size, seed: number): ScaledPicture {
  const scale = size.width / 1280;
  const grains = new Grains(seed, 0.95, 0.4);
  const noise = new Noise(seed + 1);
  const unit = GRAIN_PX * scale;
  const heights = createRaster(size, 1);
  for (let y = 0; y < size.height; y++) {
    for (let x = 0; x < size.width; x++) {
      const wx = x / unit + 0.06 * noise.fbm(x / (110 * scale), y / (110 * scale), 3);
      const wy = y / unit + 0.06 * noise.fbm(x / (110 * scale) + 50, y / (110 * scale), 3);
      const hit = grains.at(wx, wy);
      const tiltX = (grains.trait(hit, 1) - 0.5) * 0.9;
      const tiltY = (grains.trait(hit, 2) - 0.5) * 1.1;
      const level = grains.trait(hit, 3) - 0.5;
      // Steps of a grain fan out from a place up the crack's path and merge away from it.
      const heading = 0.5 + (grains.trait(hit, 4) - 0.5) * 1.5;
      const px = hit.fromX * Math.cos(heading) + hit.fromY * Math.sin(heading);
      const py = hit.fromY * Math.cos(heading) - hit.fromX * Math.sin(heading);
      const ahead = 1.25 - px;
      const fan = (py / ahead) * 6;
      const salt = grains.trait(hit, 5) * 500;
      const winding = 0.05 * noise.fbm(px * 3 + salt, py * 3, 2);
      const field =
        0.42 * noise.fbm(fan * 0.55 + winding + salt, px * 0.7, 2, 0.5) +
        0.42 * (fan + 3 * winding);
      const levels = 4 + 7 * grains.trait(hit, 7);
      const raw = field * levels;
      const whole = Math.floor(raw);
      const stepped = (whole + smoothstep(0.9, 1, raw - whole)) / levels;
      const count = 0.35 + 1.1 * grains.trait(hit, 6);
      let height = unit * (0.3 * level + tiltX * hit.fromX + tiltY * hit.fromY);
      height += unit * 0.3 * count * (stepped - 0.85 * field);
      // Torn ligaments between facets.
      const seam = Math.exp(-hit.edge / 0.018);
      height += unit * 0.02 * seam * (0.3 + noise.at(x / (14 * scale), y / (14 * scale)));
      height += scale * 0.22 * noise.fbm(x / (9 * scale), y / (9 * scale), 3);
      height += unit * 0.25 * noise.fbm(x / (3 * unit), y / (3 * unit), 2);
      heights.data[y * size.width + x] = height;
    }
  }
  const image = electronImage(blurred(heights, Math.max(1, Math.round(scale))), {
    slope: 0.36,
    hollow: 0.075 / scale,
    hollowRadiusPx: Math.round(16 * scale),
    detector: { azimuthDeg: 325, elevationDeg: 25 },
    detectorShare: 0.62,
  });
  const exposure = { bits: 8, grain: 0.026, vignette: 0.05, contrast: 1.05, lift: 0 } as const;
  const picture = develop(image, exposure, seed + 2);
  const scaleBar = drawSemBar(picture, {
    pixelSizeUm: cleavagePixelUm / scale,
    barUm: 20,
    accelerationKv: 20,
    workingDistanceMm: 10.4,
    magnification: 800,
    detector: "SE",
  });
  return { ...picture, scaleBar };
}
