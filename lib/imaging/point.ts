/** Place on a picture in pixels: x to the right, y down, from the top left corner. */
export type Point = readonly [x: number, y: number];

export function distancePx([ax, ay]: Point, [bx, by]: Point): number {
  return Math.hypot(bx - ax, by - ay);
}

/** Sum of the pieces of a line, in pixels; 0 for fewer than two points. */
export function polylineLengthPx(points: readonly Point[]): number {
  let sum = 0;
  points.forEach((point, i) => {
    const before = points[i - 1];
    if (before) sum += distancePx(before, point);
  });
  return sum;
}

/** Smallest upright box around points; null of none. */
export function boundsPx(
  points: readonly Point[],
): { left: number; top: number; right: number; bottom: number } | null {
  if (points.length === 0) return null;
  const bounds = { left: Infinity, top: Infinity, right: -Infinity, bottom: -Infinity };
  for (const [x, y] of points) {
    bounds.left = Math.min(bounds.left, x);
    bounds.right = Math.max(bounds.right, x);
    bounds.top = Math.min(bounds.top, y);
    bounds.bottom = Math.max(bounds.bottom, y);
  }
  return bounds;
}
