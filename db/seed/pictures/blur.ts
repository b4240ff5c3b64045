import type { Raster } from "./picture";

function boxPass(
  source: Float32Array,
  target: Float32Array,
  lines: number,
  length: number,
  lineStep: number,
  step: number,
  radius: number,
): void {
  const share = 1 / (2 * radius + 1);
  for (let line = 0; line < lines; line++) {
    const start = line * lineStep;
    const last = start + (length - 1) * step;
    let sum = source[start]! * (radius + 1);
    for (let i = 1; i <= radius; i++) sum += source[start + Math.min(i, length - 1) * step]!;
    for (let i = 0; i < length; i++) {
      target[start + i * step] = sum * share;
      const enters = Math.min(last, start + (i + radius + 1) * step);
      const leaves = Math.max(start, start + (i - radius) * step);
      sum += source[enters]! - source[leaves]!;
    }
  }
}

/** Close to a Gaussian blur: two box passes each way. `radius` is in whole pixels. */
export function blurred(raster: Raster, radius: number): Raster {
  const { width, height, channels } = raster;
  const data = new Float32Array(raster.data);
  const held = new Float32Array(data.length);
  if (radius < 1) return { ...raster, data };
  for (let channel = 0; channel < channels; channel++) {
    const from = data.subarray(channel);
    const to = held.subarray(channel);
    for (let pass = 0; pass < 2; pass++) {
      boxPass(from, to, height, width, width * channels, channels, radius);
      boxPass(to, from, width, height, channels, width * channels, radius);
    }
  }
  return { ...raster, data };
}

/** Softens where a picture is out of focus. `amount` answers 0 (sharp) to 1 (softest). */
export function outOfFocus(
  raster: Raster,
  radius: number,
  amount: (x: number, y: number) => number,
): void {
  const near = blurred(raster, Math.max(1, Math.round(radius / 3)));
  const far = blurred(raster, Math.max(2, radius));
  const { width, height, channels, data } = raster;
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const share = Math.min(1, Math.max(0, amount(x, y)));
      const soft = Math.min(1, share * 2);
      const softer = Math.max(0, share * 2 - 1);
      for (let channel = 0; channel < channels; channel++) {
        const i = (y * width + x) * channels + channel;
        const mixed = data[i]! + soft * (near.data[i]! - data[i]!);
        data[i] = mixed + softer * (far.data[i]! - mixed);
      }
    }
  }
}
