import { formatTime } from "@/lib/format/dates";
import type { SaveState } from "./use-autosave";

const WORDS: Record<Exclude<SaveState["kind"], "saved">, string> = {
  unsaved: "Not saved yet",
  saving: "Saving",
  offline: "Offline.",
  failed: "Not saved",
  conflict: "Not saved: two versions",
};

/** Whether what is shown is stored. */
export function SaveMark({ state, keepsCopy }: { state: SaveState; keepsCopy: boolean }) {
  const where = keepsCopy ? "on this device" : "on this page only";
  return (
    <span role="status" className="no-print text-13 whitespace-nowrap text-ink-3">
      {state.kind === "saved" ? `Saved ${formatTime(state.at)}` : WORDS[state.kind]}
      {state.kind === "offline" && ` Your changes are kept ${where}.`}
    </span>
  );
}
