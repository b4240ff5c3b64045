import "server-only";
import { formatQuantity } from "@/lib/format/numbers";
import type { Point } from "@/lib/imaging/point";
import { scaleBar, scaleBarUnit } from "@/lib/imaging/scale-bar";
import { textPath, textWidthPx } from "./figure-text";
import { HUE_OF_TOOL, labelPlace, markPath, type MarkHue } from "./mark-layout";
import { markLabel } from "./mark-label";
import { pointsOf } from "./mark-schemas";
import type { StoredMark } from "./picture-marks";

/** The same hues as on the bench. */
const HUES: Record<MarkHue, string> = {
  origin: "#ffd65a",
  front: "#6fd3ff",
  final: "#ff9d76",
  length: "#a6f0b4",
};
const CASING = "#000000";

type Frame = {
  widthPx: number;
  heightPx: number;
  /** Figure pixels to one picture pixel. */
  scale: number;
  /** Line weights and letters grow with the figure, so that a print of any size reads alike. */
  unit: number;
};

/** Marks and scale bar as an SVG of the figure's size. */
export function figureOverlay(
  marks: readonly StoredMark[],
  umPerPicturePx: number | null,
  size: { widthPx: number; heightPx: number; scale: number },
): string {
  const frame: Frame = { ...size, unit: Math.max(size.widthPx, size.heightPx) / 1000 };
  const shapes = marks.map((mark) => shape(mark, frame)).join("");
  const labels = marks.map((mark) => label(mark, frame)).join("");
  const bar = umPerPicturePx === null ? "" : bar_(umPerPicturePx / size.scale, frame);
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${size.widthPx}" height="${size.heightPx}">${shapes}${labels}${bar}</svg>`;
}

function shape({ content: { geometry } }: StoredMark, { scale, unit }: Frame): string {
  const hue = HUES[HUE_OF_TOOL[geometry.tool]];
  const path = markPath(geometry, scale);
  const width = 2 * unit;
  const dash =
    geometry.tool === "ratchet" || (geometry.tool === "area" && geometry.isOutline)
      ? ` stroke-dasharray="${6 * unit} ${4 * unit}"`
      : "";
  const fill =
    geometry.tool === "area" && !geometry.isOutline
      ? `<path d="${path}" fill="${hue}" fill-opacity="0.13"/>`
      : "";
  const strokes = path
    ? `<path d="${path}" fill="none" stroke="${CASING}" stroke-opacity="0.6" stroke-width="${width + 3 * unit}" stroke-linejoin="round" stroke-linecap="round"/><path d="${path}" fill="none" stroke="${hue}" stroke-width="${width}" stroke-linejoin="round"${dash}/>`
    : "";
  return fill + strokes + points(pointsOf(geometry), geometry.tool, hue, scale, unit);
}

function points(
  all: readonly Point[],
  tool: StoredMark["content"]["tool"],
  hue: string,
  scale: number,
  unit: number,
): string {
  const ring = ([x, y]: Point, radius: number, filled: boolean) =>
    `<circle cx="${x * scale}" cy="${y * scale}" r="${radius}" fill="${filled ? hue : "none"}" stroke="${CASING}" stroke-opacity="0.6" stroke-width="${4 * unit}"/><circle cx="${x * scale}" cy="${y * scale}" r="${radius}" fill="${filled ? hue : "none"}" stroke="${hue}" stroke-width="${1.8 * unit}"/>`;
  switch (tool) {
    case "origin":
      return all
        .map((at, i) => (i === 0 ? ring(at, 16 * unit, false) : "") + ring(at, 3 * unit, true))
        .join("");
    case "count":
    case "note":
      return all.map((at) => ring(at, 4 * unit, true)).join("");
    case "length":
      return [all[0], all.at(-1)].flatMap((at) => (at ? [ring(at, 4 * unit, true)] : [])).join("");
    default:
      return "";
  }
}

function label({ label: name, content }: StoredMark, frame: Frame): string {
  const { unit, scale, widthPx, heightPx } = frame;
  const hue = HUES[HUE_OF_TOOL[content.tool]];
  const text = markLabel(name, content);
  const size = 17 * unit;
  const width = textWidthPx(text, size) + 14 * unit;
  const height = 26 * unit;
  const { at, side } = labelPlace(content.geometry);
  const away = content.tool === "origin" ? 24 * unit : 12 * unit;
  const x =
    at[0] * scale -
    width / 2 +
    { left: -1, right: 1, over: 0, below: 0, above: 0 }[side] * (width / 2 + away);
  const y =
    at[1] * scale -
    height / 2 +
    { left: 0, right: 0, over: 0, below: 1, above: -1 }[side] * (height / 2 + away);
  // A label never leaves the figure.
  const left = Math.min(Math.max(x, 2 * unit), widthPx - width - 2 * unit);
  const top = Math.min(Math.max(y, 2 * unit), heightPx - height - 2 * unit);
  return `<rect x="${left}" y="${top}" width="${width}" height="${height}" rx="${2 * unit}" fill="${CASING}" stroke="${hue}" stroke-width="${1.4 * unit}"/><path d="${textPath(text, left + 7 * unit, top + 19 * unit, size)}" fill="${hue}"/>`;
}

function bar_(umPerPx: number, { unit, heightPx }: Frame): string {
  // The rule of the bench, in units of the figure instead of screen pixels.
  const bar = scaleBar(umPerPx * unit * 1.6);
  if (!bar) return "";
  const { value, unit: lengthUnit } = scaleBarUnit(bar.lengthUm);
  const width = bar.lengthUm / umPerPx;
  const text = formatQuantity(value, lengthUnit);
  const size = 20 * unit;
  const textWidth = textWidthPx(text, size);
  const pad = 10 * unit;
  const box = Math.max(width, textWidth) + 2 * pad;
  const height = 54 * unit;
  const left = 20 * unit;
  const top = heightPx - 20 * unit - height;
  const start = left + (box - width) / 2;
  const y = top + 38 * unit;
  const end = 8 * unit;
  return `<rect x="${left}" y="${top}" width="${box}" height="${height}" fill="${CASING}" fill-opacity="0.78"/><path d="M${start} ${y}h${width}M${start} ${y - end}v${2 * end}M${start + width} ${y - end}v${2 * end}" stroke="#ffffff" stroke-width="${2.6 * unit}"/><path d="${textPath(text, left + (box - textWidth) / 2, top + 22 * unit, size)}" fill="#ffffff"/>`;
}
