import { formatTime } from "@/lib/format/dates";
import type { SavingState } from "./use-draft-saving";

type Props = { state: SavingState<object>; keepsCopy: boolean };

/** How the draft stands, in one line. */
export function SavingLine({ state, keepsCopy }: Props) {
  const where = keepsCopy ? "kept on this device" : "kept on this page only";
  const words = (() => {
    switch (state.kind) {
      case "saved":
        return state.at === null ? "Nothing to save" : `Saved ${formatTime(state.at)}`;
      case "waiting":
        return `Not saved yet; ${where}`;
      case "saving":
        return "Saving";
      case "offline":
        return `No connection; ${where} and sent later`;
      case "signed-out":
        return `You are signed out; ${where}`;
      case "refused":
        return `Not saved; ${where}`;
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
