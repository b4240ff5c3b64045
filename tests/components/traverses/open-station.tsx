import { fireEvent, render, screen } from "@testing-library/react";
import { vi } from "vitest";
import { TraverseStation, type StationProps } from "@/components/traverses/traverse-station";
import type { SaveAnswer } from "@/components/traverses/use-autosave";
import { DEFAULT_ENABLED_TABLE_IDS } from "@/lib/hardness/published-tables";
import { newTraverse } from "@/lib/traverses/new-traverse";
import { NO_PROPOSAL } from "@/lib/traverses/propose-from-return";
import type { TraverseContent } from "@/lib/traverses/schemas";

/** Three indents of an induction hardened shaft; invented. */
export const content = (change: Partial<TraverseContent> = {}): TraverseContent => ({
  ...newTraverse(),
  name: "at fillet",
  tableId: "steel-unalloyed-lowalloy-iso18265-a1",
  process: "induction",
  depthKind: "SHD",
  minSurfaceHv: 560,
  readings: [
    { id: "r1", depth: "0.30", d1: "54.2", d2: "54.6" },
    { id: "r2", depth: "1.90", d1: "62.9", d2: "63.5" },
    { id: "r3", depth: "2.80", d1: "77.1", d2: "77.9" },
  ],
  ...change,
});

export const saved = (version: number): SaveAnswer => ({ ok: true, value: { version } });

/** The station of one traverse with a server that answers as told. */
export function openStation(change: Partial<StationProps> = {}) {
  const save = vi.fn<StationProps["save"]>((seen) => Promise.resolve(saved(seen + 1)));
  const traverse = {
    traverseId: "rec_t2",
    label: "T2",
    version: 4,
    content: content(),
    by: "Tove Brandt",
    at: "2026-12-01T09:00:00Z",
  };
  render(
    <TraverseStation
      traverse={traverse}
      caseNumber="RL-2026-0142"
      others={[]}
      tabs={[]}
      newHref={null}
      proposal={NO_PROPOSAL}
      enabledTableIds={[...DEFAULT_ENABLED_TABLE_IDS]}
      items={[]}
      readOnlyBecause={null}
      save={save}
      onWithdraw={null}
      {...change}
    />,
  );
  return { save };
}

export const cell = (name: string) => screen.getByRole<HTMLInputElement>("textbox", { name });
export const type = (name: string, text: string) =>
  fireEvent.change(cell(name), { target: { value: text } });
export const paste = (text: string) =>
  fireEvent.paste(screen.getByRole("group", { name: "Indents, typed or pasted" }), {
    clipboardData: { getData: () => text },
  });
