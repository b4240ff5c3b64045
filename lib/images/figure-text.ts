import "server-only";
import { readFileSync } from "node:fs";
import path from "node:path";
import { create, type Font } from "fontkit";

let kept: Font | undefined;

/** Read once; every process starts in the project's root. */
function face(): Font {
  kept ??= create(readFileSync(path.join(process.cwd(), "app/fonts/pdf/Inter-SemiBold.ttf")));
  return kept;
}

/** Width of a line of text in pixels. */
export function textWidthPx(text: string, sizePx: number): number {
  return (face().layout(text).advanceWidth * sizePx) / face().unitsPerEm;
}

/** Outline of a line of text as path data, so that a figure needs no font that is installed. */
export function textPath(text: string, x: number, baseline: number, sizePx: number): string {
  const scale = sizePx / face().unitsPerEm;
  const run = face().layout(text);
  let pen = x;
  const parts: string[] = [];
  run.glyphs.forEach((glyph, i) => {
    parts.push(glyph.path.scale(scale, -scale).translate(pen, baseline).toSVG());
    pen += (run.positions[i]?.xAdvance ?? glyph.advanceWidth) * scale;
  });
  return parts.join("").replace(/\d+\.\d{3,}/g, (number) => Number(number).toFixed(2));
}
