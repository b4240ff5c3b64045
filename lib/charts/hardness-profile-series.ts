import type { ProfilePoint, ProfileSeries } from "./hardness-profile-input";
import { isDrawable, type ProfileFrame } from "./hardness-profile-frame";
import type { ChartToken, LegendEntry, MarkerShape, Primitive } from "./primitives";
import { thinMarkers } from "./thin-markers";

type SeriesStyle = {
  token: ChartToken;
  shape: MarkerShape;
  widthPx: number;
  dashPx?: readonly number[];
};

// Each differs from the others in line and in mark, so that grey print still tells them apart.
const STYLES = [
  { token: "ch-1", shape: "filled-circle", widthPx: 1.7 },
  { token: "ch-2", shape: "open-square", widthPx: 1.2, dashPx: [4, 3] },
  { token: "ch-3", shape: "open-triangle", widthPx: 1.4, dashPx: [1.5, 3] },
  { token: "ch-4", shape: "open-circle", widthPx: 1.2, dashPx: [7, 3, 1.5, 3] },
] as const satisfies readonly SeriesStyle[];

const CONVERTED_TOKEN = "ch-3";
const MARKER_SPACING_PX = 14;
const CAP_PX = 3.5;

export function seriesStyle(index: number): SeriesStyle {
  return STYLES[index % STYLES.length] ?? STYLES[0];
}

/** Points in the order they are joined: by depth, readings at one depth as they came. */
export function joinedPoints(series: ProfileSeries): ProfilePoint[] {
  return series.points
    .filter((point) => isDrawable(point) && !point.leftOut && !point.convertedFrom)
    .toSorted((a, b) => a.depthMm - b.depthMm);
}

export function drawSeries(
  series: ProfileSeries,
  index: number,
  frame: ProfileFrame,
): { marks: Primitive[]; joined: { x: number; y: number }[] } {
  const style = seriesStyle(index);
  const place = (point: ProfilePoint) => ({
    x: frame.xOf(point.depthMm),
    y: frame.yOf(point.hardnessHv),
    point,
  });
  const drawable = series.points.filter(isDrawable);
  const joined = joinedPoints(series).map(place);
  const leftOut = drawable.filter((point) => point.leftOut).map(place);
  const converted = drawable.filter((p) => p.convertedFrom && !p.leftOut).map(place);
  const flagged = drawable.filter((point) => point.flagged).map(place);
  const marks: Primitive[] = [];
  if (joined.length > 1) {
    marks.push({
      kind: "polyline",
      points: joined.map(({ x, y }) => [x, y] as const),
      stroke: {
        token: style.token,
        widthPx: style.widthPx,
        ...(style.dashPx && { dashPx: style.dashPx }),
      },
    });
  }
  const { axis, ground } = frame.tokens;
  for (const at of kept(joined)) {
    marks.push(...errorBar(at.point, at.x, frame, style.token));
    marks.push({
      kind: "marker",
      shape: style.shape,
      x: at.x,
      y: at.y,
      token: style.token,
      ground,
    });
  }
  for (const at of kept(leftOut)) {
    marks.push(...errorBar(at.point, at.x, frame, axis));
    marks.push({ kind: "marker", shape: "cross", x: at.x, y: at.y, token: axis, ground });
  }
  for (const { x, y } of kept(converted)) {
    marks.push({ kind: "marker", shape: "open-diamond", x, y, token: CONVERTED_TOKEN, ground });
  }
  for (const { x, y } of kept(flagged)) {
    marks.push({ kind: "circle", x, y, r: 8, stroke: { token: "warn-mark", widthPx: 1.6 } });
  }
  return { marks, joined };
}

function kept<T extends { x: number; y: number }>(points: readonly T[]): T[] {
  return thinMarkers(points, MARKER_SPACING_PX).flatMap((index) => points[index] ?? []);
}

function errorBar(
  point: ProfilePoint,
  x: number,
  frame: ProfileFrame,
  token: ChartToken,
): Primitive[] {
  const half = point.expandedUncertaintyHv;
  if (half === null || !(half > 0) || !Number.isFinite(half)) return [];
  const low = frame.yOf(point.hardnessHv - half);
  const high = frame.yOf(point.hardnessHv + half);
  const cap = (y: number) => `M${x - CAP_PX} ${y}h${2 * CAP_PX}`;
  const d = `M${x} ${low}V${high}${cap(low)}${cap(high)}`;
  return [{ kind: "path", d, stroke: { token, widthPx: 1.1 } }];
}

export function profileLegend(
  series: readonly ProfileSeries[],
  axisToken: ChartToken,
): LegendEntry[] {
  const entries: LegendEntry[] = series.map((one, index) => {
    const { token, shape, widthPx, dashPx } = seriesStyle(index);
    const bars = one.points.some((point) => (point.expandedUncertaintyHv ?? 0) > 0);
    return {
      text: `${one.label} measured${bars ? ", bars k = 2" : ""}`,
      token,
      shape,
      line: { widthPx, ...(dashPx && { dashPx }) },
    };
  });
  const points = series.flatMap((one) => one.points);
  const scales = new Set(points.flatMap((point) => point.convertedFrom ?? []));
  for (const scale of scales) {
    entries.push({
      text: `converted from ${scale}`,
      token: CONVERTED_TOKEN,
      shape: "open-diamond",
    });
  }
  if (points.some((point) => point.leftOut)) {
    entries.push({ text: "left out", token: axisToken, shape: "cross" });
  }
  return entries;
}
