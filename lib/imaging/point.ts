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

/** The corners of a closed shape without those that repeat the one before, as a shaky press gives. */
export function withoutRepeats(corners: readonly Point[]): Point[] {
  return corners.filter(([x, y], i) => {
    const before = corners[(i - 1 + corners.length) % corners.length];
    return corners.length === 1 || !before || before[0] !== x || before[1] !== y;
  });
}
