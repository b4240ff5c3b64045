import Link from "next/link";
import { classNames } from "@/components/ui/class-names";
import { GateMark } from "@/components/ui/gate-mark";
import type { Gate } from "@/lib/cases/gates";

/** The eight gates in their order: met, or open with the one link that mends it. */
export function GateList({ gates, hasLinks = true }: { gates: Gate[]; hasLinks?: boolean }) {
  return (
    <ul>
      {gates.map((gate) => (
        <li
          key={gate.number}
          className={classNames(
            "flex items-center gap-2.5 border-b border-rule px-3.5 py-1.5 text-13 last:border-0",
            !gate.isMet && "bg-warn-tint",
          )}
        >
          <GateMark met={gate.isMet} />
          <span className="min-w-0 flex-1">
            {gate.title}
            <small
              className={classNames("block text-12", gate.isMet ? "text-ink-3" : "text-ink-2")}
            >
              {gate.detail}
            </small>
          </span>
          {hasLinks && gate.mend && <Link href={gate.mend.href}>{gate.mend.verb}</Link>}
        </li>
      ))}
    </ul>
  );
}
