import Link from "next/link";
import type { ReactNode } from "react";
import type { CaseState } from "@/lib/cases/constants";
import { formatDate, type DateLike } from "@/lib/format/dates";
import { TemperStrip } from "@/components/ui/temper-strip";

export interface CaseBarProps {
  /** "RL-2026-0142"; leads to the overview. A draft has no number yet. */
  number: string | null;
  href: string;
  title: string;
  client: string;
  state: CaseState;
  onHold?: boolean;
  due?: DateLike;
  /** At most two. */
  actions?: ReactNode;
}

/** The head of every page of a case. The title is not the page's h1: that names the part. */
export function CaseBar({
  number,
  href,
  title,
  client,
  state,
  onHold,
  due,
  actions,
}: CaseBarProps) {
  return (
    <div className="sticky top-topbar z-20 flex min-h-casebar flex-wrap items-center gap-x-3.5 gap-y-1 border-b border-rule-2 bg-surface pr-5 pl-4">
      <Link
        href={href}
        className="font-mono text-13 font-medium text-ink-2 no-underline hover:underline"
      >
        {number ?? "Draft"}
      </Link>
      <span className="min-w-0 truncate text-16 font-head tracking-[-0.008em]">{title}</span>
      <span className="truncate text-13 text-ink-3">{client}</span>
      <div className="ml-auto flex items-center gap-3">
        <TemperStrip state={state} onHold={onHold} />
        {due ? (
          <span className="tn text-13 whitespace-nowrap text-ink-2">Due {formatDate(due)}</span>
        ) : null}
        {actions}
      </div>
    </div>
  );
}
