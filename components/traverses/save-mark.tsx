import { formatTime } from "@/lib/format/dates";
import type { SaveState } from "./use-autosave";

const WORDS: Record<Exclude<SaveState["kind"], "saved">, string> = {
  unsaved: "Not saved yet",
  saving: "Saving",
  offline: "Offline. Your changes are kept on this device.",
  failed: "Not saved",
  conflict: "Not saved: two versions",
};

/** Whether what is shown is stored. */
export function SaveMark({ state }: { state: SaveState }) {
  return (
    <span role="status" className="no-print text-13 whitespace-nowrap text-ink-3">
      {state.kind === "saved" ? `Saved ${formatTime(state.at)}` : WORDS[state.kind]}
    </span>
  );
}
