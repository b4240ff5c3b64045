/** States of a case, finest grain. A stage on the temper scale gathers several. */
export const CASE_STATES = [
  "draft",
  "submitted",
  "info_needed",
  "declined",
  "cancelled",
  "accepted",
  "awaiting_evidence",
  "examining_nd",
  "plan_review",
  "examining",
  "analysing",
  "in_review",
  "in_approval",
  "signed",
  "released",
  "reopened",
  "following_up",
  "disposing",
  "closed",
] as const;
export type CaseState = (typeof CASE_STATES)[number];

export const CASE_STATE_NAMES: Record<CaseState, string> = {
  draft: "Draft",
  submitted: "Submitted",
  info_needed: "Question to the requester",
  declined: "Declined",
  cancelled: "Cancelled",
  accepted: "Accepted",
  awaiting_evidence: "Waiting for parts",
  examining_nd: "Examining, nothing cut yet",
  plan_review: "Plan with the lead engineer",
  examining: "Examining",
  analysing: "Weighing",
  in_review: "With the second reader",
  in_approval: "Waiting for signature",
  signed: "Signed",
  released: "Released",
  reopened: "Reopened",
  following_up: "Following up",
  disposing: "Returning items",
  closed: "Closed",
};

export const STAGES = [
  "Received",
  "Accepted",
  "Examining",
  "Weighing",
  "In review",
  "Signed",
  "Closed",
] as const;
export type Stage = (typeof STAGES)[number];
/** 1 to 7 on the temper scale; 0 for a draft and for the two grey ends. */
export type StageNumber = 0 | 1 | 2 | 3 | 4 | 5 | 6 | 7;

export const STAGE_OF_STATE: Record<CaseState, StageNumber> = {
  draft: 0,
  submitted: 1,
  info_needed: 1,
  declined: 0,
  cancelled: 0,
  accepted: 2,
  awaiting_evidence: 2,
  examining_nd: 3,
  plan_review: 3,
  examining: 3,
  analysing: 4,
  reopened: 4,
  in_review: 5,
  in_approval: 5,
  signed: 6,
  released: 6,
  following_up: 6,
  disposing: 7,
  closed: 7,
};

export const PRIORITIES = ["P1", "P2", "P3", "P4"] as const;
export type Priority = (typeof PRIORITIES)[number];
export const PRIORITY_NAMES: Record<Priority, string> = {
  P1: "P1 safety",
  P2: "P2 line or fleet stopped",
  P3: "P3 normal",
  P4: "P4 study",
};

export const HOLD_KINDS = [
  "legal",
  "customer",
  "safety_notice",
  "waiting_external",
  "restricted",
  "suspect_integrity",
] as const;
export type HoldKind = (typeof HOLD_KINDS)[number];
export const HOLD_NAMES: Record<HoldKind, string> = {
  legal: "Legal hold",
  customer: "Held by the client",
  safety_notice: "Interim safety notice due",
  waiting_external: "Waiting for an outside laboratory",
  restricted: "Restricted to named people",
  suspect_integrity: "Integrity of the evidence in question",
};

/** Rows of the gate ledger. */
export const GATE_COUNT = 8;
