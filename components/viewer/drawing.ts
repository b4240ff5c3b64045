import type { Geometry } from "@/lib/images/mark-schemas";
import { distancePx, type Point } from "@/lib/imaging/point";
import type { DrawingTool } from "./tools";

/** How the tool in hand draws. */
export type DrawingOptions = {
  /** Origin: a second press names where clock angles start. */
  hasLandmark: boolean;
  landmarkName: string;
  /** Area: it is the outline of the section. */
  isOutline: boolean;
  /** Length: along several points instead of two. */
  isAlongLine: boolean;
};
export const PLAIN_OPTIONS: DrawingOptions = {
  hasLandmark: false,
  landmarkName: "keyway",
  isOutline: false,
  isAlongLine: false,
};

/** Points at which a shape is complete by itself; null where the person says when. */
export function completeAt(tool: DrawingTool, options: DrawingOptions): number | null {
  switch (tool) {
    case "origin":
      return options.hasLandmark ? 2 : 1;
    case "length":
      return options.isAlongLine ? null : 2;
    case "scale":
      return 2;
    case "angle":
      return 3;
    case "note":
      return 1;
    default:
      return null;
  }
}

/** Fewest points a shape can be saved with. */
export function leastPoints(tool: DrawingTool, options: DrawingOptions): number {
  const all = completeAt(tool, options);
  if (all !== null) return all;
  return tool === "area" ? 3 : tool === "count" ? 1 : 2;
}

/** The shape that the points draw, or null while there are too few; a scale is no mark. */
export function shapeOf(
  tool: DrawingTool,
  points: readonly Point[],
  options: DrawingOptions,
): Geometry | null {
  const [first, second, third] = points;
  if (!first || points.length < leastPoints(tool, options)) return null;
  const plain = points.map(([x, y]): [number, number] => [x, y]);
  const pair = ([x, y]: Point): [number, number] => [x, y];
  switch (tool) {
    case "scale":
      return null;
    case "origin":
      return {
        tool,
        point: pair(first),
        landmark:
          options.hasLandmark && second
            ? { point: pair(second), name: options.landmarkName.trim() || "landmark" }
            : null,
      };
    case "note":
      return { tool, point: pair(first) };
    case "angle":
      return second && third ? { tool, points: [pair(first), pair(second), pair(third)] } : null;
    case "ratchet":
      return { tool, lines: linesOf(points).map(([a, b]) => [pair(a), pair(b)]) };
    case "area":
      return { tool, points: plain, isOutline: options.isOutline };
    default:
      return { tool, points: plain };
  }
}

function linesOf(points: readonly Point[]): [Point, Point][] {
  return points.flatMap((outer, i): [Point, Point][] => {
    const inner = points[i + 1];
    return i % 2 === 0 && inner ? [[outer, inner]] : [];
  });
}

/** Whether a press closes the area: near its first point, in screen pixels. */
export function closesArea(
  tool: DrawingTool,
  points: readonly Point[],
  at: Point,
  scale: number,
): boolean {
  const first = points[0];
  return (
    tool === "area" &&
    first !== undefined &&
    points.length >= 3 &&
    distancePx(first, at) * scale < 10
  );
}

export type Drawing = {
  tool: DrawingTool;
  points: readonly Point[];
  options: DrawingOptions;
};

/**
 * What a press at `at` makes of a drawing: its points, and the shape when that ends it. The second
 * press of a double press ends a shape without a fixed number of points and adds nothing to any.
 */
export function afterPress(
  { tool, points, options }: Drawing,
  at: Point,
  { isSecond, scale }: { isSecond: boolean; scale: number },
): { points: readonly Point[]; done: Geometry | null } {
  const all = completeAt(tool, options);
  if (isSecond) return { points, done: all === null ? shapeOf(tool, points, options) : null };
  if (closesArea(tool, points, at, scale)) return { points, done: shapeOf(tool, points, options) };
  // A shape that is whole but not saved is drawn anew.
  const next = all !== null && points.length >= all ? [at] : [...points, at];
  // A note is saved when its words are written.
  const isWhole = next.length === all && tool !== "note";
  return { points: next, done: isWhole ? shapeOf(tool, next, options) : null };
}

/** Moves one point of a shape; the order is that of `pointsOf`. */
export function withPointMoved(geometry: Geometry, index: number, to: Point): Geometry {
  const at: [number, number] = [to[0], to[1]];
  switch (geometry.tool) {
    case "origin":
      return index === 1 && geometry.landmark
        ? { ...geometry, landmark: { ...geometry.landmark, point: at } }
        : { ...geometry, point: at };
    case "note":
      return { ...geometry, point: at };
    case "ratchet":
      return {
        ...geometry,
        lines: geometry.lines.map(([a, b], i) => [
          i * 2 === index ? at : a,
          i * 2 + 1 === index ? at : b,
        ]),
      };
    case "angle": {
      const [a, b, c] = geometry.points;
      return {
        ...geometry,
        points: [index === 0 ? at : a, index === 1 ? at : b, index === 2 ? at : c],
      };
    }
    default:
      return { ...geometry, points: geometry.points.map((p, i) => (i === index ? at : p)) };
  }
}

/** Takes one point out of a line, an area or a count; null where the shape needs it. */
export function withoutPoint(geometry: Geometry, index: number): Geometry | null {
  switch (geometry.tool) {
    case "front":
    case "length":
    case "area":
    case "count": {
      const least = geometry.tool === "area" ? 3 : geometry.tool === "count" ? 1 : 2;
      if (geometry.points.length <= least) return null;
      return { ...geometry, points: geometry.points.filter((_, i) => i !== index) };
    }
    case "ratchet":
      if (geometry.lines.length <= 1) return null;
      return { ...geometry, lines: geometry.lines.filter((_, i) => i !== Math.floor(index / 2)) };
    default:
      return null;
  }
}

/** Puts a point half way after the given one, so that a line can be followed more closely. */
export function withPointAfter(geometry: Geometry, index: number): Geometry | null {
  if (geometry.tool !== "front" && geometry.tool !== "length" && geometry.tool !== "area") {
    return null;
  }
  const { points } = geometry;
  const from = points[index];
  const to = points[index + 1] ?? (geometry.tool === "area" ? points[0] : undefined);
  if (!from || !to) return null;
  const between: [number, number] = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2];
  return { ...geometry, points: points.toSpliced(index + 1, 0, between) };
}
