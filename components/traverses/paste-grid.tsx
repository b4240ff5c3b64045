"use client";

import { useVirtualizer } from "@tanstack/react-virtual";
import {
  useCallback,
  useImperativeHandle,
  useMemo,
  useRef,
  type ClipboardEvent,
  type KeyboardEvent,
  type ReactNode,
  type Ref,
} from "react";
import { classNames } from "@/components/ui/class-names";
import { Kbd } from "@/components/ui/kbd";
import type { Scale } from "@/lib/hardness/scales";
import type { ResultContent, TraverseContent } from "@/lib/traverses/schemas";
import type { CellName, FoundProblem } from "@/lib/traverses/typed-cells";
import { convertedHead, type TypedColumn } from "./grid-columns";
import { GridRow, type RowAct } from "./grid-row";

const ROW_PX = 36;
/** Below this all rows stand in the page, so that find and print reach them. */
const VIRTUAL_FROM = 200;
const HEAD =
  "h-11 border-r border-b border-rule bg-surface-2 px-2.5 text-12 leading-[15px] font-strong whitespace-nowrap";

export type PasteGridProps = {
  content: TraverseContent;
  result: ResultContent;
  columns: readonly TypedColumn[];
  targets: readonly Scale[];
  showsMeasured: boolean;
  problems: readonly FoundProblem[];
  flagged: ReadonlySet<string>;
  isReadOnly: boolean;
  onType: (index: number, cell: CellName, typed: string) => void;
  onLeaveCell: (index: number, cell: CellName) => void;
  onPasteBlock: (fromRow: number, text: string) => void;
  onUndo: () => void;
  onAct: (act: RowAct, id: string) => void;
  /** At the foot: what can be done with the whole table. */
  acts: ReactNode;
  /** Lets the station bring a row into view and put the cursor into its depth. */
  handle: Ref<GridHandle>;
};
export type GridHandle = { show: (row: number) => void };

function cellAt(target: EventTarget): { row: number; cell: string } | null {
  if (!(target instanceof HTMLInputElement)) return null;
  const [row, cell] = (target.dataset.cell ?? "").split(":");
  return cell === undefined ? null : { row: Number(row), cell };
}

/** The table of indents: typed or pasted, with what follows from each row beside it. */
export function PasteGrid(props: PasteGridProps) {
  const { content, result, columns, targets, problems, isReadOnly, onType, onAct } = props;
  const box = useRef<HTMLDivElement>(null);
  const rowCount = content.readings.length + (isReadOnly ? 0 : 1);
  const isVirtual = rowCount > VIRTUAL_FROM;
  // eslint-disable-next-line react-hooks/incompatible-library -- no compiler memoizes what it returns
  const virtualizer = useVirtualizer({
    count: rowCount,
    getScrollElement: () => box.current,
    estimateSize: () => ROW_PX,
    overscan: 12,
    enabled: isVirtual,
  });
  const worked = useMemo(
    () => new Map(result.readings.map((reading) => [reading.id, reading])),
    [result],
  );
  const problemsOf = useMemo(() => {
    const byId = new Map<string, Partial<Record<string, string>>>();
    for (const { readingId, cell, text } of problems)
      byId.set(readingId, { ...byId.get(readingId), [cell]: text });
    return byId;
  }, [problems]);

  const goTo = useCallback(
    (row: number, cell: string) => {
      if (isVirtual) virtualizer.scrollToIndex(row);
      requestAnimationFrame(() =>
        box.current?.querySelector<HTMLInputElement>(`[data-cell="${row}:${cell}"]`)?.focus(),
      );
    },
    [isVirtual, virtualizer],
  );

  useImperativeHandle(props.handle, () => ({ show: (row) => goTo(row, "depth") }), [goTo]);

  function onKeyDown(event: KeyboardEvent) {
    const at = cellAt(event.target);
    if ((event.ctrlKey || event.metaKey) && event.key.toLowerCase() === "z" && !event.shiftKey) {
      event.preventDefault();
      props.onUndo();
      return;
    }
    if (!at || !(event.target instanceof HTMLInputElement)) return;
    const move = (by: number) => {
      event.preventDefault();
      goTo(Math.min(Math.max(at.row + by, 0), rowCount - 1), at.cell);
    };
    if (event.key === "Enter") move(event.shiftKey ? -1 : 1);
    else if (event.key === "ArrowDown") move(1);
    else if (event.key === "ArrowUp") move(-1);
    else if (event.key === "F2") {
      event.preventDefault();
      const end = event.target.value.length;
      event.target.setSelectionRange(end, end);
    } else if (event.key === "Escape") event.target.select();
  }

  function onPaste(event: ClipboardEvent) {
    if (isReadOnly) return;
    const text = event.clipboardData.getData("text/plain");
    // One plain cell goes where the cursor is; anything wider is a block.
    if (!/[\t;\n\r]|\S\s+\S/.test(text.trim())) return;
    event.preventDefault();
    const at = cellAt(event.target);
    props.onPasteBlock(at?.row ?? content.readings.length, text);
  }

  const virtualRows = virtualizer.getVirtualItems();
  const first = isVirtual ? (virtualRows[0]?.index ?? 0) : 0;
  const last = isVirtual ? (virtualRows.at(-1)?.index ?? 0) : rowCount - 1;
  const span = columns.length + targets.length + (props.showsMeasured ? 3 : 2);
  const filler = (rows: number) =>
    rows > 0 ? (
      <tr aria-hidden="true">
        <td colSpan={span} style={{ height: rows * ROW_PX }} />
      </tr>
    ) : null;
  const [title = ""] = result.tableTitles;

  return (
    <>
      <div
        ref={box}
        role="group"
        aria-label="Indents, typed or pasted"
        className="min-h-0 flex-1 overflow-auto print:overflow-visible"
        onKeyDown={onKeyDown}
        onPaste={onPaste}
        onBlur={(event) => {
          const at = cellAt(event.target);
          if (at) props.onLeaveCell(at.row, at.cell as CellName);
        }}
      >
        <table
          className="w-full border-separate border-spacing-0 text-13"
          aria-rowcount={rowCount + 1}
        >
          <caption className="sr-only">
            Readings of {result.traverseLabel}: typed columns, measured hardness, conversions
          </caption>
          <thead className="sticky top-0 z-10">
            <tr>
              <th scope="col" className={classNames(HEAD, "num w-10")}>
                No.
              </th>
              {columns.map(({ name, head, sub, unit }) => (
                <th key={name} scope="col" className={classNames(HEAD, "num min-w-14")}>
                  {head}
                  {sub ? <sub className="text-[9px] leading-none">{sub}</sub> : null}
                  <span className="block font-normal text-ink-3">{unit}</span>
                </th>
              ))}
              {props.showsMeasured ? (
                <th scope="col" className={classNames(HEAD, "num")}>
                  {result.symbol}
                  <span className="block font-normal text-ink-3">measured</span>
                </th>
              ) : null}
              {targets.map((to) => {
                const { head, sub, unit } = { sub: "", ...convertedHead(to) };
                const short = title.replace(/^.*Table\s/, "");
                return (
                  <th key={to} scope="col" className={classNames(HEAD, "num")} title={title}>
                    ≈ {head}
                    {sub ? <sub className="text-[9px] leading-none">{sub}</sub> : null}
                    <span className="block font-normal text-ink-3">
                      {[unit, short].filter(Boolean).join(", ")}
                    </span>
                  </th>
                );
              })}
              <th scope="col" className={classNames(HEAD, "w-[34px] border-r-0 px-0")}>
                <span className="sr-only">State</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {filler(first)}
            {Array.from({ length: Math.max(last - first + 1, 0) }, (_, offset) => {
              const index = first + offset;
              const reading = content.readings[index];
              return (
                <GridRow
                  key={index}
                  index={index}
                  reading={reading}
                  worked={reading && worked.get(reading.id)}
                  columns={columns}
                  targets={targets}
                  showsMeasured={props.showsMeasured}
                  method={content.method === "vickers" ? "HV" : "HK"}
                  isFlagged={reading !== undefined && props.flagged.has(reading.id)}
                  problems={reading && problemsOf.get(reading.id)}
                  isReadOnly={isReadOnly}
                  onType={onType}
                  onAct={onAct}
                />
              );
            })}
            {filler(rowCount - 1 - last)}
          </tbody>
        </table>
      </div>
      {problems.length > 0 ? (
        <ul
          aria-label="Cells to look at"
          className="max-h-24 overflow-auto border-t border-rule px-3 py-2 text-12 text-bad"
        >
          {problems.slice(0, 20).map(({ readingId, cell, number, text }) => (
            <li key={`${readingId}-${cell}`}>
              <button
                type="button"
                className="underline underline-offset-2"
                onClick={() =>
                  goTo(
                    content.readings.findIndex(({ id }) => id === readingId),
                    cell,
                  )
                }
              >
                Row {number}
              </button>
              : {text}
            </li>
          ))}
          {problems.length > 20 ? <li>And {problems.length - 20} more.</li> : null}
        </ul>
      ) : null}
      <div className="no-print flex items-center gap-2 border-t border-rule px-3 py-1.5 text-12 text-ink-3">
        {isReadOnly ? null : (
          <p>
            Row {content.readings.length + 1}: type, or paste a block with <Kbd>Ctrl</Kbd>{" "}
            <Kbd>V</Kbd>. <Kbd>Tab</Kbd> goes on, <Kbd>Enter</Kbd> down.
          </p>
        )}
        <div className="ml-auto">{props.acts}</div>
      </div>
    </>
  );
}
