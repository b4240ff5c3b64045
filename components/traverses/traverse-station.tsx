"use client";

import { useCallback, useMemo, useRef, useState } from "react";
import { ChartPanel } from "@/components/charts/chart-panel";
import { parseBlock } from "@/lib/hardness/parse-block";
import type { TableId } from "@/lib/hardness/published-tables";
import { chartOfTraverse, type ShownTraverse } from "@/lib/traverses/chart-of-traverse";
import { measuredScale, targetsOf } from "@/lib/traverses/conversion-columns";
import { tidyCell, withBlock, withCell } from "@/lib/traverses/edit-readings";
import type { TraverseProposal } from "@/lib/traverses/propose-from-return";
import type { TraverseContent } from "@/lib/traverses/schemas";
import { traverseCsv } from "@/lib/traverses/traverse-csv";
import type { CellName } from "@/lib/traverses/typed-cells";
import { ConflictNotice } from "./conflict-notice";
import { entryModeOf, typedColumns, type EntryMode } from "./grid-columns";
import type { RowAct } from "./grid-row";
import { type GridHandle, PasteGrid } from "./paste-grid";
import { type Paste, PasteNote } from "./paste-note";
import { ReasonDialog, type Asked } from "./reason-dialog";
import { ResultCautions, ResultStrip } from "./result-strip";
import { saveFile } from "./save-file";
import { SaveMark } from "./save-mark";
import { SettingsBar } from "./settings-bar";
import { SettingsPanel } from "./settings-panel";
import { indentsOf, putBack, takeReasonBack, withAnswer } from "./settle-indents";
import { SettleList, type SettleAct } from "./settle-list";
import { StationNotices } from "./station-notices";
import { TableMenu } from "./table-menu";
import { TraverseTabs, type TraverseTab } from "./traverse-tabs";
import { useAutosave, type SaveTraverse } from "./use-autosave";
import { useKeptDraft } from "./use-kept-draft";
import { useLiveResult } from "./use-live-result";
import { useTraverseEditor } from "./use-traverse-editor";

export type StationProps = {
  traverse: {
    traverseId: string;
    label: string;
    version: number;
    content: TraverseContent;
    by: string;
    at: string;
  };
  caseNumber: string;
  others: readonly ShownTraverse[];
  tabs: readonly TraverseTab[];
  newHref: string | null;
  proposal: TraverseProposal;
  enabledTableIds: readonly TableId[];
  items: readonly { id: string; label: string }[];
  /** Why nothing can be changed here; null when it can. */
  readOnlyBecause: string | null;
  save: SaveTraverse;
  /** Null where it cannot be withdrawn. */
  onWithdraw: ((reason: string) => void) | null;
};

/** One traverse at work: table, profile, results, and what is to settle. */
export function TraverseStation(props: StationProps) {
  const { traverse, others, enabledTableIds, readOnlyBecause } = props;
  const { traverseId, label } = traverse;
  const isReadOnly = readOnlyBecause !== null;
  const grid = useRef<GridHandle>(null);
  const editor = useTraverseEditor(traverse.content);
  const { content } = editor;
  const { filled, result, problems, flagged } = useLiveResult(content, {
    traverseId,
    label,
    enabledTableIds,
  });
  const autosave = useAutosave({
    traverseId,
    version: traverse.version,
    savedAt: traverse.at,
    content: filled,
    save: props.save,
    isReadOnly,
  });
  const [paste, setPaste] = useState<Paste | null>(null);
  const [asked, setAsked] = useState<Asked | null>(null);
  const [showsSettings, setShowsSettings] = useState(false);
  const [isRestored, setRestored] = useState(false);
  const [chosenMode, setMode] = useState<EntryMode | null>(null);
  const mode = chosenMode ?? entryModeOf(content.readings);

  useKeptDraft(
    traverseId,
    isReadOnly,
    (kept) => {
      editor.replace(kept.content);
      if (kept.isOld)
        autosave.openConflict(
          { content: traverse.content, by: traverse.by, at: traverse.at },
          `${label} changed since you typed here. Yours was kept on this device; compare the two.`,
        );
      else setRestored(true);
    },
    traverse.version,
    traverse.content,
  );

  const columns = typedColumns(content, mode, result.symbol);
  const targets = useMemo(
    () =>
      content.tableId === null ? [] : targetsOf(content.tableId, measuredScale(content.method)),
    [content.tableId, content.method],
  );
  const chart = useMemo(
    () => chartOfTraverse({ label, content: filled, result }, { others }),
    [label, filled, result, others],
  );

  const { change } = editor;
  const onType = useCallback(
    (index: number, cell: CellName, typed: string) =>
      change(
        (now) => ({ ...now, readings: withCell(now.readings, index, cell, typed) }),
        `${index}:${cell}`,
      ),
    [change],
  );
  const setContent = (part: Partial<TraverseContent>) =>
    change((now) => ({ ...now, ...part }), Object.keys(part).join());

  function onPasteBlock(fromRow: number, text: string) {
    const block = parseBlock(text);
    if (block.status === "refused") {
      setPaste({ kind: "refused", text: `${block.reason} Nothing in the table changed.` });
      return;
    }
    setMode(block.columns === "depth_hardness" ? "hardness" : "diagonals");
    change((now) => ({ ...now, readings: withBlock(now.readings, fromRow, block) }));
    setPaste({ kind: "read", text: `Pasted ${block.summary}.` });
  }

  function onSettle(act: SettleAct) {
    if (act.kind === "settings") setShowsSettings(true);
    else if (act.kind === "put-back")
      change((now) => ({ ...now, readings: putBack(now.readings, act.ids) }));
    else if (act.kind === "take-back")
      change((now) => ({ ...now, readings: takeReasonBack(now.readings, act.ids) }));
    else if (act.kind === "show") {
      grid.current?.show(content.readings.findIndex(({ id }) => act.ids.includes(id)));
    } else setAsked({ kind: act.kind, indents: indentsOf(act.ids, result) });
  }

  const onRowAct = useCallback(
    (act: RowAct, id: string) => {
      if (act === "put-back") change((now) => ({ ...now, readings: putBack(now.readings, [id]) }));
      else if (act === "take-back")
        change((now) => ({ ...now, readings: takeReasonBack(now.readings, [id]) }));
      else setAsked({ kind: act, indents: indentsOf([id], result) });
    },
    [change, result],
  );

  const addTracks = () =>
    change((now) => ({
      ...now,
      readings: now.readings.map((row) => ({ ...row, track: row.track ?? "1" })),
    }));

  const { state } = autosave;
  const errors = state.kind === "failed" ? state.fields : {};
  const fileName = `${props.caseNumber}-${label}`;
  return (
    <div className="pb-4">
      <div className="flex min-h-12 flex-wrap items-center gap-x-3 gap-y-2 px-4 py-2">
        <h1 className="sr-only">
          Hardness, {label} {content.name}
        </h1>
        <TraverseTabs tabs={props.tabs} newHref={props.newHref} />
        <div className="ml-auto flex flex-wrap items-center gap-2">
          {isReadOnly ? null : <SaveMark state={state} keepsCopy={autosave.keepsCopy} />}
          <SettingsBar
            content={content}
            enabledTableIds={enabledTableIds}
            isReadOnly={isReadOnly}
            isOpen={showsSettings}
            error={errors["content.tableId"]}
            onChange={setContent}
            onToggle={() => setShowsSettings(!showsSettings)}
          />
        </div>
      </div>
      <StationNotices
        label={label}
        readOnlyBecause={readOnlyBecause}
        state={state}
        keepsCopy={autosave.keepsCopy}
        onRetry={autosave.retry}
        onRestoredSeen={isRestored ? () => setRestored(false) : null}
      />
      {state.kind === "conflict" ? (
        <ConflictNotice
          message={state.message}
          mine={filled}
          theirs={state.theirs}
          onKeepMine={autosave.keepMine}
          onTakeTheirs={() => {
            editor.replace(state.theirs.content);
            autosave.takeTheirs();
          }}
        />
      ) : null}
      {showsSettings ? (
        <SettingsPanel
          content={content}
          proposal={props.proposal}
          items={props.items}
          errors={errors}
          onChange={setContent}
          onClose={() => setShowsSettings(false)}
        />
      ) : null}
      <div className="grid items-start gap-4 px-4 xl:grid-cols-[31.25rem_minmax(0,1fr)] print:block">
        <section
          aria-label={`Readings of ${label}`}
          className="flex max-h-[calc(100dvh-10.5rem)] flex-col overflow-hidden rounded-4 border border-rule-2 bg-surface print:max-h-none"
        >
          {paste === null ? null : (
            <PasteNote
              paste={paste}
              onAct={() => {
                if (paste.kind === "read") editor.undo();
                setPaste(null);
              }}
            />
          )}
          <PasteGrid
            handle={grid}
            content={content}
            result={result}
            columns={columns}
            targets={targets}
            showsMeasured={mode === "diagonals"}
            problems={problems}
            flagged={flagged}
            isReadOnly={isReadOnly}
            onType={onType}
            onLeaveCell={(index, cell) => {
              const typed = content.readings[index]?.[cell];
              if (typed !== undefined && tidyCell(typed) !== typed)
                onType(index, cell, tidyCell(typed));
            }}
            onPasteBlock={onPasteBlock}
            onUndo={editor.undo}
            onAct={onRowAct}
            acts={
              <TableMenu
                label={label}
                mode={mode}
                onMode={isReadOnly ? null : setMode}
                onSeveralRows={
                  isReadOnly || columns.some(({ name }) => name === "track") ? null : addTracks
                }
                onSaveCsv={() =>
                  saveFile(`${fileName}.csv`, "text/csv", traverseCsv(filled, result))
                }
                onWithdraw={props.onWithdraw && (() => setAsked({ kind: "withdraw", indents: [] }))}
              />
            }
          />
        </section>
        <div className="grid min-w-0 gap-3">
          <ChartPanel chart={chart} fileName={fileName} />
          <ResultStrip result={result} />
          <SettleList content={filled} result={result} isReadOnly={isReadOnly} onAct={onSettle} />
          <ResultCautions result={result} />
        </div>
      </div>
      {asked === null ? null : (
        <ReasonDialog
          asked={asked}
          of={label}
          onCancel={() => setAsked(null)}
          onAnswer={(answered) => {
            setAsked(null);
            if (answered.kind === "withdraw") props.onWithdraw?.(answered.reason);
            else change((now) => withAnswer(now, asked, answered));
          }}
        />
      )}
    </div>
  );
}
