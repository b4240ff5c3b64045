import { type ScaleLinear, scaleLinear } from "d3-scale";
import type { HardnessProfileInput, ProfilePoint } from "./hardness-profile-input";
import type { Box } from "./label-space";
import type { ChartToken, Primitive } from "./primitives";
import { estimateTextWidthPx } from "./text-width";

export type ProfileTokens = {
  ground: ChartToken;
  ink: ChartToken;
  axis: ChartToken;
  grid: ChartToken;
  band: ChartToken;
  bandText: ChartToken;
};

/** On paper the frame is warm; the colours of series and limit stay the same. */
export const PROFILE_TOKENS: Record<HardnessProfileInput["theme"], ProfileTokens> = {
  screen: {
    ground: "surface",
    ink: "ink",
    axis: "ch-axis",
    grid: "ch-grid",
    band: "ch-band",
    bandText: "met",
  },
  paper: {
    ground: "paper",
    ink: "paper-ink",
    axis: "paper-ink-2",
    grid: "paper-rule",
    band: "paper-band",
    bandText: "paper-ink-2",
  },
};

export type ProfileFrame = {
  plot: Box;
  xOf: (depthMm: number) => number;
  yOf: (hardnessHv: number) => number;
  xTicks: readonly number[];
  yTicks: readonly number[];
  yMinorTicks: readonly number[];
  yRangeHv: readonly [number, number];
  tokens: ProfileTokens;
};

const MARGIN_PX = { left: 52, top: 16, bottom: 46, rightPlain: 16, rightScale: 54 };
const LEAST_RANGE_HV = 100;
/** Between two labels of the depth axis. */
const LABEL_GAP_PX = 10;
const AXIS_TEXT = { sizePx: 12, weight: 400 } as const;

export function isDrawable(point: ProfilePoint): boolean {
  return Number.isFinite(point.depthMm) && Number.isFinite(point.hardnessHv);
}

/** Works out plot area and scales so that points, bars, limit and band all lie inside. */
export function frameOf(input: HardnessProfileInput): ProfileFrame {
  const { widthPx, heightPx } = input.size;
  const right = input.convertedScale ? MARGIN_PX.rightScale : MARGIN_PX.rightPlain;
  const plot = {
    x: MARGIN_PX.left,
    y: MARGIN_PX.top,
    width: Math.max(60, widthPx - MARGIN_PX.left - right),
    height: Math.max(60, heightPx - MARGIN_PX.top - MARGIN_PX.bottom),
  };
  const points = input.series.flatMap((series) => series.points).filter(isDrawable);
  const x = depthScale(input, points).range([plot.x, plot.x + plot.width]);
  const y = hardnessScale(input, points).range([plot.y + plot.height, plot.y]);
  const yMinorTicks = y.ticks(10);
  return {
    plot,
    xOf: (depthMm) => x(depthMm),
    yOf: (hardnessHv) => y(hardnessHv),
    xTicks: depthTicks(x, plot.width),
    yTicks: y.ticks(5),
    yMinorTicks,
    yRangeHv: [y.domain()[0] ?? 0, y.domain()[1] ?? 1],
    tokens: PROFILE_TOKENS[input.theme],
  };
}

function depthScale(input: HardnessProfileInput, points: readonly ProfilePoint[]) {
  let low = 0;
  let high = input.requiredDepth?.maxMm ?? 0;
  for (const point of points) {
    low = Math.min(low, point.depthMm);
    high = Math.max(high, point.depthMm);
  }
  const span = high - low > 0 ? high - low : 1;
  return scaleLinear().domain([low, low + span * 1.02]);
}

/** As many round depths as their labels leave room for. */
function depthTicks(x: ScaleLinear<number, number>, widthPx: number): number[] {
  for (let wanted = Math.max(2, Math.round(widthPx / 55)); wanted > 1; wanted--) {
    const ticks = x.ticks(wanted);
    const textOf = tickText(ticks);
    const widest = Math.max(
      ...ticks.map((tick) => estimateTextWidthPx(textOf(tick), AXIS_TEXT.sizePx)),
    );
    const [first = 0, second = Infinity] = ticks.map((tick) => x(tick));
    if (second - first >= widest + LABEL_GAP_PX) return ticks;
  }
  return x.ticks(1);
}

function hardnessScale(input: HardnessProfileInput, points: readonly ProfilePoint[]) {
  let low = Infinity;
  let high = -Infinity;
  for (const { hardnessHv, expandedUncertaintyHv } of points) {
    low = Math.min(low, hardnessHv - (expandedUncertaintyHv ?? 0));
    high = Math.max(high, hardnessHv + (expandedUncertaintyHv ?? 0));
  }
  if (input.limit) {
    low = Math.min(low, input.limit.hv);
    high = Math.max(high, input.limit.hv);
  }
  if (low > high) [low, high] = [0, 1000];
  // Equal readings still need a scale around them, and scatter of a few HV must not fill the plot.
  const short = Math.max(0, LEAST_RANGE_HV - (high - low)) / 2;
  low -= short;
  high += short;
  const span = high - low;
  return scaleLinear()
    .domain([Math.max(0, low - span * 0.12), high + span * 0.06])
    .nice(10);
}

/** Band, grid, both axes with their ticks and titles. */
export function drawFrame(input: HardnessProfileInput, frame: ProfileFrame): Primitive[] {
  const { plot, tokens } = frame;
  const bottom = plot.y + plot.height;
  const right = plot.x + plot.width;
  const grid = { token: tokens.grid, widthPx: 1 };
  const axis = { token: tokens.axis, widthPx: 1 };
  const out: Primitive[] = [];
  if (input.requiredDepth) {
    const x1 = Math.max(plot.x, frame.xOf(input.requiredDepth.minMm));
    const x2 = Math.min(right, frame.xOf(input.requiredDepth.maxMm));
    const width = Math.max(0, x2 - x1);
    out.push({ kind: "rect", x: x1, y: plot.y, width, height: plot.height, fill: tokens.band });
  }
  for (const hv of frame.yMinorTicks) {
    const y = frame.yOf(hv);
    out.push({ kind: "line", x1: plot.x, y1: y, x2: right, y2: y, stroke: grid });
  }
  const depthText = tickText(frame.xTicks);
  for (const depthMm of frame.xTicks) {
    const x = frame.xOf(depthMm);
    out.push({ kind: "line", x1: x, y1: plot.y, x2: x, y2: bottom, stroke: grid });
    out.push(axisText(x, bottom + 17, depthText(depthMm), "middle", tokens));
  }
  for (const hv of frame.yTicks) {
    out.push(axisText(plot.x - 8, frame.yOf(hv) + 4, String(hv), "end", tokens));
  }
  const d = `M${plot.x} ${plot.y}V${bottom}H${right}${input.convertedScale ? `V${plot.y}` : ""}`;
  out.push({ kind: "path", d, stroke: axis });
  const middle = plot.y + plot.height / 2;
  out.push(
    title(plot.x + plot.width / 2, bottom + 38, "Depth below surface, mm", tokens),
    title(13, middle, `${input.scaleLabel}, measured`, tokens, -90),
  );
  if (input.convertedScale) {
    out.push(...convertedTicks(input.convertedScale, frame));
    out.push(
      title(
        input.size.widthPx - 6,
        middle,
        `≈ ${input.convertedScale.name}, converted`,
        tokens,
        -90,
      ),
    );
  }
  return out;
}

/** Ticks stand where the table puts them, so they are unevenly spaced; crowded labels are dropped. */
function convertedTicks(
  scale: NonNullable<HardnessProfileInput["convertedScale"]>,
  frame: ProfileFrame,
): Primitive[] {
  const { plot, tokens } = frame;
  const right = plot.x + plot.width;
  const out: Primitive[] = [];
  let lastLabelY = Infinity;
  const ticks = scale.ticks.filter(
    ({ hv }) => Number.isFinite(hv) && hv >= frame.yRangeHv[0] && hv <= frame.yRangeHv[1],
  );
  for (const { hv, label } of ticks.toSorted((a, b) => a.hv - b.hv)) {
    const y = frame.yOf(hv);
    const stroke = { token: tokens.axis, widthPx: 1 };
    out.push({ kind: "line", x1: right, y1: y, x2: right + 5, y2: y, stroke });
    if (lastLabelY - y < 13) continue;
    out.push(axisText(right + 9, y + 4, label, "start", tokens));
    lastLabelY = y;
  }
  return out;
}

function tickText(ticks: readonly number[]): (value: number) => string {
  const step = ticks.length > 1 ? Math.abs((ticks[1] ?? 0) - (ticks[0] ?? 0)) : 1;
  const decimals = Math.min(6, Math.max(1, -Math.floor(Math.log10(step) + 1e-9)));
  return (value) => value.toFixed(decimals).replace("-", "−");
}

function axisText(
  x: number,
  y: number,
  text: string,
  anchor: "start" | "middle" | "end",
  tokens: ProfileTokens,
): Primitive {
  return { kind: "text", x, y, text, anchor, token: tokens.axis, ...AXIS_TEXT };
}

function title(
  x: number,
  y: number,
  text: string,
  tokens: ProfileTokens,
  rotateDeg?: number,
): Primitive {
  const turned = rotateDeg === undefined ? {} : { rotateDeg };
  return { kind: "text", x, y, text, anchor: "middle", token: tokens.ink, ...AXIS_TEXT, ...turned };
}
