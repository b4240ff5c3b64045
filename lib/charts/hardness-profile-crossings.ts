import type { ProfileFrame } from "./hardness-profile-frame";
import type {
  HardnessProfileInput,
  ProfileCrossing,
  ProfileSeries,
} from "./hardness-profile-input";
import { seriesStyle } from "./hardness-profile-series";
import type { Box, LabelSpace } from "./label-space";
import type { Primitive } from "./primitives";
import { estimateTextWidthPx } from "./text-width";

const SIZE_PX = 12;
const LINE_PX = 15;
const CALLOUT_HEIGHT_PX = 36;

/** Height at which a crossing is drawn: on the limit, or on the curve where none is given. */
export function crossingY(
  input: HardnessProfileInput,
  frame: ProfileFrame,
  joined: readonly { x: number; y: number }[],
  x: number,
): number {
  if (input.limit) return frame.yOf(input.limit.hv);
  const after = joined.findIndex((point) => point.x >= x);
  const b = joined[after === -1 ? joined.length - 1 : after];
  const a = joined[Math.max(0, after - 1)] ?? b;
  if (!a || !b) return frame.plot.y + frame.plot.height / 2;
  return b.x === a.x ? b.y : a.y + ((b.y - a.y) * (x - a.x)) / (b.x - a.x);
}

/** The series in work: drop line to the axis, grey bar for the uncertainty, and a box. */
export function callout(
  series: ProfileSeries,
  crossing: ProfileCrossing,
  y: number,
  frame: ProfileFrame,
  space: LabelSpace,
): Primitive[] {
  const { plot, tokens } = frame;
  const x = frame.xOf(crossing.depthMm);
  const bottom = plot.y + plot.height;
  const head = `${crossing.kind} ${crossing.text}`;
  const foot = `${[series.label, series.place].filter(Boolean).join(" ")}, mm`;
  const width =
    28 + Math.max(estimateTextWidthPx(head, SIZE_PX, 600), estimateTextWidthPx(foot, SIZE_PX));
  space.take({ x: x - 3, y, width: 6, height: bottom - y });
  const box = (left: number, top: number): Box => ({
    x: left,
    y: top,
    width,
    height: CALLOUT_HEIGHT_PX,
  });
  const low = bottom - CALLOUT_HEIGHT_PX - 10;
  const put = space.place([
    box(x - 12 - width, low),
    box(x + 12, low),
    box(x - 12 - width, y + 14),
    box(x + 12, y + 14),
    box(x + 12, y - 14 - CALLOUT_HEIGHT_PX),
    box(x - 12 - width, y - 14 - CALLOUT_HEIGHT_PX),
  ]);
  const middle = put.x + width / 2;
  const text = { kind: "text", x: middle, anchor: "middle", sizePx: SIZE_PX } as const;
  const ink = tokens.ink;
  return [
    { kind: "line", x1: x, y1: y, x2: x, y2: bottom, stroke: { token: ink, widthPx: 1.3 } },
    ...uncertaintyBar(crossing, frame),
    { kind: "circle", x, y, r: 4.2, fill: tokens.ground, stroke: { token: ink, widthPx: 1.6 } },
    {
      kind: "rect",
      ...put,
      radius: 2,
      fill: tokens.ground,
      stroke: { token: tokens.axis, widthPx: 1 },
    },
    { ...text, y: put.y + 15, text: head, token: ink, weight: 600 },
    { ...text, y: put.y + 30, text: foot, token: tokens.axis, weight: 400 },
  ];
}

function uncertaintyBar(crossing: ProfileCrossing, frame: ProfileFrame): Primitive[] {
  const half = crossing.uncertaintyMm;
  if (half === null || !(half > 0) || !Number.isFinite(half)) return [];
  const { plot, tokens } = frame;
  const x1 = Math.max(plot.x, frame.xOf(crossing.depthMm - half));
  const x2 = Math.min(plot.x + plot.width, frame.xOf(crossing.depthMm + half));
  const width = Math.max(1, x2 - x1);
  const y = plot.y + plot.height - 7;
  return [{ kind: "rect", x: x1, y, width, height: 7, fill: tokens.ink, opacity: 0.28 }];
}

/** Other series: an open circle with a short line to its value. */
export function leader(
  series: ProfileSeries,
  index: number,
  crossing: ProfileCrossing,
  y: number,
  frame: ProfileFrame,
  space: LabelSpace,
): Primitive[] {
  const x = frame.xOf(crossing.depthMm);
  const { token } = seriesStyle(index);
  const text = `${series.label} ${crossing.text}`;
  const width = estimateTextWidthPx(text, SIZE_PX, 600);
  const box = (left: number, endY: number) => ({
    x: left,
    y: endY - 11,
    width,
    height: LINE_PX,
    endY,
  });
  const right = (endY: number) => box(x + 6, endY);
  const left = (endY: number) => box(x - 6 - width, endY);
  const put = space.place([
    right(y - 40),
    left(y - 40),
    right(y - 62),
    right(y + 40),
    left(y + 40),
    right(y + 62),
    left(y + 62),
  ]);
  return [
    { kind: "line", x1: x, y1: y, x2: x, y2: put.endY, stroke: { token, widthPx: 1 } },
    {
      kind: "circle",
      x,
      y,
      r: 3.6,
      fill: frame.tokens.ground,
      stroke: { token, widthPx: 1.5 },
    },
    {
      kind: "text",
      x: put.x,
      y: put.endY,
      text,
      token,
      sizePx: SIZE_PX,
      weight: 600,
      anchor: "start",
    },
  ];
}
