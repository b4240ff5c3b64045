export const ISSUE_STATES = [
  "drafting",
  "peer_review",
  "approval",
  "signed",
  "released",
  "superseded",
  "withdrawn",
] as const;
export type IssueState = (typeof ISSUE_STATES)[number];
export const ISSUE_STATE_NAMES: Record<IssueState, string> = {
  drafting: "Being written",
  peer_review: "With the second reader",
  approval: "Waiting for signature",
  signed: "Signed, being stored",
  released: "Released",
  superseded: "Replaced by a later issue",
  withdrawn: "Withdrawn",
};
