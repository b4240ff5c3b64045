import { callout, crossingY, leader } from "./hardness-profile-crossings";
import type { HardnessProfileInput } from "./hardness-profile-input";
import type { ProfileFrame } from "./hardness-profile-frame";
import { createLabelSpace, type Box, type LabelSpace } from "./label-space";
import type { Primitive } from "./primitives";
import { estimateTextWidthPx } from "./text-width";

const SIZE_PX = 12;
const LINE_PX = 15;

/** Every label of the plot, each put where it covers neither marks nor another label. */
export function drawLabels(
  input: HardnessProfileInput,
  frame: ProfileFrame,
  joined: readonly (readonly { x: number; y: number }[])[],
): { under: Primitive[]; over: Primitive[] } {
  const space = createLabelSpace(frame.plot);
  for (const points of joined) takeCurve(space, points);
  const under: Primitive[] = [];
  const over: Primitive[] = [];
  if (input.requiredDepth) under.push(bandLabel(input.requiredDepth, frame, space));
  if (input.limit) under.push(...limitLine(input.limit, frame, space));
  const crossings = input.series.flatMap((series, index) =>
    series.crossing && Number.isFinite(series.crossing.depthMm)
      ? [{ series, index, crossing: series.crossing }]
      : [],
  );
  for (const { series, index, crossing } of crossings) {
    const y = crossingY(input, frame, joined[index] ?? [], frame.xOf(crossing.depthMm));
    over.push(
      ...(index === 0
        ? callout(series, crossing, y, frame, space)
        : leader(series, index, crossing, y, frame, space)),
    );
  }
  return { under, over };
}

/** Covers the curve with small boxes, so that a label across a straight stretch is seen too. */
function takeCurve(space: LabelSpace, points: readonly { x: number; y: number }[]): void {
  const stepPx = points.length > 400 ? Math.ceil(points.length / 400) : 1;
  let last: { x: number; y: number } | undefined;
  for (let i = 0; i < points.length; i += stepPx) {
    const point = points[i];
    if (!point) continue;
    space.take({ x: point.x - 6, y: point.y - 9, width: 12, height: 18 });
    if (last) {
      const pieces = Math.min(40, Math.ceil(Math.hypot(point.x - last.x, point.y - last.y) / 8));
      for (let k = 1; k < pieces; k++) {
        const x = last.x + ((point.x - last.x) * k) / pieces;
        const y = last.y + ((point.y - last.y) * k) / pieces;
        space.take({ x: x - 3, y: y - 3, width: 6, height: 6 });
      }
    }
    last = point;
  }
}

function bandLabel(
  band: NonNullable<HardnessProfileInput["requiredDepth"]>,
  frame: ProfileFrame,
  space: LabelSpace,
): Primitive {
  const { plot, tokens } = frame;
  const width = estimateTextWidthPx(band.text, SIZE_PX);
  const wanted = (frame.xOf(band.minMm) + frame.xOf(band.maxMm)) / 2 - width / 2;
  const x = Math.min(Math.max(wanted, plot.x + 4), plot.x + plot.width - width - 4);
  const at = (y: number): Box => ({ x, y: y - 11, width, height: LINE_PX });
  const box = space.place([at(plot.y + LINE_PX), at(plot.y + 32), at(plot.y + plot.height - 10)]);
  return {
    kind: "text",
    x: box.x + width / 2,
    y: box.y + 11,
    text: band.text,
    token: tokens.bandText,
    sizePx: SIZE_PX,
    weight: 400,
    anchor: "middle",
  };
}

function limitLine(
  limit: NonNullable<HardnessProfileInput["limit"]>,
  frame: ProfileFrame,
  space: LabelSpace,
): Primitive[] {
  const { plot } = frame;
  const y = frame.yOf(limit.hv);
  const right = plot.x + plot.width;
  const width = estimateTextWidthPx(limit.text, SIZE_PX);
  const box = (x: number, baseline: number): Box => ({
    x,
    y: baseline - 11,
    width,
    height: LINE_PX,
  });
  const left = plot.x + 8;
  const end = right - width - 8;
  const put = space.place([
    box(left, y - 7),
    box(left, y + LINE_PX),
    box(end, y - 7),
    box(end, y + LINE_PX),
  ]);
  space.take({ x: plot.x, y: y - 2, width: plot.width, height: 4 });
  return [
    {
      kind: "line",
      x1: plot.x,
      y1: y,
      x2: right,
      y2: y,
      stroke: { token: "ch-limit", widthPx: 1.4, dashPx: [7, 4] },
    },
    {
      kind: "text",
      x: put.x,
      y: put.y + 11,
      text: limit.text,
      token: "ch-limit",
      sizePx: SIZE_PX,
      weight: 400,
      anchor: "start",
    },
  ];
}
