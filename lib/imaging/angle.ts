import { distancePx, type Point } from "./point";

const DEGREES = 180 / Math.PI;

/** Angle at `corner` between two arms, 0 to 180 degrees; null where an arm has no length. */
export function angleDeg(arm: Point, corner: Point, otherArm: Point): number | null {
  const a: Point = [arm[0] - corner[0], arm[1] - corner[1]];
  const b: Point = [otherArm[0] - corner[0], otherArm[1] - corner[1]];
  if (Math.hypot(...a) === 0 || Math.hypot(...b) === 0) return null;
  const cross = a[0] * b[1] - a[1] * b[0];
  const dot = a[0] * b[0] + a[1] * b[1];
  return Math.abs(Math.atan2(cross, dot)) * DEGREES;
}

/**
 * Standard uncertainty of an angle in degrees when each of its three points is picked with the
 * standard uncertainty `pickPx` in each direction. An end moves the angle by 1/r; the corner moves it
 * by the length of the vector sum of both ends' sensitivities (GUM JCGM 100:2008, 5.1.2).
 */
export function anglePickUncertaintyDeg(
  arm: Point,
  corner: Point,
  otherArm: Point,
  pickPx: number,
): number | null {
  const angle = angleDeg(arm, corner, otherArm);
  if (angle === null) return null;
  const first = 1 / distancePx(arm, corner);
  const second = 1 / distancePx(otherArm, corner);
  // The two sensitivities are at right angles to the arms and of opposite sense.
  const cornerSquared = first ** 2 + second ** 2 - 2 * first * second * Math.cos(angle / DEGREES);
  return pickPx * Math.sqrt(first ** 2 + second ** 2 + cornerSquared) * DEGREES;
}

/** Direction from one point to another, clockwise from straight up, 0 up to 360 degrees; null if the same. */
export function bearingDeg([fromX, fromY]: Point, [toX, toY]: Point): number | null {
  const x = toX - fromX;
  const y = toY - fromY;
  if (x === 0 && y === 0) return null;
  return wrapDeg(Math.atan2(x, -y) * DEGREES);
}

/** The same direction from 0 up to, not including, 360 degrees. */
export function wrapDeg(degrees: number): number {
  const wrapped = ((degrees % 360) + 360) % 360;
  // A hair below 0 rounds to 360, and the remainder of a negative whole turn is -0.
  return wrapped === 0 ? 0 : wrapped;
}

/** Smallest arc that holds all directions, in degrees; 0 for one direction, null for none. */
export function smallestArcDeg(directionsDeg: readonly number[]): number | null {
  const sorted = directionsDeg.map(wrapDeg).sort((a, b) => a - b);
  const first = sorted[0];
  if (first === undefined) return null;
  let widestGap = 0;
  sorted.forEach((direction, i) => {
    const next = sorted[i + 1] ?? first + 360;
    widestGap = Math.max(widestGap, next - direction);
  });
  return sorted.length === 1 ? 0 : 360 - widestGap;
}
