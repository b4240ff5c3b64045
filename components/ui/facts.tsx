import type { ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";

export interface Fact {
  name: string;
  value: ReactNode;
  /** Set for identifiers: heat, serial, seal. */
  mono?: boolean;
}

/** Ruled list of name and value. */
export function Facts({ facts, className }: { facts: readonly Fact[]; className?: string }) {
  return (
    <dl className={classNames("text-13", className)}>
      {facts.map(({ name, value, mono }) => (
        <div
          key={name}
          className="grid grid-cols-[minmax(5rem,2fr)_minmax(0,5fr)] gap-4 border-b border-rule py-[5px] last:border-b-0"
        >
          <dt className="text-ink-3">{name}</dt>
          <dd className={classNames("min-w-0 break-words", mono && "font-mono")}>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
