import Link from "next/link";
import { GateMark } from "@/components/ui/gate-mark";
import { LinkButton } from "@/components/ui/link-button";
import { Panel, PanelHead } from "@/components/ui/panel";
import { classNames } from "@/components/ui/class-names";
import type { Gate } from "@/lib/cases/gates";

/** The ledger before sign-off: what is met, what is open, and the one link that mends it. */
export function GatePanel({ gates, signOffHref }: { gates: Gate[]; signOffHref: string }) {
  const met = gates.filter((gate) => gate.isMet).length;
  return (
    <Panel>
      <PanelHead
        title="Gates to sign-off"
        actions={<span className="text-ink-2">{`${met} of ${gates.length} met`}</span>}
      />
      <ul>
        {gates.map((gate) => (
          <li
            key={gate.number}
            className={classNames(
              "flex items-center gap-2.5 border-b border-rule px-3.5 py-1.5 text-13",
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
            {gate.mend && <Link href={gate.mend.href}>{gate.mend.verb}</Link>}
          </li>
        ))}
      </ul>
      <p className="px-3.5 py-2.5">
        <LinkButton href={signOffHref}>Go to sign-off</LinkButton>
      </p>
    </Panel>
  );
}
