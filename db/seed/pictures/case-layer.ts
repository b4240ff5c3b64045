import { blurred } from "./blur";
import { develop } from "./develop";
import { Grains } from "./grains";
import { Noise, smoothstep } from "./noise";
import { createRaster, type Picture, type PixelPoint, type Size } from "./picture";
import { exposureOfMicrograph, warmTint } from "./tempered-martensite";

/** Micrometres per pixel at 1600 pixels wide; written into the file's resolution. */
export const caseLayerPixelUm = 3.2;

/** One Vickers indent: depth below the edge, and mean diagonal. */
export interface Indent {
  depthMm: number;
  diagonalUm: number;
}

/** HV1 traverse through an induction-hardened layer about 2 mm deep. */
export const filletTraverse: readonly Indent[] = [
  [0.1, 55.7],
  [0.3, 54.4],
  [0.5, 53.3],
  [0.7, 54.2],
  [0.9, 54.7],
  [1.1, 55.2],
  [1.3, 55.9],
  [1.5, 57.0],
  [1.7, 59.3],
  [1.9, 63.2],
  [2.1, 68.0],
  [2.3, 72.6],
  [2.55, 75.7],
  [2.8, 77.5],
  [3.1, 78.4],
  [3.5, 78.9],
  [4.0, 78.5],
].map(([depthMm, diagonalUm]) => ({ depthMm: depthMm!, diagonalUm: diagonalUm! }));

export interface CaseLayerTruth {
  pixelSizeMm: number;
  /** Row of the true surface at the traverse, and the traverse's column. */
  surface: PixelPoint;
  indents: Array<{ centre: PixelPoint; depthMm: number; diagonalUm: number }>;
  /** Depth at which the etched contrast changes half-way. */
  transitionMm: number;
}

export interface CaseLayerPicture extends Picture {
  truth: CaseLayerTruth;
}

const TRANSITION_MM = 1.98;

/** Etched section through a hardened layer, edge at the top in the mounting resin, one row of indents. */
export function caseLayer(size: Size, seed: number): CaseLayerPicture {
  const scale = size.width / 1600;
  const noise = new Noise(seed + 1);
  const grains = new Grains(seed + 2, 1, 0.45);
  const mm = caseLayerPixelUm / 1000 / scale;
  const surfaceY = Math.round(0.1 * size.height);
  const column = Math.round(0.52 * size.width);
  const grey = createRaster(size, 1);
  for (let y = 0; y < size.height; y++) {
    for (let x = 0; x < size.width; x++) {
      const mx = x * mm;
      const my = (y - surfaceY) * mm;
      const rough = 0.006 * noise.fbm(mx / 0.16, 3, 4, 0.6);
      const depth = my - rough;
      grey.data[y * size.width + x] =
        depth < 0 ? resin(noise, mx, my, depth) : section(noise, grains, mx, my, depth);
    }
  }
  const truth: CaseLayerTruth = {
    pixelSizeMm: mm,
    surface: { x: column, y: surfaceY },
    transitionMm: TRANSITION_MM,
    indents: filletTraverse.map((indent, i) => ({
      ...indent,
      // Zigzag in three columns keeps neighbours three diagonals apart.
      centre: {
        x: column + ((i % 3) - 1) * (0.18 / mm),
        y: surfaceY + indent.depthMm / mm,
      },
    })),
  };
  const soft = blurred(grey, Math.max(1, Math.round(scale)));
  for (const indent of truth.indents) {
    if (indent.centre.y > size.height + 20) continue;
    press(soft, noise, indent.centre, indent.diagonalUm / 2000 / mm);
  }
  return { ...develop(warmTint(soft), exposureOfMicrograph, seed + 3), truth };
}

function resin(noise: Noise, mx: number, my: number, depth: number): number {
  const filler = noise.ridged(mx / 0.09, my / 0.09, 3);
  const gap = Math.exp(depth / 0.012);
  return 0.16 + 0.07 * Math.max(0, filler - 0.55) + 0.02 * noise.at(mx / 0.5, my / 0.5) - 0.1 * gap;
}

function section(noise: Noise, grains: Grains, mx: number, my: number, depth: number): number {
  const uneven = 0.05 * noise.fbm(mx / 0.9, my / 0.9, 3) + 0.05 * noise.fbm(mx / 0.3, my / 0.06, 3);
  const soft = smoothstep(TRANSITION_MM - 0.42, TRANSITION_MM + 0.42, depth + uneven);
  const bands = noise.fbm(mx / 2.3 + 4, my / 0.1, 4, 0.65);
  const fine = noise.fbm(mx / 0.02, my / 0.02, 3, 0.65);
  const hit = grains.at(mx / 0.032, my / 0.032);
  const tone = grains.trait(hit, 1) - 0.5;
  const dark = 0.4 + 0.035 * fine + 0.016 * bands;
  const core = 0.66 + 0.06 * tone + 0.055 * fine + 0.034 * bands - 0.03 * Math.exp(-hit.edge / 0.1);
  const mixed = dark + soft * (core - dark);
  // The heat-affected fringe etches darkest just before the core.
  const fringe = Math.exp(-(((depth + uneven - TRANSITION_MM - 0.12) / 0.16) ** 2));
  const rounding = Math.exp(-depth / 0.015);
  const scratch = noise.at(mx * 0.3 + my * 1.1, 7) * noise.at((mx - 0.4 * my) / 0.011, 55);
  return mixed - 0.06 * fringe - 0.16 * rounding + 0.02 * Math.max(0, scratch - 0.3);
}

/** A Vickers indent seen from above: dark pyramid, lighter ridges, a faint pushed-up rim. */
function press(
  grey: { width: number; height: number; data: Float32Array },
  noise: Noise,
  centre: PixelPoint,
  half: number,
): void {
  const reach = Math.ceil(half * 1.6);
  for (let y = Math.round(centre.y) - reach; y <= Math.round(centre.y) + reach; y++) {
    for (let x = Math.round(centre.x) - reach; x <= Math.round(centre.x) + reach; x++) {
      if (x < 0 || y < 0 || x >= grey.width || y >= grey.height) continue;
      const dx = x - centre.x;
      const dy = y - centre.y;
      const sum = Math.abs(dx) + Math.abs(dy);
      const inside = 1 - smoothstep(half - 0.9, half + 0.6, sum);
      const ridge = Math.exp(-((Math.min(Math.abs(dx), Math.abs(dy)) / (0.05 * half + 0.45)) ** 2));
      const facet = dx + dy > 0 ? 0.05 : dx - dy > 0 ? 0.0 : -0.03;
      const i = y * grey.width + x;
      const floor = 0.13 + facet + 0.26 * ridge + 0.02 * noise.at(x / 3, y / 3);
      const held = grey.data[i]! + 0.05 * Math.exp(-(((sum - half * 1.12) / (0.16 * half)) ** 2));
      grey.data[i] = held + inside * (floor - held);
    }
  }
}
