import { PRINT_COLOURS } from "./palette";
import type { Chart, ChartToken, Primitive, Stroke, TextPrimitive } from "./primitives";
import { px, shapeOf } from "./shapes";

const FONT = "Inter, Arial, sans-serif";

/** The chart as a file that stands alone: white ground, fixed colours, no outside references. */
export function chartToSvg(chart: Chart): string {
  const { widthPx, heightPx } = chart;
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${px(widthPx)}" height="${px(heightPx)}" ` +
      `viewBox="0 0 ${px(widthPx)} ${px(heightPx)}" role="img" font-family="${FONT}">`,
    `<title>${escapeXml(chart.title)}</title>`,
    `<desc>${escapeXml(chart.description)}</desc>`,
    `<rect width="100%" height="100%" fill="#ffffff"/>`,
    ...chart.primitives.map(element),
    `</svg>\n`,
  ].join("\n");
}

function element(primitive: Primitive): string {
  if (primitive.kind === "text") return textElement(primitive);
  const shape = shapeOf(primitive);
  const opacity = shape.opacity === undefined ? "" : ` opacity="${shape.opacity}"`;
  const fill = shape.fill ? colour(shape.fill) : "none";
  return `<path d="${shape.d}" fill="${fill}"${strokeAttributes(shape.stroke)}${opacity}/>`;
}

function textElement(text: TextPrimitive): string {
  const turn = text.rotateDeg
    ? ` transform="rotate(${text.rotateDeg} ${px(text.x)} ${px(text.y)})"`
    : "";
  return (
    `<text x="${px(text.x)}" y="${px(text.y)}" fill="${colour(text.token)}" font-size="${text.sizePx}" ` +
    `font-weight="${text.weight}" text-anchor="${text.anchor}"${turn}>${escapeXml(text.text)}</text>`
  );
}

function strokeAttributes(stroke: Stroke | undefined): string {
  if (!stroke) return "";
  const dash = stroke.dashPx ? ` stroke-dasharray="${stroke.dashPx.join(" ")}"` : "";
  return ` stroke="${colour(stroke.token)}" stroke-width="${stroke.widthPx}"${dash}`;
}

function colour(token: ChartToken): string {
  return PRINT_COLOURS[token];
}

/** Also drops the control characters that XML 1.0 has no way to write. */
function escapeXml(text: string): string {
  return text
    .replace(/[\u0000-\u0008\u000B\u000C\u000E-\u001F\uFFFE\uFFFF]/g, "")
    .replaceAll("&", "&amp;")
    .replaceAll("<", "&lt;")
    .replaceAll(">", "&gt;")
    .replaceAll('"', "&quot;");
}
