import type { Chart, LegendEntry, Primitive } from "./primitives";
import { estimateTextWidthPx } from "./text-width";

const ROW_PX = 20;
const GAP_PX = 20;
const SIDE_PX = 12;
const SIZE_PX = 12;

/** The same chart with its legend written under the plot, where a caption does not say it. */
export function withLegend(chart: Chart): Chart {
  if (chart.legend.length === 0) return chart;
  const inkToken = chart.ground === "paper" ? "paper-ink" : "ink";
  const added: Primitive[] = [];
  let x = SIDE_PX;
  let row = 0;
  for (const entry of chart.legend) {
    const symbolPx = entry.line ? 26 : 14;
    const widthPx = symbolPx + 6 + estimateTextWidthPx(entry.text, SIZE_PX);
    if (x > SIDE_PX && x + widthPx > chart.widthPx - SIDE_PX) {
      x = SIDE_PX;
      row += 1;
    }
    const y = chart.heightPx + 10 + row * ROW_PX;
    added.push(...symbol(entry, x, y, symbolPx, chart.ground), {
      kind: "text",
      x: x + symbolPx + 6,
      y: y + 4,
      text: entry.text,
      token: inkToken,
      sizePx: SIZE_PX,
      weight: 400,
      anchor: "start",
    });
    x += widthPx + GAP_PX;
  }
  return {
    ...chart,
    heightPx: chart.heightPx + (row + 1) * ROW_PX + 4,
    primitives: [...chart.primitives, ...added],
  };
}

function symbol(
  entry: LegendEntry,
  x: number,
  y: number,
  widthPx: number,
  ground: Chart["ground"],
): Primitive[] {
  const marker: Primitive = {
    kind: "marker",
    shape: entry.shape,
    x: x + widthPx / 2,
    y,
    token: entry.token,
    ground,
  };
  if (!entry.line) return [marker];
  const stroke = { token: entry.token, ...entry.line };
  return [{ kind: "line", x1: x, y1: y, x2: x + widthPx, y2: y, stroke }, marker];
}
