import { blurred } from "./blur";
import { createRaster, type Raster } from "./picture";

/** Lamp direction: azimuth clockwise from the top of the picture, elevation above its plane. */
export interface Lamp {
  azimuthDeg: number;
  elevationDeg: number;
}

/** Unit vector towards a lamp, x right, y down, z to the viewer. */
export function lampVector(lamp: Lamp): { x: number; y: number; z: number } {
  const azimuth = (lamp.azimuthDeg * Math.PI) / 180;
  const elevation = (lamp.elevationDeg * Math.PI) / 180;
  return {
    x: Math.sin(azimuth) * Math.cos(elevation),
    y: -Math.cos(azimuth) * Math.cos(elevation),
    z: Math.sin(elevation),
  };
}

/** Slopes of a height field at a pixel, heights in pixels. */
export function slopeX(heights: Raster, x: number, y: number): number {
  const row = y * heights.width;
  const left = heights.data[row + Math.max(0, x - 1)]!;
  const right = heights.data[row + Math.min(heights.width - 1, x + 1)]!;
  return (right - left) / 2;
}

export function slopeY(heights: Raster, x: number, y: number): number {
  const up = heights.data[Math.max(0, y - 1) * heights.width + x]!;
  const down = heights.data[Math.min(heights.height - 1, y + 1) * heights.width + x]!;
  return (down - up) / 2;
}

/** How a surface answers light: `gloss` adds glints, `hollow` darkens pits (per pixel of depth). */
export interface Finish {
  gloss: number;
  hollow: number;
  hollowRadiusPx: number;
}

/** Brightness of a height field (heights in pixels) under one lamp and a little fill light. */
export function lit(heights: Raster, lamp: Lamp, finish: Finish): Raster {
  const result = createRaster(heights, 1);
  const light = lampVector(lamp);
  const halfLength = Math.hypot(light.x, light.y, light.z + 1);
  const smooth = blurred(heights, finish.hollowRadiusPx);
  for (let y = 0; y < heights.height; y++) {
    for (let x = 0; x < heights.width; x++) {
      const gx = slopeX(heights, x, y);
      const gy = slopeY(heights, x, y);
      const length = Math.sqrt(1 + gx * gx + gy * gy);
      const towards = (light.z - gx * light.x - gy * light.y) / length;
      const half = (light.z + 1 - gx * light.x - gy * light.y) / (length * halfLength);
      const i = y * heights.width + x;
      const depth = heights.data[i]! - smooth.data[i]!;
      const open = 1 / (1 + Math.exp(-depth * finish.hollow));
      const direct = towards > 0 ? towards : 0.08 * towards;
      result.data[i] =
        (0.16 + 0.84 * direct) * (0.55 + 0.9 * open) + finish.gloss * Math.pow(half, 24) * open;
    }
  }
  return result;
}

/** Secondary-electron contrast: edges and slopes bright, hollows dark, detector to one side. */
export interface Electrons {
  slope: number;
  hollow: number;
  hollowRadiusPx: number;
  detector: Lamp;
  detectorShare: number;
}

/** Brightness of a height field (heights in pixels) in a scanning electron microscope, about 0.1 to 1. */
export function electronImage(heights: Raster, settings: Electrons): Raster {
  const result = createRaster(heights, 1);
  const towards = lampVector(settings.detector);
  const wide = blurred(heights, settings.hollowRadiusPx);
  const close = blurred(heights, Math.max(2, Math.round(settings.hollowRadiusPx / 5)));
  for (let y = 0; y < heights.height; y++) {
    for (let x = 0; x < heights.width; x++) {
      const gx = slopeX(heights, x, y);
      const gy = slopeY(heights, x, y);
      const length = Math.sqrt(1 + gx * gx + gy * gy);
      const i = y * heights.width + x;
      const relief = heights.data[i]! - wide.data[i]!;
      const edge = heights.data[i]! - close.data[i]!;
      const escape = Math.tanh(relief * settings.hollow) + 1.5 * Math.tanh(edge * settings.hollow);
      const side = -(gx * towards.x + gy * towards.y) / length;
      result.data[i] =
        0.4 +
        settings.slope * (1 - 1 / length) +
        0.13 * escape +
        settings.detectorShare * side * 0.5;
    }
  }
  return result;
}
