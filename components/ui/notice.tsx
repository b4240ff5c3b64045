import type { ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";
import { Shape, type ShapeName } from "@/components/ui/shapes";

export type NoticeKind = "note" | "warn" | "bad" | "met" | "readonly" | "offline" | "conflict";

const KINDS: Record<NoticeKind, { shape: ShapeName; edge: string; mark: string }> = {
  note: { shape: "note", edge: "border-l-action bg-note-tint", mark: "text-action" },
  readonly: { shape: "lock", edge: "border-l-action bg-note-tint", mark: "text-action" },
  warn: { shape: "triangle", edge: "border-l-warn-mark bg-warn-tint", mark: "text-warn" },
  offline: { shape: "offline", edge: "border-l-warn-mark bg-warn-tint", mark: "text-warn" },
  bad: { shape: "triangle", edge: "border-l-bad-mark bg-bad-tint", mark: "text-bad" },
  conflict: { shape: "conflict", edge: "border-l-bad-mark bg-bad-tint", mark: "text-bad" },
  met: { shape: "tick", edge: "border-l-met-mark bg-met-tint", mark: "text-met" },
};

export interface NoticeProps {
  kind: NoticeKind;
  /** What happened, as a short sentence with its full stop. */
  title?: ReactNode;
  /** What was kept and what to do. */
  children?: ReactNode;
  actions?: ReactNode;
  /** Set where the notice appears while the page is open: lost work is assertive, the rest polite. */
  live?: "polite" | "assertive";
  className?: string;
}

export function Notice({ kind, title, children, actions, live, className }: NoticeProps) {
  const { shape, edge, mark } = KINDS[kind];
  return (
    <div
      role={live === "assertive" ? "alert" : live === "polite" ? "status" : undefined}
      className={classNames(
        "flex items-start gap-2.5 rounded-3 border border-l-[3px] border-rule-2 px-3 py-2 text-13 leading-[1.125rem] text-ink",
        edge,
        className,
      )}
    >
      <Shape name={shape} className={classNames("mt-px shrink-0", mark)} />
      <div className="min-w-0 flex-1">
        {title ? <b className="font-strong">{title} </b> : null}
        {children}
      </div>
      {actions ? <div className="flex shrink-0 items-center gap-2">{actions}</div> : null}
    </div>
  );
}
