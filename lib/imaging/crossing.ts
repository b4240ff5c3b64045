import { type Point, withoutRepeats } from "./point";

/** Which side of the line a-b the point c is on: positive, negative, or 0 on it. */
function side([ax, ay]: Point, [bx, by]: Point, [cx, cy]: Point): number {
  return Math.sign((bx - ax) * (cy - ay) - (by - ay) * (cx - ax));
}

function isWithin([ax, ay]: Point, [bx, by]: Point, [px, py]: Point): boolean {
  return (
    px >= Math.min(ax, bx) &&
    px <= Math.max(ax, bx) &&
    py >= Math.min(ay, by) &&
    py <= Math.max(ay, by)
  );
}

/** Whether two closed segments share a point. */
export function segmentsMeet(a: Point, b: Point, c: Point, d: Point): boolean {
  const abc = side(a, b, c);
  const abd = side(a, b, d);
  const cda = side(c, d, a);
  const cdb = side(c, d, b);
  if (abc !== abd && cda !== cdb) return true;
  return (
    (abc === 0 && isWithin(a, b, c)) ||
    (abd === 0 && isWithin(a, b, d)) ||
    (cda === 0 && isWithin(c, d, a)) ||
    (cdb === 0 && isWithin(c, d, b))
  );
}

type Side = { from: Point; to: Point; index: number; least: number; most: number };

/**
 * Whether a closed polygon crosses or touches itself, so that its area would mean nothing. Sides are
 * swept from left to right, so an outline of thousands of corners is checked in good time. A corner
 * given twice in a row is one corner: a side without length crosses nothing.
 */
export function crossesItself(corners: readonly Point[]): boolean {
  const points = withoutRepeats(corners);
  const count = points.length;
  const sides: Side[] = [];
  for (const [index, from] of points.entries()) {
    const to = points[(index + 1) % count] ?? from;
    sides.push({
      from,
      to,
      index,
      least: Math.min(from[0], to[0]),
      most: Math.max(from[0], to[0]),
    });
  }
  sides.sort((a, b) => a.least - b.least);
  let open: Side[] = [];
  for (const one of sides) {
    open = open.filter((other) => other.most >= one.least);
    for (const other of open) {
      const apart = Math.abs(one.index - other.index);
      if (apart === 1 || apart === count - 1) {
        if (foldsBack(one, other)) return true;
      } else if (segmentsMeet(one.from, one.to, other.from, other.to)) return true;
    }
    open.push(one);
  }
  return false;
}

/** Neighbouring sides share a corner; they overlap when one runs back along the other. */
function foldsBack(one: Side, other: Side): boolean {
  const [first, second] = samePlace(one.to, other.from) ? [one, other] : [other, one];
  if (side(first.from, first.to, second.to) !== 0) return false;
  const back =
    (first.from[0] - first.to[0]) * (second.to[0] - second.from[0]) +
    (first.from[1] - first.to[1]) * (second.to[1] - second.from[1]);
  return back > 0;
}

function samePlace([ax, ay]: Point, [bx, by]: Point): boolean {
  return ax === bx && ay === by;
}
