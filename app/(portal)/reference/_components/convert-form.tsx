"use client";

import { useState } from "react";
import { NumberField, SelectField } from "@/components/ui/labelled-fields";
import { formatNumber } from "@/lib/format/numbers";
import { convert } from "@/lib/hardness/convert";
import type { HardnessTable } from "@/lib/hardness/hardness-table";
import { parseNumberCell } from "@/lib/hardness/parse-cell";
import type { TableId } from "@/lib/hardness/published-tables";
import { isScale, SCALE_NAMES, SCALES, type Scale } from "@/lib/hardness/scales";

/** Converts one measured value by this table, as it is typed. */
export function ConvertForm({ table, tableId }: { table: HardnessTable; tableId: TableId }) {
  const scales = SCALE_NAMES.filter((scale) => table.columns[scale]);
  const [typed, setTyped] = useState("");
  const [from, setFrom] = useState<Scale>(table.columns.HV ? "HV" : table.keyScale);
  const [to, setTo] = useState<Scale>(table.columns.HRC && from !== "HRC" ? "HRC" : table.keyScale);
  const options = scales.map((scale) => ({
    value: scale,
    label: `${scale}, ${SCALES[scale].name}`,
  }));
  const parsed = typed.trim() === "" ? null : parseNumberCell(typed);
  const problem = parsed && "problem" in parsed ? parsed.problem.text : null;
  const answer =
    parsed && "value" in parsed
      ? convert({
          materialGroup: table.materialGroup,
          from,
          to,
          tableId,
          enabledTableIds: new Set([tableId]),
          value: parsed.value,
        })
      : null;
  return (
    <div className="grid gap-3 sm:grid-cols-[8rem_1fr_1fr]">
      <NumberField
        name="measured"
        label="Measured"
        value={typed}
        error={problem}
        onChange={(event) => setTyped(event.target.value)}
      />
      <SelectField
        name="from-scale"
        label="Scale"
        value={from}
        options={options}
        onChange={({ target: { value } }) => (isScale(value) ? setFrom(value) : undefined)}
      />
      <SelectField
        name="to-scale"
        label="To"
        value={to}
        options={options}
        onChange={({ target: { value } }) => (isScale(value) ? setTo(value) : undefined)}
      />
      <p role="status" className="text-14 sm:col-span-3">
        {answer === null ? (
          <span className="text-13 text-ink-3">Type a measured value.</span>
        ) : answer.status === "ok" ? (
          <>
            <b className="tn font-head">
              ≈ {formatNumber(answer.value, { decimals: to === "Rm_MPa" ? 0 : 1 })}{" "}
              {SCALES[to].symbol}
            </b>
            <span className="ml-2 text-13 text-ink-2">
              {answer.edition}. {answer.warnings.map(({ text }) => text).join(" ")}
            </span>
          </>
        ) : (
          <span className="text-13 text-bad">No value. {answer.reason}</span>
        )}
      </p>
    </div>
  );
}
