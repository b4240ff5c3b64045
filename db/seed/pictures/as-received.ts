import { develop } from "./develop";
import { drawBlock, drawText, type Ink } from "./draw";
import { Noise } from "./noise";
import type { Picture, PixelPoint, ScaledPicture, Size } from "./picture";
import { drawRule } from "./rule";
import { shaftScene } from "./shaft-scene";

/** Millimetres per pixel at 2000 pixels wide. */
export const asReceivedPixelMm = 0.132;

/** Words on the card that lies beside the part. */
export interface CardWords {
  caseNumber: string;
  item: string;
  lines: readonly string[];
}

/** The part as it came: on grey cloth with its label card and a steel rule. */
export function drawAsReceived(size: Size, seed: number, words: CardWords): ScaledPicture {
  const scale = size.width / 2000;
  const pixelSizeMm = asReceivedPixelMm / scale;
  const scene = shaftScene(size, {
    pixelSizeMm,
    face: { x: 0.25 * size.width, y: 0.42 * size.height },
    runsDeg: 6,
    turnDeg: 58,
    journalMm: 46,
    shoulderRadiusMm: 36,
    shoulderMm: 118,
    seed,
  });
  const exposure = { bits: 8, grain: 0.012, vignette: 0.26, contrast: 1.06, lift: 0.015 } as const;
  const picture = develop(scene, exposure, seed + 3);
  drawCard(picture, { x: 0.62 * size.width, y: 0.7 * size.height }, 450 * scale, words, seed);
  const scaleBar = drawRule(
    picture,
    {
      corner: { x: 0.06 * size.width, y: 0.84 * size.height },
      pixelSizeMm,
      lengthMm: 100,
      heightMm: 18,
      numberEveryMm: 10,
    },
    seed + 5,
  );
  return { ...picture, scaleBar };
}

export function asReceived(size: Size, seed: number): ScaledPicture {
  return drawAsReceived(size, seed, {
    caseNumber: "RL-2026-0142",
    item: "E1",
    lines: ["SHAFT HALF, GEAR SIDE", "18 NOV 2026", "SEAL 40218"],
  });
}

function drawCard(
  picture: Picture,
  corner: PixelPoint,
  widthPx: number,
  words: CardWords,
  seed: number,
): void {
  const noise = new Noise(seed + 31);
  const heightPx = widthPx * 0.62;
  const drop = widthPx * 0.012;
  drawBlock(picture, { x: corner.x + drop, y: corner.y + drop }, widthPx, heightPx, () => [0.1]);
  drawBlock(picture, corner, widthPx, heightPx, (x, y): Ink => {
    const paper = 0.8 - 0.06 * ((x - corner.x) / widthPx) + 0.012 * noise.fbm(x / 4, y / 4, 3);
    return [paper, paper * 0.99, paper * 0.955];
  });
  const ink = [0.12, 0.12, 0.15];
  const unit = widthPx / 100;
  drawText(
    picture,
    words.caseNumber,
    { x: corner.x + 6 * unit, y: corner.y + 8 * unit },
    6 * unit,
    ink,
  );
  drawText(picture, words.item, { x: corner.x + 80 * unit, y: corner.y + 7 * unit }, 9 * unit, ink);
  const rule = { x: corner.x + 6 * unit, y: corner.y + 20 * unit };
  drawBlock(picture, rule, 88 * unit, 0.7 * unit, () => ink);
  words.lines.forEach((line, i) => {
    const at = { x: corner.x + 6 * unit, y: corner.y + (26 + 11 * i) * unit };
    drawText(picture, line, at, 4.2 * unit, ink);
  });
}
