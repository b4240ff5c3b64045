import type { ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";
import { Shape, type ShapeName } from "@/components/ui/shapes";

export type TagKind = "plain" | "met" | "warn" | "bad" | "note";

const KINDS: Record<TagKind, { look: string; shape?: ShapeName }> = {
  plain: { look: "border-rule-2 bg-surface-2 text-ink-2" },
  met: { look: "border-transparent bg-met-tint text-met", shape: "tick" },
  warn: { look: "border-transparent bg-warn-tint text-warn", shape: "triangle" },
  bad: { look: "border-transparent bg-bad-tint text-bad", shape: "triangle" },
  note: { look: "border-transparent bg-note-tint text-note" },
};

/** One or two words with their shape: "Met", "Too close". Not a button and not a filter. */
export function Tag({
  kind = "plain",
  children,
  className,
}: {
  kind?: TagKind;
  children: ReactNode;
  className?: string;
}) {
  const { look, shape } = KINDS[kind];
  return (
    <span
      className={classNames(
        "inline-flex min-h-5 items-center gap-1.5 rounded-2 border px-1.5 text-12 whitespace-nowrap",
        look,
        className,
      )}
    >
      {shape ? <Shape name={shape} size={13} /> : null}
      {children}
    </span>
  );
}
