import { type CaseState, STAGE_OF_STATE, STAGES, type Stage } from "./constants";

export type StagePeriod = { stage: Stage; step: number; from: string; to: string };

/** How long a case stood at each stage, from its moves in order; moves within a stage run together. */
export function stagePeriods(
  moves: readonly { to: CaseState; at: string }[],
  now: Date,
): StagePeriod[] {
  const periods: StagePeriod[] = [];
  for (const move of moves) {
    const step = STAGE_OF_STATE[move.to];
    const stage = STAGES[step - 1];
    const last = periods.at(-1);
    if (last) last.to = move.at;
    if (!stage && last) return periods;
    if (!stage) continue;
    if (last?.step !== step) periods.push({ stage, step, from: move.at, to: now.toISOString() });
    else last.to = now.toISOString();
  }
  return periods;
}
