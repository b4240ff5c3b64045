import { Facts } from "@/components/ui/facts";
import { Dash } from "@/components/ui/dash";
import { GateMark } from "@/components/ui/gate-mark";
import { Notice } from "@/components/ui/notice";
import { ITEM_KIND_NAMES } from "@/lib/evidence/constants";
import type { ItemRow } from "@/lib/evidence/list-items";
import { formatDate, formatDateTime } from "@/lib/format/dates";
import { formatCount, formatQuantity } from "@/lib/format/numbers";
import { CustodyChain } from "./custody-chain";
import { DescribeItemDialog } from "./describe-item-dialog";
import { HandOverDialog } from "./hand-over-dialog";

type Props = {
  caseId: string;
  item: ItemRow;
  /** What it was cut from; null for what came in. */
  parentLabel: string | null;
  holders: { id: string; name: string }[];
  mayDescribe: boolean;
  mayHandOver: boolean;
};

/** One item: what it is, where it is, and its chain of custody, newest first. */
export function ItemView({ caseId, item, parentLabel, holders, mayDescribe, mayHandOver }: Props) {
  const last = item.entries.at(-1);
  const { content } = item;
  return (
    <article aria-label={`${item.label} ${content.name}`}>
      <header className="flex flex-wrap items-center gap-3 border-b border-rule px-5 py-3">
        <span className="font-mono text-24 font-medium">{item.label}</span>
        <div>
          <h2 className="text-16 font-head">{content.name}</h2>
          <p className="text-13 text-ink-3">{kindLine(item, parentLabel)}</p>
        </div>
        {(mayDescribe || mayHandOver) && (
          <div className="ml-auto flex gap-2">
            {mayDescribe && <DescribeItemDialog key={item.version} caseId={caseId} item={item} />}
            {mayHandOver && <HandOverDialog caseId={caseId} item={item} holders={holders} />}
          </div>
        )}
      </header>
      <div className="grid gap-x-8 border-b border-rule bg-surface-2 px-5 py-3 sm:grid-cols-2">
        <Facts
          facts={[
            { name: "Where", value: last?.toPlace ?? <Dash words="nowhere yet" /> },
            { name: "Held by", value: last?.holder ?? <Dash words="nobody here" /> },
            { name: "Since", value: last ? formatDateTime(last.at) : <Dash words="no entry" /> },
          ]}
        />
        <Facts
          facts={[
            {
              name: "Mass",
              value:
                content.massG === null ? (
                  <Dash words="not weighed" />
                ) : (
                  formatQuantity(content.massG, "g")
                ),
            },
            {
              name: "Condition",
              value: content.condition.join(", ") || <Dash words="not noted" />,
            },
            { name: "Hazards", value: content.hazards.join(", ") || "None noted" },
          ]}
        />
        {content.description && <p className="raw text-13 sm:col-span-2">{content.description}</p>}
      </div>
      <div className="grid gap-3 px-5 py-4">
        {content.hazards.length > 0 && (
          <Notice kind="warn" title="Handle with care">
            {content.hazards.join(", ")}. Wear gloves and eye protection; identify unknown residue
            before cutting or grinding.
          </Notice>
        )}
        <h3 className="flex items-center gap-3 text-13 font-head">
          Chain of custody
          <span className="inline-flex items-center gap-1.5 font-normal text-ink-2">
            <GateMark met={item.breaks.length === 0 && item.entries.length > 0} />
            {item.breaks.length === 0
              ? `Unbroken, ${formatCount(item.entries.length, "entry", "entries")}, each sealed to the one before`
              : item.breaks.join("; ")}
          </span>
        </h3>
        <CustodyChain entries={item.entries} />
      </div>
    </article>
  );
}

/** "Part or half", "Cut from E1 on 19 Nov 2026", "Mount, from E1.1 on 20 Nov 2026" */
function kindLine(item: ItemRow, parentLabel: string | null): string {
  const name = ITEM_KIND_NAMES[item.kind];
  const first = item.entries[0];
  if (parentLabel === null) return name;
  const day = first ? ` on ${formatDate(first.at)}` : "";
  return item.kind === "cut"
    ? `Cut from ${parentLabel}${day}`
    : `${name}, from ${parentLabel}${day}`;
}
