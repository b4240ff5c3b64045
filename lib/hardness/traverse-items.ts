import { numberText } from "../numerics/number-text";
import { DEPTH_KINDS, proposedDepthKind } from "./depth-limits";
import { hardnessSymbol } from "./forces";
import type { TraverseInput } from "./traverse-input";
import type { TrackDepth } from "./traverse-depth";
import type { EvaluatedReading } from "./traverse-reading";
import type { SpacingFinding, SpacingFindings } from "./traverse-spacing";

/** Something to look at: `must` holds the traverse up, `settled` was decided with a reason. */
export interface TraverseItem {
  readonly code: string;
  readonly level: "must" | "noted" | "settled";
  readonly text: string;
  readonly readingIds: readonly string[];
}

function readingItems(readings: readonly EvaluatedReading[]): readonly TraverseItem[] {
  return readings.flatMap(({ id, number, issues, leftOutReason }) =>
    issues.map(({ code, level, text }) => ({
      code,
      level: leftOutReason === null ? level : ("noted" as const),
      text: `Indent ${number}: ${text}`,
      readingIds: [id],
    })),
  );
}

/** "SHD rests on both." for a pair around the limit, "Left out of the curve." for an indent left out. */
function spacingItem(
  finding: SpacingFinding,
  byId: ReadonlyMap<string, EvaluatedReading>,
  input: TraverseInput,
  restsOn: ReadonlySet<string>,
): TraverseItem {
  const { kind, readingIds } = finding;
  const code = kind === "edge" ? "too_near_edge" : "too_near_another";
  const item = (level: TraverseItem["level"], tail: string) => ({
    code,
    level,
    text: `${finding.text} ${tail}`,
    readingIds,
  });
  const own = readingIds.flatMap((id) => byId.get(id) ?? []);
  const deeper = own[own.length - 1];
  const leftOut = own.find((reading) => reading.leftOutReason !== null);
  if (leftOut)
    return item(
      "noted",
      kind === "edge"
        ? "Left out of the curve."
        : `Indent ${leftOut.number} is left out of the curve.`,
    );
  if (deeper?.keptReason) return item("settled", `Kept: ${deeper.keptReason}`);
  if (input.depthKind === "none") return item("must", "Say why it is kept, or leave it out.");
  const resting = own.filter(({ id }) => restsOn.has(id));
  const [first] = resting;
  if (!first)
    return item(
      "noted",
      kind === "edge" ? "Kept and marked." : `${input.depthKind} rests on neither.`,
    );
  if (kind === "edge") return item("must", `${input.depthKind} rests on it.`);
  const what = resting.length > 1 ? "both" : `indent ${first.number}`;
  return item("must", `${input.depthKind} rests on ${what}.`);
}

function leftOutItems(
  readings: readonly EvaluatedReading[],
  findings: readonly SpacingFinding[],
): readonly TraverseItem[] {
  const named = new Set(
    findings.filter(({ kind }) => kind === "edge").flatMap((finding) => finding.readingIds),
  );
  return readings.flatMap(({ id, number, leftOutReason }) =>
    leftOutReason === null || named.has(id)
      ? []
      : [
          {
            code: "left_out",
            level: "noted" as const,
            text: `Indent ${number} is left out of the curve: ${leftOutReason}`,
            readingIds: [id],
          },
        ],
  );
}

function setupItems(input: TraverseInput): readonly TraverseItem[] {
  const { depthKind, processKind } = input;
  if (depthKind === "none") return [];
  const items: TraverseItem[] = [];
  const add = (code: string, level: TraverseItem["level"], text: string) =>
    items.push({ code, level, text, readingIds: [] });
  const proposed = proposedDepthKind(processKind);
  if (proposed !== "none" && proposed !== depthKind) {
    const text = `The process asks for ${proposed}; this is ${depthKind}.`;
    if (input.depthKindReason)
      add("depth_kind_differs", "settled", `${text} Reason: ${input.depthKindReason}`);
    else add("depth_kind_differs", "must", `${text} Say why.`);
  }
  const usual = DEPTH_KINDS[depthKind].loadKgf;
  if (input.method === "vickers" && input.loadKgf !== usual)
    add(
      "load_differs",
      "noted",
      `${depthKind} is usually stated in HV${usual}; this traverse is ${hardnessSymbol(input)}.`,
    );
  return items;
}

function depthItems(
  input: TraverseInput,
  tracks: readonly TrackDepth[],
  headline: TrackDepth | undefined,
): readonly TraverseItem[] {
  if (input.depthKind === "none" || !headline) return [];
  const items: TraverseItem[] = [];
  for (const { track, depth, warnings } of tracks) {
    const where = tracks.length > 1 ? `Track ${track}: ` : "";
    if (depth.verdict === "refuse")
      items.push({ code: depth.code, level: "must", text: where + depth.reason, readingIds: [] });
    for (const { code, text } of warnings)
      items.push({ code, level: "noted", text: where + text, readingIds: [] });
  }
  const depths = tracks.flatMap(({ depth }) => ("depthMm" in depth ? [depth.depthMm] : []));
  if (depths.length > 1) {
    const values = depths.map((depthMm) => numberText(depthMm, 3)).join(" and ");
    const text = `The tracks give ${values}\u00a0mm; the smaller is stated.`;
    items.push({ code: "tracks_differ", level: "noted", text, readingIds: [] });
  }
  return items;
}

/** All that is to settle, was settled, or is only noted, in the order a person would take it. */
export function traverseItems(input: {
  readonly traverse: TraverseInput;
  readonly readings: readonly EvaluatedReading[];
  readonly spacing: SpacingFindings;
  readonly tracks: readonly TrackDepth[];
  readonly headline: TrackDepth | undefined;
  readonly restsOn: ReadonlySet<string>;
}): readonly TraverseItem[] {
  const { traverse, readings, spacing, restsOn } = input;
  const byId = new Map(readings.map((reading) => [reading.id, reading]));
  const items = [
    ...setupItems(traverse),
    ...depthItems(traverse, input.tracks, input.headline),
    ...readingItems(readings),
    ...spacing.findings.map((finding) => spacingItem(finding, byId, traverse, restsOn)),
    ...leftOutItems(readings, spacing.findings),
  ];
  if (spacing.unlisted > 0)
    items.push({
      code: "more_spacing_findings",
      level: "must",
      text: `${spacing.unlisted} more indents are too near one another. Check the depths.`,
      readingIds: [],
    });
  if (spacing.hasUncheckedTracks)
    items.push({
      code: "spacing_between_tracks",
      level: "noted",
      text: "The distance between tracks is not checked: no place along the surface is given.",
      readingIds: [],
    });
  const order = { must: 0, noted: 1, settled: 2 };
  return items.toSorted((a, b) => order[a.level] - order[b.level]);
}
