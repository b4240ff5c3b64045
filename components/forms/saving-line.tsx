import { formatTime } from "@/lib/format/dates";
import type { SavingState } from "./use-draft-saving";

/** How the draft stands, in one line. */
export function SavingLine({ state }: { state: SavingState<object> }) {
  const words = (() => {
    switch (state.kind) {
      case "saved":
        return state.at === null ? "Nothing to save" : `Saved ${formatTime(state.at)}`;
      case "waiting":
        return "Not saved yet; kept on this device";
      case "saving":
        return "Saving";
      case "offline":
        return "No connection; kept on this device and sent later";
      case "signed-out":
        return "You are signed out; kept on this device";
      case "refused":
        return "Not saved; kept on this device";
      case "conflict":
        return "Not saved; someone else saved";
    }
  })();
  return (
    <p role="status" className="text-12 text-ink-2">
      {words}
    </p>
  );
}
