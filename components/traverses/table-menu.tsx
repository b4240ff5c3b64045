"use client";

import { Button } from "@/components/ui/button";
import { Menu, MenuItem, MenuRule } from "@/components/ui/menu";
import { Shape } from "@/components/ui/shapes";
import type { EntryMode } from "./grid-columns";

type Props = {
  label: string;
  mode: EntryMode;
  /** Null where nothing can be typed. */
  onMode: ((mode: EntryMode) => void) | null;
  onSeveralRows: (() => void) | null;
  onSaveCsv: () => void;
  onWithdraw: (() => void) | null;
};

/** What can be done with the whole table of a traverse. */
export function TableMenu({ label, mode, onMode, onSeveralRows, onSaveCsv, onWithdraw }: Props) {
  const other = mode === "diagonals" ? "hardness" : "diagonals";
  return (
    <Menu
      align="end"
      trigger={
        <Button small look="quiet">
          Table <Shape name="chevron" size={14} />
        </Button>
      }
    >
      <MenuItem onSelect={onSaveCsv}>Save as CSV</MenuItem>
      {onMode === null ? null : (
        <MenuItem onSelect={() => onMode(other)}>Type {other} instead</MenuItem>
      )}
      {onSeveralRows === null ? null : (
        <MenuItem onSelect={onSeveralRows}>Several rows of indents</MenuItem>
      )}
      {onWithdraw === null ? null : (
        <>
          <MenuRule />
          <MenuItem danger onSelect={onWithdraw}>
            Withdraw {label}
          </MenuItem>
        </>
      )}
    </Menu>
  );
}
