import { daysUntil, formatDay, formatDate, relativeDays, type DateLike } from "@/lib/format/dates";
import { classNames } from "@/components/ui/class-names";
import { Dash } from "@/components/ui/dash";

/** A flag on its pole: filled for late, open for soon. */
export function FlagLate({ filled }: { filled: boolean }) {
  return (
    <svg width="12" height="12" viewBox="0 0 12 12" aria-hidden="true" className="inline shrink-0">
      <path
        d="M2.5 11V1.5H10L8 4l2 2.5H2.5"
        fill={filled ? "currentColor" : "none"}
        stroke="currentColor"
        strokeWidth="1.3"
        strokeLinejoin="round"
      />
    </svg>
  );
}

const SOON_DAYS = 3;

/** A due date with how far it is. Late and soon carry flag, word and colour. */
export function DueFlag({
  due,
  now,
  withYear = false,
}: {
  due: DateLike;
  /** The moment the page was made, so that server and browser say the same. */
  now: Date;
  withYear?: boolean;
}) {
  const days = daysUntil(due, now);
  if (days === null) return <Dash words="no due date" />;
  const late = days < 0;
  const soon = !late && days <= SOON_DAYS;
  return (
    <span className="tn inline-flex items-center gap-1.5 whitespace-nowrap">
      <span>{withYear ? formatDate(due) : formatDay(due)}</span>
      <span
        className={classNames(
          "inline-flex items-center gap-1",
          late ? "text-bad" : soon ? "text-warn" : "text-ink-3",
        )}
      >
        {late || soon ? <FlagLate filled={late} /> : null}
        {relativeDays(due, now)}
      </span>
    </span>
  );
}
