import { angleDeg } from "@/lib/imaging/angle";
import { distancePx, type Point, polylineLengthPx } from "@/lib/imaging/point";
import { polygonCentroid } from "@/lib/imaging/polygon";
import type { MarkTool } from "./constants";
import type { Geometry } from "./mark-schemas";

/** Four hues for four kinds of mark; the kind is in the drawn form too. */
export type MarkHue = "origin" | "front" | "final" | "length";
export const HUE_OF_TOOL: Record<MarkTool, MarkHue> = {
  origin: "origin",
  ratchet: "origin",
  front: "front",
  area: "final",
  length: "length",
  angle: "length",
  count: "length",
  note: "origin",
};

/** Point half way along a line, or at another share of its length. */
export function midpointOf(points: readonly Point[], along = 0.5): Point {
  const half = polylineLengthPx(points) * along;
  let walked = 0;
  for (const [i, to] of points.entries()) {
    const from = points[i - 1];
    if (!from) continue;
    const step = distancePx(from, to);
    if (step > 0 && walked + step >= half) {
      const share = (half - walked) / step;
      return [from[0] + share * (to[0] - from[0]), from[1] + share * (to[1] - from[1])];
    }
    walked += step;
  }
  return points[0] ?? [0, 0];
}

function topOf(points: readonly Point[]): Point {
  return points.reduce<Point>((top, point) => (point[1] < top[1] ? point : top), [0, Infinity]);
}

export type LabelPlace = {
  /** In image pixels. */
  at: Point;
  /** How the label's box lies to that place; none lies over it. */
  side: "over" | "below" | "above" | "left" | "right";
};

/** Where the label of a mark goes. */
export function labelPlace(geometry: Geometry): LabelPlace {
  switch (geometry.tool) {
    case "origin":
      return { at: geometry.point, side: "below" };
    case "note":
      return { at: geometry.point, side: "right" };
    case "ratchet":
      return { at: geometry.lines[0]?.[0] ?? [0, 0], side: "left" };
    case "front":
      // Lengths are drawn across the middle of fronts, so a front's label keeps off it.
      return { at: midpointOf(geometry.points, 0.3), side: "over" };
    case "length":
      return { at: midpointOf(geometry.points), side: "over" };
    case "area":
      // The outline holds all else, so its label keeps outside, at its top.
      return geometry.isOutline
        ? { at: topOf(geometry.points), side: "above" }
        : { at: polygonCentroid(geometry.points) ?? midpointOf(geometry.points), side: "over" };
    case "angle":
      return { at: geometry.points[1], side: "below" };
    case "count":
      return { at: geometry.points[0] ?? [0, 0], side: "above" };
  }
}

const place = ([x, y]: Point) => `${round(x)} ${round(y)}`;
const round = (value: number) => Math.round(value * 100) / 100;
const line = (points: readonly Point[]) => points.map(place).join("L");

/** Stroked path of a mark, in image pixels times `scale`; points and rings are drawn apart. */
export function markPath(geometry: Geometry, scale = 1): string {
  const scaled = (points: readonly Point[]): Point[] =>
    points.map(([x, y]) => [x * scale, y * scale]);
  switch (geometry.tool) {
    case "origin":
    case "note":
    case "count":
      return "";
    case "ratchet":
      return geometry.lines.map((one) => `M${line(scaled(one))}`).join("");
    case "area":
      return `M${line(scaled(geometry.points))}Z`;
    case "angle":
      return `M${line(scaled(geometry.points))}${angleArc(geometry.points, scale)}`;
    case "front":
    case "length":
      return `M${line(scaled(geometry.points))}`;
  }
}

/** The little arc between the arms of an angle, at a third of the shorter arm. */
function angleArc([arm, corner, otherArm]: readonly [Point, Point, Point], scale: number): string {
  const a = distancePx(arm, corner);
  const b = distancePx(otherArm, corner);
  if (angleDeg(arm, corner, otherArm) === null) return "";
  const radius = Math.min(a, b) / 3;
  const on = ([x, y]: Point, reach: number): Point => [
    (corner[0] + ((x - corner[0]) * radius) / reach) * scale,
    (corner[1] + ((y - corner[1]) * radius) / reach) * scale,
  ];
  const cross =
    (arm[0] - corner[0]) * (otherArm[1] - corner[1]) -
    (arm[1] - corner[1]) * (otherArm[0] - corner[0]);
  const sweep = cross > 0 ? 1 : 0;
  const reach = round(radius * scale);
  return `M${place(on(arm, a))}A${reach} ${reach} 0 0 ${sweep} ${place(on(otherArm, b))}`;
}
