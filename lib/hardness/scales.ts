/**
 * Hardness and strength scales of the published conversion tables. The limits are those of the
 * scales themselves (ASTM E140 and ISO 18265 notes; from memory), not of any one table: a value
 * beyond them converts with a warning.
 */
export interface ScaleDescription {
  /** How a value of the scale is written after its number. */
  readonly symbol: string;
  readonly name: string;
  readonly above?: number;
  readonly below?: number;
}

export const SCALES = {
  HV: { symbol: "HV", name: "Vickers" },
  HK: { symbol: "HK", name: "Knoop, 500 gf and over" },
  HBW_3000: { symbol: "HBW", name: "Brinell, carbide ball, 10 mm, 3000 kgf", above: 650 },
  HBS_3000: { symbol: "HBS", name: "Brinell, steel ball, 10 mm, 3000 kgf", above: 450 },
  HB_3000: { symbol: "HB", name: "Brinell, 10 mm, 3000 kgf, ball not stated" },
  HB_500: { symbol: "HB", name: "Brinell, 10 mm, 500 kgf, ball not stated" },
  HB_30D2: { symbol: "HB", name: "Brinell, force index 30, ball not stated" },
  HRA: { symbol: "HRA", name: "Rockwell A" },
  HRB: { symbol: "HRB", name: "Rockwell B", above: 100 },
  HRC: { symbol: "HRC", name: "Rockwell C", below: 20 },
  HRD: { symbol: "HRD", name: "Rockwell D" },
  HRF: { symbol: "HRF", name: "Rockwell F" },
  HR15N: { symbol: "HR15N", name: "Rockwell superficial 15N" },
  HR30N: { symbol: "HR30N", name: "Rockwell superficial 30N" },
  HR45N: { symbol: "HR45N", name: "Rockwell superficial 45N" },
  HR15T: { symbol: "HR15T", name: "Rockwell superficial 15T" },
  HR30T: { symbol: "HR30T", name: "Rockwell superficial 30T" },
  HR45T: { symbol: "HR45T", name: "Rockwell superficial 45T" },
  Rm_MPa: { symbol: "MPa", name: "Tensile strength, approximate" },
  Rm_ksi: { symbol: "ksi", name: "Tensile strength, approximate" },
} as const satisfies Record<string, ScaleDescription>;

export type Scale = keyof typeof SCALES;

export const SCALE_NAMES = Object.keys(SCALES) as readonly Scale[];

export function isScale(name: string): name is Scale {
  return Object.hasOwn(SCALES, name);
}

/** The sentence that warns of a value outside the limits of its own scale, or `null` inside them. */
export function scaleLimitWarning(scale: Scale, value: number): string | null {
  const { symbol, above, below }: ScaleDescription = SCALES[scale];
  if (above !== undefined && value > above)
    return `Above ${above}\u00a0${symbol}: outside the ${symbol} scale's own limits.`;
  if (below !== undefined && value < below)
    return `Below ${below}\u00a0${symbol}: outside the ${symbol} scale's own limits.`;
  return null;
}
