import { z } from "zod";
import {
  caseDepth,
  inwardCrossings,
  twoDepthCaseDepth,
  type CaseDepth,
} from "@/lib/hardness/case-depth";
import { convert } from "@/lib/hardness/convert";
import { chdApplicability, coreVerdict, iterateCore } from "@/lib/hardness/core-hardness";
import {
  decarburizationDepth,
  plateauHardness,
  type DecarburizationCriterion,
} from "@/lib/hardness/decarburization";
import { CHD_LIMIT_HV, NHD_OFFSET_HV, shdLimitHv } from "@/lib/hardness/depth-limits";
import { CARBURIZED_EFFECTIVE_CASE_HRC, effectiveCaseHrc } from "@/lib/hardness/effective-case";
import { ALL_TABLE_IDS, getTable, isTableId } from "@/lib/hardness/published-tables";
import {
  byTrack,
  orderTraverse,
  trackMeans,
  type TraversePoint,
} from "@/lib/hardness/traverse-points";
import { mean } from "@/lib/numerics/statistics";
import { UnsupportedRow, type Computed } from "./check-row";
import { numbers, quantity, wordOf, type Quantity } from "./quantity";

const number = z.number();
const traverse = {
  depth_mm: numbers,
  HV: numbers.optional(),
  HV1: numbers.optional(),
  "HV0.3": numbers.optional(),
  "HV0.5": numbers.optional(),
  track: numbers.optional(),
  load: z.array(z.string()).optional(),
};

type Traverse = {
  depth_mm: number[];
  track?: number[];
  load?: string[];
} & Partial<Record<"HV" | "HV1" | "HV0.3" | "HV0.5", number[]>>;

function pointsOf(inputs: Traverse): readonly TraversePoint[] {
  const hardness = inputs.HV ?? inputs.HV1 ?? inputs["HV0.3"] ?? inputs["HV0.5"];
  if (hardness?.length !== inputs.depth_mm.length)
    throw new UnsupportedRow("depths and hardness are not of the same number");
  return inputs.depth_mm.map((depthMm, index) => ({
    depthMm,
    hardness: hardness[index] ?? NaN,
    track: inputs.track?.[index]?.toString(),
    load: inputs.load?.[index],
  }));
}

const depthOrWord = (depth: CaseDepth): Computed =>
  "depthMm" in depth ? depth.depthMm : depth.verdict;

const depthAt = (points: readonly TraversePoint[], limit: number) =>
  depthOrWord(caseDepth({ points, limit }));

const chd = quantity({ ...traverse, limit: number.optional() }, (inputs) =>
  depthAt(pointsOf(inputs), inputs.limit ?? CHD_LIMIT_HV),
);

const crossingsOf = (inputs: Traverse & { limit: number }) =>
  inwardCrossings(pointsOf(inputs), inputs.limit);

const iterated = { ...traverse, offset_HV: number.optional() };

function criterionOf(limit: string): DecarburizationCriterion {
  const fraction = /^([\d.]+) x core$/.exec(limit)?.[1];
  if (fraction !== undefined) return { kind: "fraction_of_core", fraction: Number(fraction) };
  const offset = /^core - ([\d.]+)( HV)?$/.exec(limit)?.[1];
  if (offset !== undefined) return { kind: "offset_from_core", offsetHv: Number(offset) };
  throw new UnsupportedRow(`the limit "${limit}" is not known`);
}

function decarburization(
  inputs: Traverse & { core_from_mm: number },
  criterion: DecarburizationCriterion,
) {
  const points = pointsOf(inputs);
  const depth = decarburizationDepth({ points, coreFromMm: inputs.core_from_mm, criterion });
  return "depthMm" in depth ? depth.depthMm : depth.verdict;
}

/** A surface limit given in HRC, converted once by the table that the row names. */
function surfaceLimitHv(hrc: number, tableName: string): number | "refuse" {
  const tableId = tableName.replace(/\.csv$/, "");
  if (!isTableId(tableId)) throw new UnsupportedRow(`no table "${tableName}"`);
  const converted = convert({
    materialGroup: getTable(tableId).materialGroup,
    from: "HRC",
    to: "HV",
    value: hrc,
    tableId,
    enabledTableIds: ALL_TABLE_IDS,
  });
  return converted.status === "ok" ? converted.value : "refuse";
}

/** Depths and core hardness from a traverse. */
export const TRAVERSE_QUANTITIES: Readonly<Record<string, Quantity>> = {
  CHD_550HV1: chd,
  CHD: chd,
  CHD_never_reached: chd,
  CHD_surface_below_limit: chd,
  CHD_soft_surface: chd,
  CHD_first_crossing: chd,
  CHD_last_crossing: quantity({ ...traverse, limit: number }, (inputs) => {
    const crossings = crossingsOf(inputs);
    return crossings[crossings.length - 1]?.depthMm ?? "not_reached";
  }),
  CHD_multiple_crossings_flag: quantity(
    { ...traverse, limit: number },
    (inputs) => crossingsOf(inputs).length,
  ),
  CHD_two_depth: quantity(
    { d1_mm: number, H1: numbers, d2_mm: number, H2: numbers, HG: number },
    (inputs) => {
      const depth = twoDepthCaseDepth({
        shallow: { depthMm: inputs.d1_mm, hardness: inputs.H1 },
        deep: { depthMm: inputs.d2_mm, hardness: inputs.H2 },
        limit: inputs.HG,
      });
      return "depthMm" in depth ? depth.depthMm : depth.verdict;
    },
  ),
  CHD_track: quantity({ ...traverse, limit: number, want: number }, (inputs) => {
    const ordered = orderTraverse(pointsOf(inputs));
    if (ordered.verdict === "refuse") return ordered.verdict;
    return depthAt(byTrack(ordered.points).get(String(inputs.want)) ?? [], inputs.limit);
  }),
  CHD_track_means: quantity({ ...traverse, limit: number }, (inputs) =>
    depthAt(trackMeans(pointsOf(inputs)), inputs.limit),
  ),
  SHD: quantity({ ...traverse, min_surface_HV: number, fraction: number.optional() }, (inputs) =>
    depthAt(pointsOf(inputs), shdLimitHv(inputs.min_surface_HV, inputs.fraction)),
  ),
  SHD_limit: quantity(
    {
      min_surface_HV: number.optional(),
      min_surface_HRC: number.optional(),
      table: z.string().optional(),
      fraction: number.optional(),
    },
    ({ min_surface_HV, min_surface_HRC, table, fraction }) => {
      if (min_surface_HV !== undefined) return shdLimitHv(min_surface_HV, fraction);
      if (min_surface_HRC === undefined || table === undefined)
        throw new UnsupportedRow("a limit in HRC needs its table");
      const hv = surfaceLimitHv(min_surface_HRC, table);
      return hv === "refuse" ? hv : shdLimitHv(hv, fraction);
    },
  ),
  NHD_core: quantity({ core_readings: numbers }, ({ core_readings }) => mean(core_readings)),
  NHD: quantity({ ...traverse, core_HV: number, offset_HV: number.optional() }, (inputs) =>
    depthAt(pointsOf(inputs), inputs.core_HV + (inputs.offset_HV ?? NHD_OFFSET_HV)),
  ),
  NHD_iterated: quantity(iterated, (inputs) => {
    const core = iterateCore(pointsOf(inputs), inputs.offset_HV);
    if (core.verdict === "refuse") return core.verdict;
    return depthAt(pointsOf(inputs), core.coreHv + (inputs.offset_HV ?? NHD_OFFSET_HV));
  }),
  NHD_iterated_core: quantity(iterated, (inputs) => {
    const core = iterateCore(pointsOf(inputs), inputs.offset_HV);
    return core.verdict === "refuse" ? core.verdict : core.coreHv;
  }),
  core_validity: quantity(
    { readings_beyond_3x: number, core_HV: number.optional() },
    ({ readings_beyond_3x, core_HV }) =>
      wordOf(
        coreVerdict({
          readingsBeyond: readings_beyond_3x,
          isMeasuredSeparately: core_HV !== undefined,
        }),
      ),
  ),
  core_applicability_CHD: quantity(
    { CHD_mm: number, HV_at_3xCHD: number, limit: number.optional() },
    ({ HV_at_3xCHD, limit }) => wordOf(chdApplicability(HV_at_3xCHD, limit)),
  ),
  traverse_validity: quantity({ ...traverse, one_curve: z.boolean().optional() }, (inputs) =>
    wordOf(orderTraverse(pointsOf(inputs), { isOneCurve: inputs.one_curve })),
  ),
  decarb_core_mean: quantity({ ...traverse, core_from_mm: number }, (inputs) => {
    const core = plateauHardness(pointsOf(inputs), inputs.core_from_mm);
    return "coreHv" in core ? core.coreHv : core.verdict;
  }),
  decarb_depth_by_hardness: quantity(
    { ...traverse, core_from_mm: number, limit: z.string() },
    (inputs) => decarburization(inputs, criterionOf(inputs.limit)),
  ),
  decarb_depth_plateau: quantity({ ...traverse, core_from_mm: number }, (inputs) =>
    decarburization(inputs, { kind: "plateau" }),
  ),
  effective_case_HRC: quantity(
    { C: z.string().optional(), process: z.enum(["flame/induction", "carburized"]) },
    ({ C, process }) => {
      if (process === "carburized") return CARBURIZED_EFFECTIVE_CASE_HRC;
      if (C === undefined) throw new UnsupportedRow("no carbon content is given");
      const hrc = effectiveCaseHrc(C);
      return typeof hrc === "number" ? hrc : hrc.verdict;
    },
  ),
};
