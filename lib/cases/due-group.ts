import { STAGE_OF_STATE } from "./constants";
import type { CaseListRow } from "./list-row";

const DAY_MS = 86_400_000;
const SOON_DAYS = 14;

/** Group of a case in a list sorted by due date; groups follow one another in that order. */
export function dueGroup(row: Pick<CaseListRow, "state" | "dueOn">, now: Date): string {
  const stage = STAGE_OF_STATE[row.state];
  if (stage === 6) return "Signed";
  if (stage === 0 || stage === 7) return row.state === "draft" ? "Drafts" : "Ended";
  if (row.dueOn === null) return "No date yet";
  const days = (Date.parse(row.dueOn) - Date.parse(now.toISOString().slice(0, 10))) / DAY_MS;
  if (days < 0) return "Late";
  return days <= SOON_DAYS ? "Due within 14 days" : "Due later";
}
