import Link from "next/link";
import type { ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";
import { LeadsTo } from "@/components/ui/leads-to";

/** current: as measured; stale: the source has changed since; kept: the old value on purpose;
 *  withdrawn: the source is gone, which blocks sign-off. */
export type CitedState = "current" | "stale" | "kept" | "withdrawn";

export interface CitedChipProps {
  /** As it is printed: "1.95 ± 0.06 mm". */
  value: string;
  /** Source tag: "T2", "A1 · IM-03". */
  source: string;
  state?: CitedState;
  /** For a stale value: what the text cites; value is what the source says now. */
  was?: string;
  /** For a kept value: the day, "27 Nov". */
  keptOn?: string;
  /** In words for those who hear it: "1.95 plus or minus 0.06 millimetres, from traverse T2". */
  spoken?: string;
  href?: string;
  /** On the sheet of findings and report; otherwise on the bench. */
  paper?: boolean;
  className?: string;
}

function look(state: CitedState, paper: boolean): string {
  if (state === "withdrawn") return "border-bad-mark text-bad";
  if (state === "stale") return "border-b-[2.5px] border-stale-line bg-stale-tint text-stale";
  const edge = state === "kept" ? "border-dashed " : "";
  return (
    edge +
    (paper ? "border-chip-edge bg-chip text-paper-ink" : "border-rule-2 bg-surface-2 text-ink")
  );
}

function shownValue({ state = "current", value, was }: CitedChipProps): ReactNode {
  if (state === "withdrawn") return <s>{value}</s>;
  if (state !== "stale" || was === undefined) return value;
  return (
    <>
      <s className="font-normal">{was}</s>
      <LeadsTo words="now" />
      {value}
    </>
  );
}

function sourceText({ state, source, keptOn }: CitedChipProps): string {
  if (state === "withdrawn") return `${source} withdrawn`;
  if (state === "kept") return [source, keptOn, "kept"].filter(Boolean).join(", ");
  return source;
}

/** A cited value in a text or a table, bound to its source. */
export function CitedChip(props: CitedChipProps) {
  const { state = "current", spoken, href, paper = false, className } = props;
  const quiet = state === "current" || state === "kept";
  const classes = classNames(
    "tn inline-flex items-baseline gap-1.5 rounded-2 border px-[5px] font-sans font-medium whitespace-nowrap no-underline",
    paper ? "mx-px text-[0.84375rem] leading-5" : "text-[0.78125rem] leading-[1.125rem]",
    look(state, paper),
    className,
  );
  const content = (
    <>
      <span aria-hidden={spoken ? true : undefined} className="inline-flex items-baseline gap-1.5">
        {shownValue(props)}
        <small
          className={classNames(
            "font-mono text-11 font-normal",
            quiet && (paper ? "text-paper-ink-2" : "text-ink-3"),
          )}
        >
          {sourceText(props)}
        </small>
      </span>
      {spoken ? <span className="sr-only">{spoken}</span> : null}
    </>
  );
  return href ? (
    <Link href={href} className={classes}>
      {content}
    </Link>
  ) : (
    <span className={classes}>{content}</span>
  );
}
