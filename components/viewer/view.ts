import type { Point } from "@/lib/imaging/point";

/** How the picture lies on the screen: screen = picture times scale plus offset, in CSS pixels. */
export type View = { scale: number; x: number; y: number };

export function toScreen([x, y]: Point, view: View): Point {
  return [x * view.scale + view.x, y * view.scale + view.y];
}

export function toPicture([x, y]: Point, view: View): Point {
  return [(x - view.x) / view.scale, (y - view.y) / view.scale];
}

/** The nearest place on the picture, to a hundredth of a pixel. */
export function ontoPicture([x, y]: Point, picture: { widthPx: number; heightPx: number }): Point {
  const keep = (value: number, most: number) =>
    Math.round(Math.min(Math.max(value, 0), most) * 100) / 100;
  return [keep(x, picture.widthPx), keep(y, picture.heightPx)];
}
