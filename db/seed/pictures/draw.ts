import { whiteOf, type Picture, type PixelPoint } from "./picture";
import { strokesOf } from "./stroke-font";

/** Grey or red, green, blue, each 0 to 1. */
export type Ink = readonly number[];

function blend(picture: Picture, x: number, y: number, ink: Ink, share: number): void {
  const white = whiteOf(picture);
  for (let channel = 0; channel < picture.channels; channel++) {
    const i = (y * picture.width + x) * picture.channels + channel;
    const wanted = (ink[channel] ?? ink[0] ?? 0) * white;
    const held = picture.data[i]!;
    picture.data[i] = Math.round(held + share * (wanted - held));
  }
}

/** Line with round ends and soft edges, `widthPx` wide. */
export function drawLine(
  picture: Picture,
  from: PixelPoint,
  to: PixelPoint,
  widthPx: number,
  ink: Ink,
  strength = 1,
): void {
  const reach = widthPx / 2 + 1;
  const x0 = Math.max(0, Math.floor(Math.min(from.x, to.x) - reach));
  const x1 = Math.min(picture.width - 1, Math.ceil(Math.max(from.x, to.x) + reach));
  const y0 = Math.max(0, Math.floor(Math.min(from.y, to.y) - reach));
  const y1 = Math.min(picture.height - 1, Math.ceil(Math.max(from.y, to.y) + reach));
  const dx = to.x - from.x;
  const dy = to.y - from.y;
  const square = dx * dx + dy * dy || 1;
  for (let y = y0; y <= y1; y++) {
    for (let x = x0; x <= x1; x++) {
      const t = Math.min(1, Math.max(0, ((x - from.x) * dx + (y - from.y) * dy) / square));
      const distance = Math.hypot(x - from.x - t * dx, y - from.y - t * dy);
      const cover = Math.min(1, Math.max(0, widthPx / 2 + 0.5 - distance));
      if (cover > 0) blend(picture, x, y, ink, cover * strength);
    }
  }
}

/** Filled rectangle; `shade` may vary the ink from pixel to pixel. */
export function drawBlock(
  picture: Picture,
  corner: PixelPoint,
  widthPx: number,
  heightPx: number,
  shade: (x: number, y: number) => Ink,
): void {
  const x1 = Math.min(picture.width, Math.round(corner.x + widthPx));
  const y1 = Math.min(picture.height, Math.round(corner.y + heightPx));
  for (let y = Math.max(0, Math.round(corner.y)); y < y1; y++) {
    for (let x = Math.max(0, Math.round(corner.x)); x < x1; x++) {
      blend(picture, x, y, shade(x, y), 1);
    }
  }
}

/** Width of a line of text in pixels. */
export function textWidth(text: string, heightPx: number): number {
  return (text.length * 5.6 - 1.6) * (heightPx / 6);
}

/** Text with its upper left corner at `at`. */
export function drawText(
  picture: Picture,
  text: string,
  at: PixelPoint,
  heightPx: number,
  ink: Ink,
  strokePx = heightPx / 8,
): void {
  const unit = heightPx / 6;
  [...text].forEach((character, index) => {
    const left = at.x + index * 5.6 * unit;
    for (const stroke of strokesOf(character)) {
      for (let i = 1; i < stroke.length; i++) {
        const [ax, ay] = stroke[i - 1]!;
        const [bx, by] = stroke[i]!;
        const from = { x: left + ax * unit, y: at.y + ay * unit };
        const to = { x: left + bx * unit, y: at.y + by * unit };
        drawLine(picture, from, to, strokePx, ink);
      }
    }
  });
}
