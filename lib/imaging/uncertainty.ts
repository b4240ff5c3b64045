import { distancePx, type Point } from "./point";

/** Coverage factor for about 95 % (GUM JCGM 100:2008, 6.2 and 6.3). */
export const COVERAGE_FACTOR = 2;

/** Picking a place on a screen at 1:1 is good to a pixel either way, k = 2 (own choice; say so). */
export const USUAL_PICK_UNCERTAINTY_PX = 1;

/** Root of the sum of squares of independent parts (GUM JCGM 100:2008, 5.1.2). */
export function combined(...parts: number[]): number {
  return Math.hypot(...parts);
}

/**
 * Standard uncertainty in pixels of a line's length when every point of it is picked with the
 * standard uncertainty `pickPx` in each direction. A point between two pieces moves the length by
 * the sum of the two unit vectors that leave it (GUM JCGM 100:2008, 5.1.2).
 */
export function lengthPickUncertaintyPx(points: readonly Point[], pickPx: number): number {
  let squares = 0;
  points.forEach((point, i) => {
    let x = 0;
    let y = 0;
    for (const other of [points[i - 1], points[i + 1]]) {
      const apart = other ? distancePx(point, other) : 0;
      if (!other || apart === 0) continue;
      x += (point[0] - other[0]) / apart;
      y += (point[1] - other[1]) / apart;
    }
    squares += x * x + y * y;
  });
  return pickPx * Math.sqrt(squares);
}

/**
 * By how much, as a fraction, a length across the tilt axis of a flat face reads short when it is not
 * corrected: 1 - cos(tilt) (projection; common practice in electron microscopy).
 */
export function tiltShortfall(tiltDeg: number): number {
  return 1 - Math.cos((tiltDeg * Math.PI) / 180);
}
