import { drawBlock, drawLine, drawText, textWidth } from "./draw";
import type { Picture, ScaleBar } from "./picture";

/** What the microscope writes under its picture. */
export interface SemNotes {
  pixelSizeUm: number;
  barUm: number;
  accelerationKv: number;
  workingDistanceMm: number;
  magnification: number;
  detector: string;
}

const SEM_BAR_PX = 56;

/** Writes the data strip over the lowest rows of a picture; answers the scale bar's ends. */
export function drawSemBar(picture: Picture, notes: SemNotes): ScaleBar {
  const top = picture.height - SEM_BAR_PX;
  drawBlock(picture, { x: 0, y: top }, picture.width, SEM_BAR_PX, () => [0.02]);
  const white = [0.94];
  const size = 17;
  const y = top + 20;
  const words = [
    `${notes.accelerationKv.toFixed(1)} kV`,
    `WD ${notes.workingDistanceMm.toFixed(1)} mm`,
    `x${notes.magnification}`,
    notes.detector,
  ];
  let left = 24;
  for (const word of words) {
    drawText(picture, word, { x: left, y }, size, white, 1.7);
    left += textWidth(word, size) + 44;
  }
  const length = notes.barUm / notes.pixelSizeUm;
  const to = { x: picture.width - 40, y: top + 41 };
  const from = { x: to.x - length, y: to.y };
  drawLine(picture, from, to, 2.4, white);
  for (const end of [from, to]) {
    drawLine(picture, { x: end.x, y: end.y - 7 }, { x: end.x, y: end.y + 7 }, 2.4, white);
  }
  const label = `${notes.barUm} µm`;
  const at = { x: (from.x + to.x - textWidth(label, size)) / 2, y: top + 8 };
  drawText(picture, label, at, size, white, 1.7);
  return { from, to, lengthMm: notes.barUm / 1000 };
}
