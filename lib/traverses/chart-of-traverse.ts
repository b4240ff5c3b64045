import { hardnessProfile } from "@/lib/charts/hardness-profile";
import type { HardnessProfileInput, ProfileSeries } from "@/lib/charts/hardness-profile-input";
import type { Chart } from "@/lib/charts/primitives";
import { formatNumber, formatRange, formatWithUncertainty } from "@/lib/format/numbers";
import { converterFor } from "@/lib/hardness/convert";
import { SHD_FRACTION } from "@/lib/hardness/depth-limits";
import { ALL_TABLE_IDS } from "@/lib/hardness/published-tables";
import { SCALES } from "@/lib/hardness/scales";
import { conversionColumns, measuredScale } from "./conversion-columns";
import type { ResultContent, TraverseContent } from "./schemas";

export type ShownTraverse = { label: string; content: TraverseContent; result: ResultContent };
type ChartShape = {
  /** Drawn behind, dashed and dotted; only those of the same scale. */
  others?: readonly ShownTraverse[];
  theme?: "screen" | "paper";
  size?: { widthPx: number; heightPx: number };
};

const SIZE = { widthPx: 640, heightPx: 344 };
const MOST_SERIES = 3;
const TICK_STEP = 5;
/** How many times its own depth a profile is stretched at most to show another behind it. */
const REACH = 1.5;
const SHD_PERCENT = Math.round(SHD_FRACTION * 100);

function seriesOf({ label, content, result }: ShownTraverse): ProfileSeries {
  const flagged = new Set(
    result.items.filter(({ level }) => level === "must").flatMap(({ readingIds }) => readingIds),
  );
  const leftOut = new Set(
    content.readings.filter((row) => row.leftOutReason !== undefined).map(({ id }) => id),
  );
  const { depth } = result;
  return {
    label,
    place: content.name || undefined,
    points: result.readings.flatMap((reading) =>
      reading.depthMm === null || reading.hardness === null
        ? []
        : [
            {
              depthMm: reading.depthMm,
              hardnessHv: reading.hardness,
              expandedUncertaintyHv: reading.expandedUncertainty,
              leftOut: leftOut.has(reading.id),
              flagged: flagged.has(reading.id),
            },
          ],
    ),
    crossing:
      depth && depth.depthMm !== null
        ? {
            kind: depth.kind,
            depthMm: depth.depthMm,
            uncertaintyMm: depth.expandedUncertaintyMm,
            text: formatWithUncertainty(depth.depthMm, depth.expandedUncertaintyMm, "", {
              decimals: 2,
            }),
          }
        : undefined,
  };
}

/** Ticks at whole fives of the converted hardness, each where its table puts it. */
function convertedScale(content: TraverseContent): HardnessProfileInput["convertedScale"] {
  const { tableId, materialGroup } = content;
  const scale = conversionColumns(content, ALL_TABLE_IDS).find(({ to }) => to !== "Rm_MPa")?.to;
  if (tableId === null || scale === undefined) return undefined;
  const back = converterFor({
    materialGroup,
    from: scale,
    to: measuredScale(content.method),
    tableId,
    enabledTableIds: ALL_TABLE_IDS,
  });
  const ticks = Array.from({ length: 200 / TICK_STEP }, (_, i) => (i + 1) * TICK_STEP).flatMap(
    (value) => {
      const at = back(value);
      return at.status === "ok" ? [{ hv: at.value, label: String(value) }] : [];
    },
  );
  return ticks.length === 0 ? undefined : { name: SCALES[scale].symbol, tableLabel: "", ticks };
}

function limitText(result: ResultContent, content: TraverseContent): string {
  const { depth, symbol } = result;
  if (!depth || depth.limit === null) return "";
  const value = `limit ${formatNumber(depth.limit, { decimals: 0 })} ${symbol}`;
  const isShare = depth.kind === "SHD" && content.agreedLimit === null;
  if (isShare && content.minSurfaceHv !== null)
    return `${value} = ${SHD_PERCENT} % of ${formatNumber(content.minSurfaceHv)}`;
  return content.agreedLimit === null ? value : `${value}, agreed`;
}

const depthsOf = ({ readings }: ResultContent): number[] =>
  readings.flatMap(({ depthMm }) => (depthMm === null ? [] : [depthMm]));

/** Another that begins far beyond this one's deepest indent would only press its profile together. */
function beginsWithin(other: ResultContent, deepestMm: number): boolean {
  return deepestMm === 0 || depthsOf(other).some((depthMm) => depthMm <= REACH * deepestMm);
}

/** The profile of one traverse as the chart takes it, on the screen, in the findings and on paper. */
export function profileInputOf(shown: ShownTraverse, shape: ChartShape = {}): HardnessProfileInput {
  const { content, result } = shown;
  const { depth, symbol } = result;
  const deepest = Math.max(0, ...depthsOf(result));
  const others = (shape.others ?? [])
    .filter((other) => other.result.symbol === symbol && beginsWithin(other.result, deepest))
    .slice(0, MOST_SERIES - 1);
  const { min, max } = content.requiredDepthMm ?? { min: null, max: null };
  const scale = convertedScale(content);
  const [tableLabel = ""] = result.tableTitles;
  return {
    series: [shown, ...others].map(seriesOf),
    scaleLabel: symbol,
    limit:
      depth && depth.limit !== null
        ? { hv: depth.limit, text: limitText(result, content) }
        : undefined,
    requiredDepth:
      depth && (min !== null || max !== null)
        ? {
            minMm: min ?? 0,
            maxMm: max ?? Math.max(deepest, min ?? 0),
            text: `required ${formatRange(min, max, "mm")}`,
          }
        : undefined,
    convertedScale: scale ? { ...scale, tableLabel } : undefined,
    size: shape.size ?? SIZE,
    theme: shape.theme ?? "screen",
  };
}

export function chartOfTraverse(shown: ShownTraverse, shape: ChartShape = {}): Chart {
  return hardnessProfile(profileInputOf(shown, shape));
}
