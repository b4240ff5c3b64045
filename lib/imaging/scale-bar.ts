export type ScaleBar = { readonly lengthUm: number; readonly widthPx: number };

const MOST_WIDTH_PX = 160;
const STEPS = [5, 2, 1] as const;

/**
 * The longest bar of 1, 2 or 5 times a power of ten micrometres that is at most 160 pixels wide. It
 * is at least 80 wide, but where the next step up would be 2 to 5: there it may be down to 64.
 */
export function scaleBar(umPerPx: number): ScaleBar | null {
  if (!(umPerPx > 0) || !Number.isFinite(umPerPx)) return null;
  const most = MOST_WIDTH_PX * umPerPx;
  const power = 10 ** Math.floor(Math.log10(most));
  const fitting = STEPS.map((step) => step * power).find((length) => length <= most * (1 + 1e-12));
  const lengthUm = fitting ?? power;
  return { lengthUm, widthPx: lengthUm / umPerPx };
}

const UNITS = [
  { unit: "m", um: 1e6 },
  { unit: "mm", um: 1e3 },
  { unit: "µm", um: 1 },
  { unit: "nm", um: 1e-3 },
] as const;

/** The bar's length in the largest unit that keeps it whole, "10 mm", "500 µm", "200 nm". */
export function scaleBarUnit(lengthUm: number): { value: number; unit: string } {
  const chosen = UNITS.find(({ um }) => lengthUm >= um * (1 - 1e-9)) ?? UNITS[3];
  return { value: Number((lengthUm / chosen.um).toPrecision(1)), unit: chosen.unit };
}
