import { z } from "zod";
import {
  expandedUncertainty,
  oneSigmaFactor,
  relativeReadingUncertainty,
  repeatabilityUncertainty,
  resolutionUncertainty,
} from "@/lib/hardness/uncertainty";
import { mean, meanInterval95, sampleStandardDeviation } from "@/lib/numerics/statistics";
import type { Refusal } from "@/lib/numerics/verdict";
import type { Computed } from "./check-row";
import { numbers, quantity, wordOf, type Quantity } from "./quantity";

const number = z.number();
const orWord = (value: number | Refusal): Computed =>
  typeof value === "number" ? value : value.verdict;

/** Statistics of a set of readings and their uncertainty. */
export const STATISTICS_QUANTITIES: Readonly<Record<string, Quantity>> = {
  mean: quantity({ x: numbers }, ({ x }) => mean(x)),
  sample_sd: quantity({ x: numbers }, ({ x }) => sampleStandardDeviation(x) ?? "refuse"),
  mean_interval_validity: quantity({ n: number }, ({ n }) =>
    // The word depends on the number of readings alone; any readings of that number do.
    wordOf(meanInterval95(Array.from({ length: n }, (_, index) => 400 + index))),
  ),
  mean_ci95_half_width: quantity({ x: numbers }, ({ x }) => {
    const interval = meanInterval95(x);
    return interval.verdict === "refuse" ? interval.verdict : interval.halfWidth;
  }),
  t_factor_68_27: quantity({ n: number }, ({ n }) => orWord(oneSigmaFactor(n))),
  u_H_repeatability: quantity({ x: numbers }, ({ x }) => orWord(repeatabilityUncertainty(x))),
  u_ms_resolution: quantity(
    { H: number, F_N: number, delta_ms_mm: number },
    ({ H, F_N, delta_ms_mm }) => resolutionUncertainty(H, F_N, delta_ms_mm),
  ),
  U_expanded: quantity(
    { u_H: number, u_ms: number, u_HTM: number, k: number.optional() },
    ({ u_H, u_ms, u_HTM, k }) => expandedUncertainty([u_H, u_ms, u_HTM], k),
  ),
  rel_u_from_diagonal: quantity(
    { u_d_um: number, d_um: number, u_F_rel: number.optional() },
    ({ u_d_um, d_um, u_F_rel }) =>
      orWord(
        relativeReadingUncertainty({
          diagonalUncertainty: u_d_um,
          diagonal: d_um,
          relativeForceUncertainty: u_F_rel,
        }),
      ),
  ),
};
