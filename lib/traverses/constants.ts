export const HARDNESS_METHODS = ["vickers", "knoop"] as const;
export type HardnessMethod = (typeof HARDNESS_METHODS)[number];

export const DEPTH_KINDS = ["SHD", "CHD", "NHD", "none"] as const;
export type DepthKind = (typeof DEPTH_KINDS)[number];

/** Surface hardening process named in the field return; it proposes the depth definition. */
export const HARDENING_PROCESSES = [
  "induction",
  "flame",
  "carburized",
  "carbonitrided",
  "nitrided",
  "none",
] as const;
export type HardeningProcess = (typeof HARDENING_PROCESSES)[number];
export const HARDENING_PROCESS_NAMES: Record<HardeningProcess, string> = {
  induction: "Induction hardened",
  flame: "Flame hardened",
  carburized: "Carburized",
  carbonitrided: "Carbonitrided",
  nitrided: "Nitrided",
  none: "Not surface hardened",
};

export const READINGS_MAX = 10_000;
