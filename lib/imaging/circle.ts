import { distancePx, type Point } from "./point";

export type Circle = {
  readonly centre: Point;
  readonly radiusPx: number;
  /** Root mean square distance of the points from the circle, in pixels. */
  readonly residualPx: number;
};

/**
 * Circle of least squares through three points or more, in pixels: the algebraic fit of
 * x2 + y2 + D x + E y + F = 0 about the centre of the points (Kasa's method; mathematics).
 * Null where the points lie on a line.
 */
export function circleThrough(points: readonly Point[]): Circle | null {
  const count = points.length;
  if (count < 3) return null;
  const meanX = points.reduce((sum, [x]) => sum + x, 0) / count;
  const meanY = points.reduce((sum, [, y]) => sum + y, 0) / count;
  let uu = 0;
  let vv = 0;
  let uv = 0;
  let uz = 0;
  let vz = 0;
  for (const [x, y] of points) {
    const u = x - meanX;
    const v = y - meanY;
    const z = u * u + v * v;
    uu += u * u;
    vv += v * v;
    uv += u * v;
    uz += u * z;
    vz += v * z;
  }
  const determinant = uu * vv - uv * uv;
  if (determinant <= 1e-12 * (uu + vv) ** 2) return null;
  const u = (uz * vv - vz * uv) / (2 * determinant);
  const v = (vz * uu - uz * uv) / (2 * determinant);
  const centre: Point = [u + meanX, v + meanY];
  const radiusPx = Math.sqrt(u * u + v * v + (uu + vv) / count);
  const squares = points.reduce(
    (sum, point) => sum + (distancePx(point, centre) - radiusPx) ** 2,
    0,
  );
  return { centre, radiusPx, residualPx: Math.sqrt(squares / count) };
}

/** Shares of the radius within which an outline counts as round (own choice). */
const CORNERS_WITHIN = 0.03;
/** A polygon of seven sides leaves 1 - cos(180°/7) = 9.9 %, a hexagonal bar 13 %, a square one 29 %. */
const SIDES_WITHIN = 0.1;

/**
 * Whether an outline is round, `circle` being the one through its corners. The corners alone do not
 * say: those of a square lie on a circle too, so the middles of the sides are looked at as well.
 */
export function isRound(
  { centre, radiusPx, residualPx }: Circle,
  outline: readonly Point[],
): boolean {
  return (
    residualPx <= CORNERS_WITHIN * radiusPx &&
    outline.every(([x, y], i) => {
      const [nextX, nextY] = outline[(i + 1) % outline.length] ?? [x, y];
      const middle: Point = [(x + nextX) / 2, (y + nextY) / 2];
      return radiusPx - distancePx(middle, centre) <= SIDES_WITHIN * radiusPx;
    })
  );
}
