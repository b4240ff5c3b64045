import { LeadsTo } from "@/components/ui/leads-to";
import { CUSTODY_ACT_NAMES } from "@/lib/evidence/constants";
import type { CustodyRow } from "@/lib/evidence/list-items";
import { formatDateTime } from "@/lib/format/dates";

/** Ring for a hand-over, diamond for a cut, filled dot for receipt. */
function Mark({ act }: { act: CustodyRow["act"] }) {
  return (
    <svg
      width="14"
      height="14"
      viewBox="0 0 14 14"
      aria-hidden="true"
      className="relative mt-1 shrink-0"
      stroke="var(--action)"
      strokeWidth="1.6"
      fill="var(--surface)"
    >
      {act === "cut" ? (
        <path d="M7 1.5 12.5 7 7 12.500 1.500 7z" />
      ) : (
        <circle
          cx="7"
          cy="7"
          r="5"
          fill={act === "received" ? "var(--action)" : "var(--surface)"}
        />
      )}
    </svg>
  );
}

/** Entries of one item, newest first. They are never edited; a correction names the one it corrects. */
export function CustodyChain({ entries }: { entries: CustodyRow[] }) {
  const position = new Map(entries.map((entry) => [entry.id, entry.position]));
  return (
    <ol reversed className="text-13">
      {[...entries].reverse().map((entry) => (
        <li
          key={entry.id}
          className="relative grid grid-cols-[1rem_8.5rem_minmax(0,1fr)_auto] gap-x-3 pb-4 before:absolute before:top-4 before:-bottom-1 before:left-1.5 before:w-0.5 before:bg-action last:before:hidden"
        >
          <Mark act={entry.act} />
          <time dateTime={entry.at} className="tn text-ink-2">
            {formatDateTime(entry.at)}
          </time>
          <div className="raw">
            <p className="font-strong">
              {CUSTODY_ACT_NAMES[entry.act]}
              {entry.correctsId && ` of entry ${position.get(entry.correctsId) ?? ""}`}
            </p>
            <p className="flex flex-wrap items-center gap-2">
              {entry.fromPlace} <LeadsTo words="to" /> {entry.toPlace}
            </p>
            <p className="text-ink-2">
              {entry.reason}
              {entry.sealBroken && ` Seal ${entry.sealBroken} broken.`}
              {entry.sealFitted && ` Seal ${entry.sealFitted} fitted.`}
              {entry.conditionNote && ` Condition: ${entry.conditionNote}.`}
            </p>
          </div>
          <p className="text-right">
            {entry.by}
            <span className="block font-mono text-11 text-ink-3">{entry.checkCode}</span>
          </p>
        </li>
      ))}
    </ol>
  );
}
