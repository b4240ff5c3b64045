import { drawBlock, drawLine, drawText, textWidth } from "./draw";
import { Noise } from "./noise";
import type { Picture, PixelPoint, ScaleBar } from "./picture";

/** A steel rule lying in the picture; `corner` is the upper left of its visible part. */
export interface RulePlace {
  corner: PixelPoint;
  pixelSizeMm: number;
  lengthMm: number;
  heightMm: number;
  /** Millimetres between numbered graduations. */
  numberEveryMm: number;
}

/** Side margin of a rule in millimetres, beyond its first and last graduation. */
function marginMm(place: RulePlace): number {
  return 0.3 * place.heightMm + 0.6;
}

/** Where the first and last graduation of a rule lie. */
export function ruleScale(place: RulePlace): ScaleBar {
  const left = place.corner.x + marginMm(place) / place.pixelSizeMm;
  const y = place.corner.y + (0.2 * place.heightMm) / place.pixelSizeMm;
  return {
    from: { x: left, y },
    to: { x: left + place.lengthMm / place.pixelSizeMm, y },
    lengthMm: place.lengthMm,
  };
}

/** Draws the rule, brushed steel with engraved graduations along its upper edge; answers the scale between its ends. */
export function drawRule(picture: Picture, place: RulePlace, seed: number): ScaleBar {
  const perMm = 1 / place.pixelSizeMm;
  const { corner } = place;
  const margin = marginMm(place) * perMm;
  const width = place.lengthMm * perMm + 2 * margin;
  const height = place.heightMm * perMm;
  const noise = new Noise(seed);
  const shadow = Math.max(2, 0.06 * height);
  drawBlock(picture, { x: corner.x + shadow, y: corner.y + shadow }, width, height, () => [0.03]);
  drawBlock(picture, corner, width, height, (x, y) => {
    const along = (x - corner.x) / width;
    const brushed = noise.fbm(x / (3 * perMm), y / (0.06 * perMm), 3);
    const down = (y - corner.y) / height;
    const bevel = down < 0.02 ? 0.14 : down > 0.97 ? -0.12 : 0;
    const value = 0.56 + 0.1 * along - 0.07 * down + 0.035 * brushed + bevel;
    return [value, value * 0.99, value * 0.965];
  });
  const left = corner.x + margin;
  const line = Math.max(1, 0.0225 * height);
  const dark = [0.1, 0.1, 0.11];
  for (let half = 0; half <= place.lengthMm * 2; half++) {
    const mm = half / 2;
    const numbered = mm % place.numberEveryMm === 0;
    if (half % 2 === 1 && perMm < 20) continue;
    const share = numbered ? 0.5 : half % 2 === 1 ? 0.2 : mm % 5 === 0 ? 0.42 : 0.3;
    const x = left + mm * perMm;
    drawLine(picture, { x, y: corner.y + line }, { x, y: corner.y + height * share }, line, dark);
    if (!numbered) continue;
    const digits = String(mm);
    const size = Math.min(height * 0.22, place.numberEveryMm * perMm * 0.25);
    const at = { x: x - textWidth(digits, size) / 2, y: corner.y + height * 0.6 };
    drawText(picture, digits, at, size, dark);
  }
  const unit = { x: left + 0.55 * place.numberEveryMm * perMm, y: corner.y + height * 0.72 };
  if (place.numberEveryMm * perMm > height * 1.2) {
    drawText(picture, "mm", unit, height * 0.13, dark);
  }
  return ruleScale(place);
}
