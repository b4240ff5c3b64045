import { blurred } from "./blur";
import { develop } from "./develop";
import { Grains } from "./grains";
import { Noise } from "./noise";
import { createRaster, type Picture, type Size } from "./picture";

/** Micrometres per pixel at 1600 pixels wide; written into the file's resolution. */
export const temperedMartensitePixelUm = 0.08;

/** Tempered martensite, nital: packets of laths inside former austenite grains, carbides as specks. */
export function temperedMartensite(size: Size, seed: number): Picture {
  const scale = size.width / 1600;
  const grains = new Grains(seed, 0.95, 0.35);
  const packets = new Grains(seed + 1, 1, 0.4);
  const noise = new Noise(seed + 2);
  const um = temperedMartensitePixelUm / scale;
  const grey = createRaster(size, 1);
  for (let y = 0; y < size.height; y++) {
    for (let x = 0; x < size.width; x++) {
      const mx = x * um;
      const my = y * um;
      const wx = 0.1 * noise.fbm(mx / 5, my / 5, 4, 0.55);
      const wy = 0.1 * noise.fbm(mx / 5 + 60, my / 5, 4, 0.55);
      const grain = grains.at(mx / 19 + 0.4 * wx, my / 19 + 0.4 * wy);
      const grainEdge = grain.edge * 19;
      const first = Math.floor(grains.trait(grain, 1) * 4);
      const base = grains.trait(grain, 2) * Math.PI;
      const packet = packets.at(mx / 6.2 + wx + first * 37, my / 6.2 + wy);
      // Packets of one grain keep to a few directions.
      const turn = base + (Math.floor(packets.trait(packet, 1) * 3) * Math.PI) / 3;
      const px = packet.fromX * 6.2;
      const py = packet.fromY * 6.2;
      const along = px * Math.cos(turn) + py * Math.sin(turn);
      const cross = py * Math.cos(turn) - px * Math.sin(turn) + 0.03 * along * along;
      const salt = packets.trait(packet, 2) * 300;
      const laths = noise.fbm(along / 3.4 + salt, cross / 0.52, 3, 0.62);
      const blocks = noise.at(along / 7 + salt, cross / 1.7 + 40);
      const specks = noise.ridged(mx / 0.5 + 20, my / 0.5, 2);
      const carbides = noise.fbm(mx / 0.34, my / 0.34, 2, 0.6);
      const relief = noise.fbm(mx / 26, my / 26, 2);
      let value = 0.57 + 0.2 * laths + 0.13 * blocks + 0.06 * relief;
      value += 0.1 * (packets.trait(packet, 3) - 0.5);
      value -= 0.14 * Math.max(0, carbides - 0.1) + 0.1 * Math.max(0, specks - 0.72);
      value -= 0.16 * Math.exp(-grainEdge / 0.22) * (0.6 + 0.6 * relief);
      grey.data[y * size.width + x] = value;
    }
  }
  return develop(
    warmTint(blurred(grey, Math.max(1, Math.round(scale)))),
    exposureOfMicrograph,
    seed + 3,
  );
}

export const exposureOfMicrograph = {
  bits: 8,
  grain: 0.012,
  vignette: 0.1,
  contrast: 1.08,
  lift: 0.01,
} as const;

/** Colour of etched steel under a halogen lamp: brown in the darks, straw in the lights. */
export function warmTint(grey: { width: number; height: number; data: Float32Array }) {
  const colour = createRaster(grey, 3);
  for (let i = 0; i < grey.data.length; i++) {
    const value = grey.data[i]!;
    const deep = Math.max(0, 0.6 - value);
    colour.data[3 * i] = value * 1.09 + 0.03 * deep;
    colour.data[3 * i + 1] = value * 1.0 - 0.02 * deep;
    colour.data[3 * i + 2] = value * 0.83 - 0.09 * deep;
  }
  return colour;
}
