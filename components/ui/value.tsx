import { formatWithUncertainty, type NumberShape } from "@/lib/format/numbers";
import { NO_BREAK_SPACE } from "@/lib/format/marks";
import { spokenQuantity } from "@/lib/format/spoken";
import { classNames } from "@/components/ui/class-names";
import { Dash } from "@/components/ui/dash";

/** Four different things, each with its own shape everywhere. */
export type ValueOrigin = "measured" | "converted" | "estimated" | "stated";

export function OriginShape({ origin }: { origin: ValueOrigin }) {
  return (
    <svg
      width="10"
      height="10"
      viewBox="0 0 10 10"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.4"
      className="inline shrink-0"
      role="img"
      aria-label={origin}
    >
      {origin === "measured" ? (
        <circle cx="5" cy="5" r="3.6" fill="currentColor" stroke="none" />
      ) : null}
      {origin === "converted" ? <path d="M5 .9 9.1 5 5 9.1.9 5z" /> : null}
      {origin === "estimated" ? <rect x=".9" y="3.2" width="8.2" height="3.6" /> : null}
      {origin === "stated" ? <circle cx="5" cy="5" r="3.6" /> : null}
    </svg>
  );
}

export interface ValueProps extends NumberShape {
  value: number | null | undefined;
  uncertainty?: number | null;
  unit?: string;
  /** Puts the shape before the value; a converted value also carries ≈. */
  origin?: ValueOrigin;
  /** Where it came from: "T2", "A1 · IM-03". */
  source?: string;
  /** Said in place of a missing value: "no value", "not measured". */
  missing?: string;
  strong?: boolean;
}

/** A number with its unit, its uncertainty and where it came from; never broken over lines. */
export function Value({
  value,
  uncertainty,
  unit = "",
  origin,
  source,
  missing = "no value",
  strong = false,
  ...shape
}: ValueProps) {
  if (value === null || value === undefined || !Number.isFinite(value)) {
    return <Dash words={missing} />;
  }
  const converted = origin === "converted";
  const text = formatWithUncertainty(value, uncertainty, unit, shape);
  return (
    <span className="tn inline-flex items-baseline gap-1.5 whitespace-nowrap">
      {origin ? <OriginShape origin={origin} /> : null}
      <span aria-hidden="true" className={classNames(strong && "font-strong")}>
        {converted ? `≈${NO_BREAK_SPACE}` : ""}
        {text}
      </span>
      <span className="sr-only">{spokenQuantity(value, uncertainty, unit, { converted })}</span>
      {source ? <span className="font-mono text-11 text-ink-3">{source}</span> : null}
    </span>
  );
}
