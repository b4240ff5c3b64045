import { DASH } from "@/lib/format/marks";

/** Stands where a number or a name is missing. The words say what is missing to those who hear it. */
export function Dash({ words = "none" }: { words?: string }) {
  return (
    <span className="text-ink-3">
      <span aria-hidden="true">{DASH}</span>
      <span className="sr-only">{words}</span>
    </span>
  );
}
