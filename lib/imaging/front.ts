import { distancePx, type Point } from "./point";

export type FrontDepth = {
  readonly depthPx: number;
  /** Where on the front the depth was read. */
  readonly at: Point;
  readonly from: "origin" | "chord";
};

/**
 * Depth of a crack front in pixels. With an origin: from the origin along the growth line, which
 * leaves it at right angles to the chord between the front's ends, to where it meets the front
 * farthest out. Where it does not meet the front, or with no origin: the greatest distance of the
 * front from its chord. Null for a front whose ends are one point. (Common practice.)
 */
export function frontDepth(front: readonly Point[], origin: Point | null): FrontDepth | null {
  const start = front[0];
  const end = front.at(-1);
  if (!start || !end || front.length < 2) return null;
  const chordPx = distancePx(start, end);
  if (chordPx === 0) return null;
  const normal: Point = [-(end[1] - start[1]) / chordPx, (end[0] - start[0]) / chordPx];
  if (origin) {
    const met = farthestAlong(front, origin, normal);
    if (met) return { depthPx: distancePx(origin, met), at: met, from: "origin" };
  }
  let best: FrontDepth | null = null;
  for (const at of front) {
    const depthPx = Math.abs((at[0] - start[0]) * normal[0] + (at[1] - start[1]) * normal[1]);
    if (!best || depthPx > best.depthPx) best = { depthPx, at, from: "chord" };
  }
  return best;
}

/** Where the line through `origin` along `direction` meets the front farthest from the origin. */
function farthestAlong(front: readonly Point[], origin: Point, direction: Point): Point | null {
  let farthest: Point | null = null;
  const offset = ([x, y]: Point) => (x - origin[0]) * direction[1] - (y - origin[1]) * direction[0];
  front.forEach((to, i) => {
    const from = front[i - 1];
    if (!from) return;
    const a = offset(from);
    const b = offset(to);
    if (a === b || (a > 0 === b > 0 && a !== 0 && b !== 0)) return;
    const share = a / (a - b);
    const met: Point = [from[0] + share * (to[0] - from[0]), from[1] + share * (to[1] - from[1])];
    if (!farthest || distancePx(origin, met) > distancePx(origin, farthest)) farthest = met;
  });
  return farthest;
}
