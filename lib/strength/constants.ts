export const STRENGTH_VERDICTS = [
  "agree",
  "disagree_explained",
  "disagree",
  "not_applicable",
] as const;
export type StrengthVerdict = (typeof STRENGTH_VERDICTS)[number];
export const STRENGTH_VERDICT_NAMES: Record<StrengthVerdict, string> = {
  agree: "The sources agree",
  disagree_explained: "The sources differ, and the difference is explained",
  disagree: "The sources differ",
  not_applicable: "No strength to reconcile in this case",
};
