import type { CaseState } from "./constants";

/** One row of the case list, as the screen gets it. */
export type CaseListRow = {
  id: string;
  number: string | null;
  title: string;
  client: string;
  material: string;
  state: CaseState;
  isOnHold: boolean;
  investigator: string | null;
  itemCount: number;
  openGateCount: number;
  /** Calendar day, YYYY-MM-DD. */
  dueOn: string | null;
  signedAt: string | null;
  changedAt: string;
};
