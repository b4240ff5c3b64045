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
    <dl className={classNames("grid grid-cols-[auto_minmax(0,1fr)] gap-x-4 text-13", className)}>
      {facts.map(({ name, value, mono }) => (
        <div
          key={name}
          className="col-span-2 grid grid-cols-subgrid border-b border-rule py-[5px] last:border-b-0"
        >
          <dt className="text-ink-3">{name}</dt>
          <dd className={classNames("min-w-0 break-words", mono && "font-mono")}>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
