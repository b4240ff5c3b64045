import { LinkButton } from "@/components/ui/link-button";
import { Panel, PanelHead } from "@/components/ui/panel";
import type { Gate } from "@/lib/cases/gates";
import { GateList } from "./gate-list";

/** The ledger before sign-off, on the overview. */
export function GatePanel({ gates, signOffHref }: { gates: Gate[]; signOffHref: string }) {
  const met = gates.filter((gate) => gate.isMet).length;
  return (
    <Panel>
      <PanelHead
        title="Gates to sign-off"
        actions={<span className="text-ink-2">{`${met} of ${gates.length} met`}</span>}
      />
      <GateList gates={gates} />
      <p className="border-t border-rule px-3.5 py-2.5">
        <LinkButton href={signOffHref}>Go to sign-off</LinkButton>
      </p>
    </Panel>
  );
}
