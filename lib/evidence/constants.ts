/** What a piece is; the letters start its label. A cut piece carries its parent's label. */
export const ITEM_KINDS = ["part", "cut", "mount", "tensile_piece", "fluid", "debris"] as const;
export type ItemKind = (typeof ITEM_KINDS)[number];
export const ITEM_KIND_NAMES: Record<ItemKind, string> = {
  part: "Part or half",
  cut: "Cut from an item",
  mount: "Mount",
  tensile_piece: "Tensile piece",
  fluid: "Fluid",
  debris: "Debris",
};
export const ITEM_PREFIX: Record<Exclude<ItemKind, "cut">, string> = {
  part: "E",
  fluid: "E",
  debris: "E",
  mount: "M",
  tensile_piece: "TT",
};

export const CUSTODY_ACTS = [
  "received",
  "taken_to_bench",
  "put_away",
  "handed_over",
  "cut",
  "sent_out",
  "returned",
  "used_up",
  "correction",
] as const;
export type CustodyAct = (typeof CUSTODY_ACTS)[number];
export const CUSTODY_ACT_NAMES: Record<CustodyAct, string> = {
  received: "Received",
  taken_to_bench: "Taken to bench",
  put_away: "Put away",
  handed_over: "Handed over",
  cut: "Cut",
  sent_out: "Sent out",
  returned: "Returned to the owner",
  used_up: "Used up",
  correction: "Correction",
};

export const CONDITION_WORDS = [
  "as fractured",
  "rusted",
  "oiled",
  "cleaned",
  "rubbed",
  "painted",
  "dry",
  "wet",
] as const;

export const HAZARDS = [
  "sharp edges",
  "contaminated",
  "biohazard",
  "radioactive",
  "stored energy",
  "sealed",
] as const;
