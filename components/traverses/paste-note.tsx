import { Shape } from "@/components/ui/shapes";

export type Paste = { kind: "read" | "refused"; text: string };

/** What a paste brought, with the way back, or why it was refused. */
export function PasteNote({ paste, onAct }: { paste: Paste; onAct: () => void }) {
  const isRead = paste.kind === "read";
  return (
    <p
      role="status"
      className={`no-print flex min-h-9 items-center gap-2 border-b border-rule-2 px-3 py-1.5 text-13 ${isRead ? "bg-met-tint" : "bg-bad-tint"}`}
    >
      <Shape name={isRead ? "tick" : "triangle"} className={isRead ? "text-met" : "text-bad"} />
      <span className="flex-1">{paste.text}</span>
      <button
        type="button"
        className="text-action underline underline-offset-[3px]"
        onClick={onAct}
      >
        {isRead ? "Undo" : "Close"}
      </button>
    </p>
  );
}
