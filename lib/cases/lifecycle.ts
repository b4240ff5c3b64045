import { type CaseState, STAGE_OF_STATE, STAGES, type Stage, type StageNumber } from "./constants";

/** One move of a case between states; `action` names the rule of the policy table that guards it. */
export type Move = { from: readonly CaseState[]; to: CaseState; action: string; verb: string };

export const MOVES = {
  submit: {
    from: ["draft"],
    to: "submitted",
    action: "case.submit",
    verb: "Send to the laboratory",
  },
  askBack: {
    from: ["submitted", "accepted"],
    to: "info_needed",
    action: "case.askBack",
    verb: "Ask a question",
  },
  answer: {
    from: ["info_needed"],
    to: "submitted",
    action: "case.answer",
    verb: "Send the answers",
  },
  accept: { from: ["submitted"], to: "accepted", action: "case.accept", verb: "Accept the case" },
  decline: { from: ["submitted"], to: "declined", action: "case.decline", verb: "Decline" },
  cancel: {
    from: ["draft", "submitted", "info_needed"],
    to: "cancelled",
    action: "case.cancel",
    verb: "Cancel the request",
  },
  startExamining: {
    from: ["accepted", "awaiting_evidence"],
    to: "examining",
    action: "case.startExamining",
    verb: "Start the examination",
  },
  startWeighing: {
    from: ["examining", "examining_nd", "plan_review"],
    to: "analysing",
    action: "case.startWeighing",
    verb: "Start weighing",
  },
  sendToSecondReader: {
    from: ["analysing", "reopened"],
    to: "in_review",
    action: "findings.sendToSecondReader",
    verb: "Send to the second reader",
  },
  sendForSignOff: {
    from: ["in_review"],
    to: "in_approval",
    action: "findings.sendForSignOff",
    verb: "Send for sign-off",
  },
  sendBack: {
    from: ["in_review", "in_approval"],
    to: "analysing",
    action: "findings.sendBack",
    verb: "Send back with a note",
  },
  sign: { from: ["in_approval"], to: "signed", action: "report.sign", verb: "Sign and lock" },
  release: { from: ["signed"], to: "released", action: "report.release", verb: "Release" },
  reopen: {
    from: ["released", "following_up", "closed"],
    to: "reopened",
    action: "report.openNewIssue",
    verb: "Open a new issue",
  },
} as const satisfies Record<string, Move>;
export type MoveName = keyof typeof MOVES;

export function canMove(name: MoveName, from: CaseState): boolean {
  return (MOVES[name].from as readonly CaseState[]).includes(from);
}

/** Technical work can be recorded. */
export const WORK_STATES: readonly CaseState[] = [
  "accepted",
  "awaiting_evidence",
  "examining_nd",
  "plan_review",
  "examining",
  "analysing",
  "reopened",
  "in_review",
];

/** Findings are locked: nothing that a report rests on may change. */
export const LOCKED_STATES: readonly CaseState[] = [
  "in_approval",
  "signed",
  "released",
  "following_up",
  "disposing",
  "closed",
];

export const ENDED_STATES: readonly CaseState[] = ["declined", "cancelled", "closed"];

export function stageNumber(state: CaseState): StageNumber {
  return STAGE_OF_STATE[state];
}

/** Stage word for the temper scale, or null where the state has no stage. */
export function stageName(state: CaseState): Stage | null {
  const number = STAGE_OF_STATE[state];
  return number === 0 ? null : (STAGES[number - 1] ?? null);
}
