import { Notice } from "@/components/ui/notice";
import { CASE_STATE_NAMES } from "@/lib/cases/constants";
import type { CaseOverview } from "@/lib/cases/case-overview";
import { formatDate } from "@/lib/format/dates";

/** What stands over the whole case: how it ended, holds, and danger to others. */
export function StandingNotices({ overview }: { overview: CaseOverview }) {
  const hasEnded = overview.state === "declined" || overview.state === "cancelled";
  return (
    <div className="mb-3.5 grid gap-2 empty:hidden">
      {hasEnded && (
        <Notice kind="note" title={CASE_STATE_NAMES[overview.state]}>
          {overview.endReason ?? "No reason was written."}
        </Notice>
      )}
      {overview.holds.map((hold) => (
        <Notice key={hold.id} kind="warn" title={hold.name}>
          {hold.reason} {hold.setBy}, {formatDate(hold.setAt)}.
        </Notice>
      ))}
      {overview.priority?.startsWith("P1") && !hasEnded && (
        <Notice kind="warn" title="People may be in danger">
          Do not wait for the report. Tell the owner of the running parts now, and stop or inspect
          them under the rules that apply there.
        </Notice>
      )}
    </div>
  );
}
