import type { HardnessProfileInput } from "./hardness-profile-input";
import { drawFrame, frameOf, isDrawable } from "./hardness-profile-frame";
import { drawLabels } from "./hardness-profile-labels";
import { drawSeries, profileLegend } from "./hardness-profile-series";
import { profileDescription, profileTable, readoutText } from "./hardness-profile-words";
import type { Chart, Primitive, Readout } from "./primitives";

/**
 * Hardness against depth with limit, required range, uncertainty and a converted scale.
 * Takes any number of readings; points without a finite depth or hardness are only in the table.
 */
export function hardnessProfile(input: HardnessProfileInput): Chart {
  const frame = frameOf(input);
  const drawn = input.series.map((series, index) => drawSeries(series, index, frame));
  const { under, over } = drawLabels(
    input,
    frame,
    drawn.map(({ joined }) => joined),
  );
  const empty = !input.series.some((series) => series.points.some(isDrawable));
  const primitives: Primitive[] = [
    ...drawFrame(input, frame),
    ...under,
    // The series in work lies on top.
    ...drawn.toReversed().flatMap(({ marks }) => marks),
    ...over,
  ];
  if (empty) {
    primitives.push({
      kind: "text",
      x: frame.plot.x + frame.plot.width / 2,
      y: frame.plot.y + frame.plot.height / 2,
      text: "No readings yet",
      token: frame.tokens.axis,
      sizePx: 12,
      weight: 400,
      anchor: "middle",
    });
  }
  return {
    widthPx: input.size.widthPx,
    heightPx: input.size.heightPx,
    ground: frame.tokens.ground,
    primitives,
    title: "Hardness against depth",
    description: profileDescription(input),
    table: profileTable(input),
    legend: profileLegend(input.series, frame.tokens.axis),
    readouts: input.series.flatMap((series) =>
      series.points.filter(isDrawable).map((point): Readout => ({
        x: frame.xOf(point.depthMm),
        y: frame.yOf(point.hardnessHv),
        text: readoutText(series, point, input.scaleLabel),
      })),
    ),
  };
}
