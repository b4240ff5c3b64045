import { blurred } from "./blur";
import { develop } from "./develop";
import { Grains } from "./grains";
import { Noise, smoothstep } from "./noise";
import { createRaster, type Picture, type PixelPoint, type Size } from "./picture";
import { exposureOfMicrograph, warmTint } from "./tempered-martensite";

/** Micrometres per pixel at 1600 pixels wide; written into the file's resolution. */
export const weldPixelUm = 8;

export interface WeldTruth {
  pixelSizeMm: number;
  toe: PixelPoint;
  /** The crack from the toe to its tip. */
  crack: PixelPoint[];
}

export interface WeldPicture extends Picture {
  truth: WeldTruth;
}

/** Macro section of a fillet weld: plate, heat-affected zone, cast metal, a crack from the toe. */
export function weldToeCrack(size: Size, seed: number): WeldPicture {
  const scale = size.width / 1600;
  const noise = new Noise(seed + 1);
  const cast = new Grains(seed + 2, 1, 0.4);
  const plate = new Grains(seed + 3, 1, 0.4);
  const plateTop = 0.4 * size.height;
  const toe = { x: 0.56 * size.width, y: plateTop };
  const grey = createRaster(size, 1);
  const crack = crackPath(noise, toe, 0.33 * size.height, scale);
  for (let y = 0; y < size.height; y++) {
    for (let x = 0; x < size.width; x++) {
      const px = x + 5 * scale * noise.fbm(x / (60 * scale), y / (60 * scale), 3);
      const py = y + 3 * scale * noise.fbm(x / (50 * scale) + 30, y / (50 * scale), 3);
      const dx = (px - toe.x) / scale;
      const dy = (py - toe.y) / scale;
      const i = y * size.width + x;
      const solid = inMetal(dx, dy);
      const metal = solid > 0 ? etched(noise, cast, plate, dx, dy) : 0;
      const backing = 0.13 + 0.03 * noise.ridged(x / (30 * scale), y / (30 * scale), 3);
      const cover = smoothstep(-1.5, 1.5, solid);
      grey.data[i] = backing + cover * (metal - backing);
    }
  }
  openCrack(grey, noise, crack, scale);
  const soft = blurred(grey, Math.max(1, Math.round(scale)));
  const picture = develop(warmTint(soft), { ...exposureOfMicrograph, contrast: 1.1 }, seed + 4);
  return { ...picture, truth: { pixelSizeMm: weldPixelUm / 1000 / scale, toe, crack } };
}

/** Positive inside metal, in pixels from the outline; the bead rises from the toe to the upright plate. */
function inMetal(dx: number, dy: number): number {
  const upright = -560 - dx;
  const bead = 380;
  const belly = 46 * Math.sin(Math.PI * Math.min(1, Math.max(0, (dx + 560) / 560)));
  const face = dy + (-dx / 560) * bead + belly * 0.72;
  const underBead = dx < 0 ? Math.min(face * 0.82, -dx + 200) : -1e3;
  return Math.max(dy, underBead, upright);
}

/** Where the weld metal ends: depth into the plate under the bead, and into the upright. */
function fusion(dx: number, dy: number): number {
  const across = dx + 285;
  const below = 118 - dy - (across * across) / 720;
  const side = dx + 640 + 0.12 * dy + (dy < -200 ? (-200 - dy) * 0.42 : 0);
  return Math.min(below, side);
}

function etched(noise: Noise, cast: Grains, plate: Grains, dx: number, dy: number): number {
  const inside = fusion(dx, dy) + 12 * noise.fbm(dx / 70, dy / 70, 3);
  const fine = noise.fbm(dx / 2.4, dy / 2.4, 3, 0.65);
  const rolling = noise.fbm(dx / 160, dy / 6, 4, 0.6);
  const uprightRolling = noise.fbm(dx / 6, dy / 160 + 70, 4, 0.6);
  const stain = noise.fbm(dx / 300 + 8, dy / 300, 3);
  if (inside > 0) {
    // Cast grains stand across the fusion line and lean towards the bead's middle.
    const lean = Math.atan2(dy + 470, dx + 90);
    const radial = Math.hypot(dy + 470, dx + 90);
    const hit = cast.at(lean * 26 + 0.3 * noise.fbm(dx / 50, dy / 50, 3), radial / 105);
    const columns = cast.trait(hit, 1) - 0.5;
    const pass = noise.at(inside / 46 + 20, lean * 0.7);
    return (
      0.53 +
      0.12 * columns +
      0.05 * fine +
      0.05 * pass +
      0.03 * stain -
      0.08 * Math.exp(-inside / 5)
    );
  }
  const distance = -inside;
  const heat = 1 - smoothstep(84, 128, distance);
  const coarse = 1 - smoothstep(8, 62, distance);
  const hit = plate.at(dx / 9, dy / 9);
  const texture = (plate.trait(hit, 1) - 0.5) * (0.04 + 0.09 * coarse);
  const bands = dx < -560 && dy < 0 ? uprightRolling : rolling;
  const base = 0.69 + 0.045 * bands * (1 - heat) + 0.03 * fine + 0.03 * stain;
  const edge = Math.exp(-(((distance - 104) / 14) ** 2));
  // The upright only stands on the plate: the root beyond the weld stays open.
  const root = dx < -560 ? 0.5 * Math.exp(-((dy / 3.2) ** 2)) : 0;
  return base - root - heat * (0.22 - 0.06 * (1 - coarse)) - 0.07 * edge + texture;
}

function crackPath(noise: Noise, toe: PixelPoint, depth: number, scale: number): PixelPoint[] {
  const points: PixelPoint[] = [];
  const steps = 60;
  for (let i = 0; i <= steps; i++) {
    const t = i / steps;
    const wander = 15 * noise.fbm(t * 6, 5, 4, 0.6) * Math.min(1, t * 6);
    points.push({
      x: toe.x + scale * (1 - 62 * t + 34 * t * t + wander),
      y: toe.y - 2 * scale + depth * t,
    });
  }
  return points;
}

/** Darkens along the crack: widest at the toe, with oxide lips, thinning to nothing at the tip. */
function openCrack(
  grey: { width: number; height: number; data: Float32Array },
  noise: Noise,
  path: readonly PixelPoint[],
  scale: number,
): void {
  const last = path.length - 1;
  for (let i = 0; i < last; i++) {
    const a = path[i]!;
    const b = path[i + 1]!;
    const t = i / last;
    const open = scale * (5.2 * Math.pow(1 - t, 0.8) + 0.9) * (1 + 0.4 * noise.at(i / 3, 9));
    const reach = Math.ceil(open * 2.5 + 3);
    for (let y = Math.floor(a.y); y < Math.ceil(b.y); y++) {
      const along = Math.min(1, Math.max(0, (y - a.y) / (b.y - a.y)));
      const middle = a.x + along * (b.x - a.x) + 1.3 * scale * noise.fbm(y / (5 * scale), 3, 3);
      for (let x = Math.floor(middle - reach); x <= middle + reach; x++) {
        if (x < 0 || x >= grey.width || y < 0 || y >= grey.height) continue;
        const off = Math.abs(x - middle);
        const dark = 1 - smoothstep(open * 0.4, open * 0.62 + 0.9, off);
        const lips = 0.22 * Math.exp(-off / (open * 0.8)) * (1 - t);
        const at = y * grey.width + x;
        const held = grey.data[at]! * (1 - lips);
        grey.data[at] = held + dark * (0.07 - held);
      }
    }
  }
}
