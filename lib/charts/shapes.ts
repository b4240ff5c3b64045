import type { ChartToken, MarkerShape, Primitive, Stroke } from "./primitives";

/** One outline with its paint: all a drawing back end needs beside text. */
export type Shape = { d: string; fill?: ChartToken; stroke?: Stroke; opacity?: number };

type Drawn = Exclude<Primitive, { kind: "text" }>;

const MARKER_STROKE_PX = 1.4;

/** Coordinates to a hundredth of a pixel, which keeps files small and output stable. */
export function px(value: number): string {
  return String(Math.round(value * 100) / 100);
}

/** Lowers every mark but text to an outline. */
export function shapeOf(primitive: Drawn): Shape {
  switch (primitive.kind) {
    case "path":
      return paint(primitive.d, primitive);
    case "line":
      return {
        d: `M${px(primitive.x1)} ${px(primitive.y1)}L${px(primitive.x2)} ${px(primitive.y2)}`,
        stroke: primitive.stroke,
      };
    case "polyline":
      return {
        d: primitive.points.map(([x, y], i) => `${i === 0 ? "M" : "L"}${px(x)} ${px(y)}`).join(""),
        stroke: primitive.stroke,
      };
    case "rect":
      return paint(rectPath(primitive), primitive);
    case "circle":
      return paint(circlePath(primitive.x, primitive.y, primitive.r), primitive);
    case "marker":
      return markerShape(primitive.shape, primitive.x, primitive.y, primitive);
  }
}

function paint(d: string, from: Omit<Shape, "d">): Shape {
  return {
    d,
    ...(from.fill && { fill: from.fill }),
    ...(from.stroke && { stroke: from.stroke }),
    ...(from.opacity !== undefined && { opacity: from.opacity }),
  };
}

function circlePath(x: number, y: number, r: number): string {
  return `M${px(x - r)} ${px(y)}a${px(r)} ${px(r)} 0 1 0 ${px(2 * r)} 0a${px(r)} ${px(r)} 0 1 0 ${px(-2 * r)} 0z`;
}

function rectPath(rect: {
  x: number;
  y: number;
  width: number;
  height: number;
  radius?: number;
}): string {
  const { x, y, width, height } = rect;
  const r = Math.min(rect.radius ?? 0, width / 2, height / 2);
  if (r <= 0) return `M${px(x)} ${px(y)}h${px(width)}v${px(height)}h${px(-width)}z`;
  const arc = (dx: number, dy: number) => `a${px(r)} ${px(r)} 0 0 1 ${px(dx)} ${px(dy)}`;
  return (
    `M${px(x + r)} ${px(y)}h${px(width - 2 * r)}${arc(r, r)}v${px(height - 2 * r)}${arc(-r, r)}` +
    `h${px(2 * r - width)}${arc(-r, -r)}v${px(2 * r - height)}${arc(r, -r)}z`
  );
}

function markerShape(
  shape: MarkerShape,
  x: number,
  y: number,
  paintedWith: { token: ChartToken; ground: ChartToken },
): Shape {
  const { token, ground } = paintedWith;
  const open = { fill: ground, stroke: { token, widthPx: MARKER_STROKE_PX } };
  const at = `M${px(x)} ${px(y)}`;
  switch (shape) {
    case "filled-circle":
      return { d: circlePath(x, y, 3.7), fill: token };
    case "open-circle":
      return { d: circlePath(x, y, 3.6), ...open };
    case "open-square":
      return { d: `${at}m-3.2 -3.2h6.4v6.4h-6.4z`, ...open };
    case "open-triangle":
      return { d: `${at}m0 -4.4l4.2 7.4h-8.4z`, ...open };
    case "open-diamond":
      return { d: `${at}m0 -6l6 6l-6 6l-6 -6z`, ...open };
    case "cross":
      return { d: `${at}m-4 -4l8 8m0 -8l-8 8`, stroke: { token, widthPx: 1.5 } };
  }
}
