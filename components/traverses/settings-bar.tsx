"use client";

import { Button } from "@/components/ui/button";
import { ErrorText } from "@/components/ui/error-text";
import { Select } from "@/components/ui/select";
import { hardnessSymbol, VICKERS_FORCES } from "@/lib/hardness/forces";
import { getTable, isTableId, type TableId } from "@/lib/hardness/published-tables";
import { tablesFor } from "@/lib/traverses/conversion-columns";
import type { TraverseContent } from "@/lib/traverses/schemas";

type Props = {
  content: TraverseContent;
  enabledTableIds: readonly TableId[];
  isReadOnly: boolean;
  isOpen: boolean;
  error?: string;
  onChange: (change: Partial<TraverseContent>) => void;
  onToggle: () => void;
};

/** The two choices that change most, and the way to the rest. */
export function SettingsBar({
  content,
  enabledTableIds,
  isReadOnly,
  isOpen,
  error,
  onChange,
  onToggle,
}: Props) {
  const { method, loadKgf, materialGroup, tableId } = content;
  const offered = tablesFor(materialGroup, method, new Set(enabledTableIds));
  const isOff = tableId !== null && !offered.includes(tableId);
  const loads: readonly number[] = VICKERS_FORCES.map(({ forceKgf }) => forceKgf);
  const all = loads.includes(loadKgf) ? loads : [...loads, loadKgf];
  const tableName = (id: TableId) => {
    const { standard, tableNumber } = getTable(id);
    return `${standard}, ${tableNumber}`;
  };
  return (
    <>
      <label htmlFor="traverse-load" className="text-13 text-ink-2">
        Load
      </label>
      <Select
        id="traverse-load"
        boxClassName="w-24!"
        className="text-13!"
        disabled={isReadOnly}
        value={String(loadKgf)}
        options={all.map((value) => ({
          value: String(value),
          label: hardnessSymbol({ method, loadKgf: value }),
        }))}
        onChange={(event) => onChange({ loadKgf: Number(event.target.value) })}
      />
      <label htmlFor="traverse-table" className="text-13 text-ink-2">
        Convert by
      </label>
      <Select
        id="traverse-table"
        boxClassName="w-52!"
        className="text-13!"
        disabled={isReadOnly}
        failed={error !== undefined}
        value={tableId ?? ""}
        options={[
          { value: "", label: offered.length === 0 ? "No table for this group" : "No conversion" },
          ...offered.map((id) => ({ value: id, label: tableName(id) })),
          ...(isOff
            ? [{ value: tableId, label: `${tableName(tableId)}, off`, disabled: true }]
            : []),
        ]}
        onChange={({ target: { value } }) => onChange({ tableId: isTableId(value) ? value : null })}
      />
      {error === undefined ? null : <ErrorText id="traverse-table-error">{error}</ErrorText>}
      {isReadOnly ? null : (
        <Button aria-expanded={isOpen} aria-controls="traverse-settings" onClick={onToggle}>
          Settings
        </Button>
      )}
    </>
  );
}
