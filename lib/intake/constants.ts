/** Scales in which drawings state a hardness, load included. */
export const REQUIRED_HARDNESS_SCALES = [
  "HV0.5",
  "HV1",
  "HV10",
  "HV30",
  "HRC",
  "HRB",
  "HRA",
  "HRD",
  "HR15N",
  "HR30N",
  "HR45N",
  "HBW 10/3000",
  "HBW 5/750",
  "HBW 2.5/187.5",
  "HK0.5",
  "HK1",
] as const;
export type RequiredHardnessScale = (typeof REQUIRED_HARDNESS_SCALES)[number];

/** What a stated depth of a case means (ISO 18203); total is seen under the microscope. */
export const DEPTH_DEFINITIONS = ["SHD", "CHD", "NHD", "total"] as const;
export type DepthDefinition = (typeof DEPTH_DEFINITIONS)[number];
export const DEPTH_DEFINITION_NAMES: Record<DepthDefinition, string> = {
  SHD: "SHD, surface hardening depth",
  CHD: "CHD, case hardening depth",
  NHD: "NHD, nitriding hardening depth",
  total: "Total depth, as seen etched",
};

export const PIECE_KINDS = ["failed_part", "sister_part", "fluid", "debris", "paper"] as const;
export type PieceKind = (typeof PIECE_KINDS)[number];
export const PIECE_KIND_NAMES: Record<PieceKind, string> = {
  failed_part: "Failed part or half",
  sister_part: "Sister part",
  fluid: "Fluid",
  debris: "Debris",
  paper: "Paper or photograph",
};

/** What the sender suspects; it decides how to pack, not what is found. */
export const SUSPECTS = [
  "fatigue",
  "overload",
  "wear",
  "heat",
  "corrosion",
  "hydrogen",
  "deposits",
  "unknown",
] as const;
export type Suspect = (typeof SUSPECTS)[number];
export const SUSPECT_NAMES: Record<Suspect, string> = {
  fatigue: "Fatigue",
  overload: "Overload",
  wear: "Wear",
  heat: "Overheating",
  corrosion: "Corrosion",
  hydrogen: "Hydrogen",
  deposits: "Deposits or residue",
  unknown: "Cannot say",
};

export const TEXT_MAX = 200;
export const LONG_TEXT_MAX = 4000;
/** Longest text that a draft keeps in one field, however wrong. */
export const DRAFT_TEXT_MAX = 20_000;
export const DRAFT_MAX_BYTES = 512 * 1024;
export const PIECES_MAX = 100;

export const CASE_NUMBER_PATTERN = /^RL-\d{4}-\d{4,}$/;
