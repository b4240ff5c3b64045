import { formatWithUncertainty } from "@/lib/format/numbers";
import type { PixelSize } from "@/lib/imaging/calibration";
import { mmFromUm } from "@/lib/units/length";

/** Pixels smaller than this are given in micrometres. */
const SMALL_PIXEL_UM = 1;

/** Size of a pixel in the unit that reads best, with its expanded uncertainty, k = 2. */
export function pixelSizeText({ umPerPx, relativeUncertainty }: PixelSize): {
  value: number;
  unit: "mm" | "µm";
  expandedUncertainty: number;
  text: string;
} {
  const unit = umPerPx >= SMALL_PIXEL_UM ? "mm" : "µm";
  const value = unit === "mm" ? mmFromUm(umPerPx) : umPerPx;
  const expandedUncertainty = value * relativeUncertainty;
  const text = formatWithUncertainty(value, expandedUncertainty, unit);
  return { value, unit, expandedUncertainty, text };
}
