import type { ReactNode } from "react";

/** A value that Riverline works out: dashed edge, and the rule under it
 *  ("80 % of 560 HV1 (ISO 18203)"). It is an output, so no one tries to type in it. */
export function WorkedOut({
  label,
  value,
  unit,
  rule,
  htmlFor,
  className,
}: {
  label: ReactNode;
  value: ReactNode;
  unit?: ReactNode;
  rule?: ReactNode;
  /** Ids of the fields it rests on, separated by spaces. */
  htmlFor?: string;
  className?: string;
}) {
  return (
    <div className={className}>
      <div className="mb-1 text-13 font-strong">
        {label} <span className="font-normal text-ink-3">worked out</span>
      </div>
      <output
        htmlFor={htmlFor}
        className="tn flex h-control-h items-center rounded-3 border border-dashed border-rule-2 bg-surface-2 px-[9px] text-14"
      >
        {value}
        {unit ? <span className="ml-auto pl-2 text-13 text-ink-3">{unit}</span> : null}
      </output>
      {rule ? <div className="mt-1 text-12 text-ink-3">{rule}</div> : null}
    </div>
  );
}
