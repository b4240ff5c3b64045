import { type Point, withoutRepeats } from "./point";

/** Twice the signed area, by the shoelace formula (mathematics; Gauss). */
function twiceSignedArea(points: readonly Point[]): number {
  let sum = 0;
  points.forEach(([x, y], i) => {
    const [nextX, nextY] = points[(i + 1) % points.length] ?? [x, y];
    sum += x * nextY - nextX * y;
  });
  return sum;
}

/** Area of a simple polygon in square pixels, whichever way round its corners go. */
export function polygonAreaPx2(points: readonly Point[]): number {
  return Math.abs(twiceSignedArea(points)) / 2;
}

/** Centre of gravity of a simple polygon; null where it has no area. */
export function polygonCentroid(points: readonly Point[]): Point | null {
  const doubled = twiceSignedArea(points);
  if (doubled === 0) return null;
  let x = 0;
  let y = 0;
  points.forEach(([ax, ay], i) => {
    const [bx, by] = points[(i + 1) % points.length] ?? [ax, ay];
    const cross = ax * by - bx * ay;
    x += (ax + bx) * cross;
    y += (ay + by) * cross;
  });
  return [x / (3 * doubled), y / (3 * doubled)];
}

/** Whether a point is inside a polygon, by the even-odd rule. */
export function isInside([x, y]: Point, points: readonly Point[]): boolean {
  let inside = false;
  points.forEach(([ax, ay], i) => {
    const [bx, by] = points[(i + 1) % points.length] ?? [ax, ay];
    if (ay > y !== by > y && x < ((bx - ax) * (y - ay)) / (by - ay) + ax) inside = !inside;
  });
  return inside;
}

/**
 * Standard uncertainty of a polygon's area from picking its corners, each coordinate with the
 * standard uncertainty `pickPx`: u(A)2 = u2 sum (dA/dx)2 + (dA/dy)2, where dA/dx of a corner is half
 * the difference of its neighbours' y, and dA/dy that of their x (GUM JCGM 100:2008, 5.1.2). A
 * corner given twice in a row was picked once.
 */
export function polygonPickUncertaintyPx2(corners: readonly Point[], pickPx: number): number {
  const points = withoutRepeats(corners);
  let squares = 0;
  points.forEach((_, i) => {
    const before = points[(i - 1 + points.length) % points.length];
    const after = points[(i + 1) % points.length];
    if (before && after) {
      squares += ((after[1] - before[1]) / 2) ** 2 + ((after[0] - before[0]) / 2) ** 2;
    }
  });
  return pickPx * Math.sqrt(squares);
}
