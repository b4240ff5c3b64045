"use client";

import { memo } from "react";
import { classNames } from "@/components/ui/class-names";
import { Menu, MenuItem } from "@/components/ui/menu";
import { Shape } from "@/components/ui/shapes";
import { formatNumber } from "@/lib/format/numbers";
import { reportedHardness, reportedStrengthMpa } from "@/lib/hardness/report-rounding";
import type { Scale } from "@/lib/hardness/scales";
import type { ConvertedHardness, ResultContent, TypedReading } from "@/lib/traverses/schemas";
import { EndOfTableMark } from "./end-of-table-mark";
import type { TypedColumn } from "./grid-columns";

export type WorkedReading = ResultContent["readings"][number];
export type RowAct = "leave-out" | "put-back" | "keep" | "take-back";

const CELL = "h-9 border-r border-b border-rule p-0 text-13";
const WORKED = "num bg-surface-2 px-2.5 whitespace-nowrap";

export type GridRowProps = {
  index: number;
  reading: TypedReading | undefined;
  worked: WorkedReading | undefined;
  columns: readonly TypedColumn[];
  targets: readonly Scale[];
  showsMeasured: boolean;
  method: "HV" | "HK";
  isFlagged: boolean;
  problems: Partial<Record<string, string>> | undefined;
  isReadOnly: boolean;
  onType: (index: number, cell: TypedColumn["name"], typed: string) => void;
  onAct: (act: RowAct, id: string) => void;
};

function ConvertedCell({ of, isOut }: { of: ConvertedHardness | undefined; isOut: boolean }) {
  if (!of) return <td className={classNames(CELL, WORKED)} />;
  const text =
    of.value === null
      ? null
      : of.to === "Rm_MPa"
        ? formatNumber(reportedStrengthMpa(of.value))
        : formatNumber(of.value, { decimals: 1 });
  return (
    <td
      className={classNames(CELL, WORKED, "text-ink-2", isOut && "text-ink-3")}
      title={of.remarks.join(" ") || undefined}
    >
      {text ?? <span className="text-12 text-ink-3">no value</span>}
    </td>
  );
}

function RowMark({
  isOut,
  isFlagged,
  hasNoValue,
}: Record<"isOut" | "isFlagged" | "hasNoValue", boolean>) {
  if (isOut) return <Shape name="cross" className="text-ink-3" />;
  if (isFlagged) return <Shape name="triangle" className="text-warn" />;
  return hasNoValue ? <EndOfTableMark /> : <span aria-hidden="true">⋯</span>;
}

/** One indent: white cells are typed, grey ones worked out. */
export const GridRow = memo(function GridRow(props: GridRowProps) {
  const { index, reading, worked, columns, targets, isFlagged, problems, isReadOnly } = props;
  const isOut = reading?.leftOutReason !== undefined;
  const isKept = reading?.keptReason !== undefined;
  const noValue = worked?.conversions.filter(({ value }) => value === null) ?? [];
  const number = worked?.number;
  const name = number === undefined ? `row ${index + 1}` : `indent ${number}`;
  const tint = isFlagged && !isOut ? "bg-warn-tint!" : null;
  const state = isOut
    ? `left out: ${reading.leftOutReason}`
    : isFlagged
      ? "to settle"
      : (noValue[0]?.remarks[0] ?? (isKept ? `kept: ${reading.keptReason}` : "nothing to settle"));
  return (
    <tr data-row={index} className={classNames("bg-surface", isOut && "text-ink-3")}>
      <th
        scope="row"
        className={classNames(CELL, "num bg-surface-2 px-2.5 font-normal text-ink-3", tint)}
      >
        {number ?? ""}
      </th>
      {columns.map(({ name: cell, spoken }) => (
        <td key={cell} className={classNames(CELL, "relative bg-surface", tint)}>
          <input
            data-cell={`${index}:${cell}`}
            value={reading?.[cell] ?? ""}
            onChange={(event) => props.onType(index, cell, event.target.value)}
            onFocus={(event) => event.target.select()}
            readOnly={isReadOnly}
            inputMode="decimal"
            autoComplete="off"
            spellCheck={false}
            aria-label={`${spoken}, ${name}`}
            aria-invalid={problems?.[cell] ? true : undefined}
            title={problems?.[cell]}
            className={classNames(
              "tn h-full w-full min-w-0 bg-transparent px-2.5 text-right outline-none focus:bg-surface focus:outline-2 focus:-outline-offset-2 focus:outline-focus",
              problems?.[cell] && "text-bad shadow-edge-bad",
            )}
          />
        </td>
      ))}
      {props.showsMeasured ? (
        <td className={classNames(CELL, WORKED, tint, isOut ? "line-through" : "font-head")}>
          {worked?.hardness == null ? "" : reportedHardness(worked.hardness, props.method)}
        </td>
      ) : null}
      {targets.map((to) => (
        <ConvertedCell
          key={to}
          isOut={isOut}
          of={worked?.conversions.find((conversion) => conversion.to === to)}
        />
      ))}
      <td className={classNames(CELL, "w-[34px] border-r-0 text-center", tint)}>
        {reading === undefined || worked === undefined ? null : isReadOnly ? (
          <span title={state}>
            <RowMark isOut={isOut} isFlagged={isFlagged} hasNoValue={noValue.length > 0} />
            <span className="sr-only">{state}</span>
          </span>
        ) : (
          <Menu
            align="end"
            trigger={
              <button
                type="button"
                title={state}
                aria-label={`Acts for ${name}: ${state}`}
                className="inline-flex h-full w-full items-center justify-center text-ink-3 outline-none hover:text-ink focus-visible:outline-2 focus-visible:-outline-offset-2 focus-visible:outline-focus"
              >
                <RowMark isOut={isOut} isFlagged={isFlagged} hasNoValue={noValue.length > 0} />
              </button>
            }
          >
            {isOut ? (
              <MenuItem onSelect={() => props.onAct("put-back", reading.id)}>Put back</MenuItem>
            ) : (
              <MenuItem onSelect={() => props.onAct("leave-out", reading.id)}>
                Leave out, say why
              </MenuItem>
            )}
            {isKept ? (
              <MenuItem onSelect={() => props.onAct("take-back", reading.id)}>
                Take the reason back
              </MenuItem>
            ) : (
              <MenuItem onSelect={() => props.onAct("keep", reading.id)}>Keep, say why</MenuItem>
            )}
          </Menu>
        )}
      </td>
    </tr>
  );
});
