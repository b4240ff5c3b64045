/** One indent. Depth is measured from the reference edge. */
export type ProfilePoint = {
  depthMm: number;
  hardnessHv: number;
  /** Half-width of the bar drawn (k = 2), in HV; null when none was evaluated. */
  expandedUncertaintyHv: number | null;
  /** Left out of the curve: drawn as a cross and never joined. */
  leftOut: boolean;
  /** Something about it is to be settled: ringed. */
  flagged: boolean;
  /** Name of the scale it was measured in when it was not measured in HV; never joined. */
  convertedFrom?: string;
};

export type ProfileCrossing = {
  /** SHD, CHD or NHD, as the process in the field return decides. */
  kind: string;
  depthMm: number;
  uncertaintyMm: number | null;
  /** The value as it is shown everywhere, without unit: "1.95 ± 0.06". */
  text: string;
};

export type ProfileSeries = {
  /** Short name, shown at the crossing and in the legend: "T2". */
  label: string;
  /** Where it was run, shown in the call-out: "at fillet". */
  place?: string;
  points: readonly ProfilePoint[];
  crossing?: ProfileCrossing;
};

export type HardnessProfileInput = {
  /** The first series is the one in work: solid line, call-out, drop line. */
  series: readonly ProfileSeries[];
  /** Scale with its load, as hardness is always written: "HV1". */
  scaleLabel: string;
  limit?: { hv: number; text: string };
  requiredDepth?: { minMm: number; maxMm: number; text: string };
  /** Ticks of the right-hand scale, placed by the conversion table that `tableLabel` names. */
  convertedScale?: {
    name: string;
    tableLabel: string;
    ticks: readonly { hv: number; label: string }[];
  };
  size: { widthPx: number; heightPx: number };
  theme: "screen" | "paper";
};
