import Link from "next/link";
import { LinkButton } from "@/components/ui/link-button";
import { Panel, PanelHead } from "@/components/ui/panel";
import type { CaseOverview } from "@/lib/cases/case-overview";
import { formatDate } from "@/lib/format/dates";
import { routes } from "@/lib/routes";

/** Released issues of the report. */
export function ReportPanel({ overview, mayRead }: { overview: CaseOverview; mayRead: boolean }) {
  const released = overview.issues.filter((issue) => issue.releasedAt !== null);
  if (released.length === 0) return null;
  return (
    <Panel>
      <PanelHead
        title="Report"
        actions={mayRead ? <Link href={routes.report(overview.id)}>Read it</Link> : null}
      />
      <ul className="px-3.5 py-1.5 text-13">
        {released.map((issue) => (
          <li key={issue.number} className="flex items-center justify-between py-1.5">
            <span>
              Issue {issue.number}, released {formatDate(issue.releasedAt ?? "")}
              {issue.state === "superseded" && (
                <span className="text-ink-3">, replaced by a later issue</span>
              )}
            </span>
            {mayRead && (
              <LinkButton
                small
                prefetch={false}
                href={routes.api.reportPdf(overview.id, issue.number)}
              >
                Download issue {issue.number}
              </LinkButton>
            )}
          </li>
        ))}
      </ul>
    </Panel>
  );
}
