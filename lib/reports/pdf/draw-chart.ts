import "server-only";
import { PRINT_COLOURS } from "@/lib/charts/palette";
import type { Chart, TextPrimitive } from "@/lib/charts/primitives";
import { shapeOf, type Shape } from "@/lib/charts/shapes";
import type { Typesetter } from "./typesetter";

/** Draws a chart as vectors with its upper left corner at (x, y), `scale` points to the pixel. */
export function drawChart(
  doc: PDFKit.PDFDocument,
  type: Typesetter,
  chart: Chart,
  at: { x: number; y: number; scale: number },
): void {
  doc.save();
  doc.translate(at.x, at.y).scale(at.scale);
  for (const primitive of chart.primitives) {
    if (primitive.kind === "text") drawText(doc, type, primitive);
    else drawShape(doc, shapeOf(primitive));
  }
  doc.restore();
}

function drawShape(doc: PDFKit.PDFDocument, shape: Shape): void {
  doc.save();
  if (shape.opacity !== undefined) doc.opacity(shape.opacity);
  doc.path(shape.d);
  if (shape.stroke) {
    const { token, widthPx, dashPx } = shape.stroke;
    doc.lineWidth(widthPx).lineJoin("round").strokeColor(PRINT_COLOURS[token]);
    if (dashPx) doc.dash([...dashPx]);
  }
  if (shape.fill) doc.fillColor(PRINT_COLOURS[shape.fill]);
  if (shape.fill && shape.stroke) doc.fillAndStroke();
  else if (shape.fill) doc.fill();
  else doc.stroke();
  doc.restore();
}

function drawText(doc: PDFKit.PDFDocument, type: Typesetter, text: TextPrimitive): void {
  const style = {
    family: "sans",
    weight: text.weight === 600 ? "semibold" : "regular",
    sizePt: text.sizePx,
    leadingPt: text.sizePx,
    colour: PRINT_COLOURS[text.token],
    tabular: true,
  } as const;
  const line = type.lines([{ text: text.text }], style, Number.MAX_SAFE_INTEGER)[0];
  if (!line) return;
  const shift = { start: 0, middle: line.widthPt / 2, end: line.widthPt }[text.anchor];
  if (text.rotateDeg) {
    doc.save();
    doc.rotate(text.rotateDeg, { origin: [text.x, text.y] });
    type.draw(line, text.x - shift, text.y);
    doc.restore();
  } else {
    type.draw(line, text.x - shift, text.y);
  }
}
