/** Ways a metal part fails, as handbooks group them (ASM Handbook vols 11 and 12, from memory). */
export const MECHANISM_CODES = {
  DO: "Ductile overload",
  BO: "Brittle overload",
  HC: "High-cycle fatigue",
  LC: "Low-cycle fatigue",
  RC: "Rolling-contact fatigue",
  TF: "Thermal fatigue",
  CF: "Corrosion fatigue",
  FF: "Fretting fatigue",
  IH: "Internal hydrogen embrittlement",
  EH: "Environmental hydrogen embrittlement",
  SC: "Stress-corrosion cracking",
  LM: "Liquid or solid metal embrittlement",
  CR: "Creep or stress rupture",
  ST: "Short-term overheating",
  TE: "Reversible temper embrittlement",
  TM: "Tempered-martensite embrittlement",
  GB: "Other grain-boundary weakness",
  QC: "Quench crack",
  GK: "Grinding crack",
  FL: "Forging or rolling lap, seam, burst",
  CA: "Casting defect",
  WH: "Weld hydrogen crack",
  WS: "Weld solidification or liquation crack",
  WF: "Lack of fusion or penetration",
  CO: "Corrosion thinning or pitting",
  WA: "Abrasive or adhesive wear",
  CE: "Cavitation or erosion",
  OT: "Wrong thermal condition",
} as const;
export type MechanismCode = keyof typeof MECHANISM_CODES;

export const MECHANISM_VERDICTS = ["open", "stands", "weighed_out", "ruled_out"] as const;
export type MechanismVerdict = (typeof MECHANISM_VERDICTS)[number];
export const MECHANISM_VERDICT_NAMES: Record<MechanismVerdict, string> = {
  open: "Not weighed yet",
  stands: "Stands",
  weighed_out: "Weighed out",
  ruled_out: "Ruled out",
};
