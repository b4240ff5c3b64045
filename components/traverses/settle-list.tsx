import Link from "next/link";
import { classNames } from "@/components/ui/class-names";
import { Panel, PanelHead } from "@/components/ui/panel";
import { Shape } from "@/components/ui/shapes";
import { StateShape } from "@/components/ui/state-shape";
import { routes } from "@/lib/routes";
import type { ResultContent, SettleItem, TraverseContent } from "@/lib/traverses/schemas";
import { EndOfTableMark } from "./end-of-table-mark";

export type SettleAct =
  | { kind: "zigzag" | "keep" | "leave-out"; ids: readonly string[] }
  | { kind: "put-back" | "take-back" | "show"; ids: readonly string[] }
  | { kind: "settings" };

const ACT =
  "min-h-6 cursor-pointer text-13 whitespace-nowrap text-action underline underline-offset-[3px] hover:text-action-2";
/** Values without an entry that are listed one by one. */
const NO_VALUE_LISTED = 5;

type Offer = { words: string; act: SettleAct };

function offersOf(item: SettleItem, content: TraverseContent): Offer[] {
  const { readingIds: ids, code, level } = item;
  const leftOut = content.readings.filter(
    (row) => ids.includes(row.id) && row.leftOutReason !== undefined,
  );
  if (leftOut.length > 0)
    return [{ words: "Put back", act: { kind: "put-back", ids: leftOut.map(({ id }) => id) } }];
  if (code === "too_near_another" || code === "too_near_edge") {
    if (level === "settled")
      return [{ words: "Take the reason back", act: { kind: "take-back", ids } }];
    return [
      ...(code === "too_near_another"
        ? [{ words: "They were in zigzag", act: { kind: "zigzag" as const, ids } }]
        : []),
      { words: "Keep, say why", act: { kind: "keep", ids } },
      { words: "Leave out, say why", act: { kind: "leave-out", ids } },
    ];
  }
  if (ids.length > 0) return [{ words: "Show it", act: { kind: "show", ids } }];
  const isSetting = /depth_kind|limit|core|section|edge|load|track/.test(code);
  return isSetting ? [{ words: "Open the settings", act: { kind: "settings" } }] : [];
}

function MarkOf({ item }: { item: SettleItem }) {
  if (item.level === "must") return <Shape name="triangle" className="text-warn" />;
  if (item.level === "settled") return <StateShape state="complete" />;
  return /left out/i.test(item.text) ? (
    <Shape name="cross" size={14} className="text-ink-3" />
  ) : (
    <StateShape state="under-way" />
  );
}

const ROW =
  "flex flex-wrap items-center gap-x-2.5 gap-y-1 border-b border-rule px-3.5 py-[7px] text-[12.5px] leading-[17px] last:border-b-0";

/** What is to settle, what is only noted, and what was settled with its reason. */
export function SettleList({
  content,
  result,
  isReadOnly,
  onAct,
}: {
  content: TraverseContent;
  result: ResultContent;
  isReadOnly: boolean;
  onAct: (act: SettleAct) => void;
}) {
  const { items, readings } = result;
  const must = items.filter(({ level }) => level === "must").length;
  const noValue = readings.flatMap(({ number, conversions }) =>
    conversions.flatMap(({ to, value, remarks }) =>
      value === null
        ? [
            {
              key: `${number}-${to}`,
              text: `Indent ${number}: ${remarks.join(" ")} No value given.`,
            },
          ]
        : [],
    ),
  );
  const noted = items.length - must + noValue.length;
  return (
    <Panel>
      <PanelHead title="To settle" note={`${must} must, ${noted} noted`} />
      {items.length + noValue.length === 0 ? (
        <p className="px-3.5 py-2.5 text-13 text-ink-2">
          {readings.length === 0 ? "No readings yet." : "Nothing to settle."}
        </p>
      ) : (
        <ul aria-live="polite">
          {items.map((item, index) => (
            <li
              key={`${item.code}-${item.readingIds.join("-")}-${index}`}
              className={classNames(ROW, item.level === "must" && "bg-warn-tint")}
            >
              <MarkOf item={item} />
              <span
                className={classNames("min-w-48 flex-1", item.level === "must" && "font-medium")}
              >
                {item.text}
              </span>
              {isReadOnly ? null : (
                <span className="no-print flex flex-wrap gap-x-3">
                  {offersOf(item, content).map(({ words, act }) => (
                    <button key={words} type="button" className={ACT} onClick={() => onAct(act)}>
                      {words}
                    </button>
                  ))}
                </span>
              )}
            </li>
          ))}
          {noValue.slice(0, NO_VALUE_LISTED).map(({ key, text }) => (
            <li key={key} className={ROW}>
              <EndOfTableMark />
              <span className="min-w-48 flex-1">{text}</span>
              {content.tableId === null ? null : (
                <Link href={routes.referenceTable(content.tableId)} className={ACT}>
                  See table
                </Link>
              )}
            </li>
          ))}
          {noValue.length > NO_VALUE_LISTED ? (
            <li className={ROW}>
              <EndOfTableMark /> {noValue.length - NO_VALUE_LISTED} more without a value.
            </li>
          ) : null}
        </ul>
      )}
    </Panel>
  );
}
