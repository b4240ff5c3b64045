import Link from "next/link";
import { classNames } from "@/components/ui/class-names";
import { Shape } from "@/components/ui/shapes";
import { StateShape } from "@/components/ui/state-shape";

export type TraverseTab = {
  href: string;
  label: string;
  name: string;
  state: "complete" | "needs-attention" | "under-way";
  isVoid: boolean;
  current: boolean;
};

const TAB =
  "inline-flex h-8 items-center gap-1.5 rounded-3 px-2.5 font-strong no-underline whitespace-nowrap";

/** The traverses of a case side by side, each with the shape of its state. */
export function TraverseTabs({
  tabs,
  newHref,
}: {
  tabs: readonly TraverseTab[];
  /** Null where none can be started. */
  newHref: string | null;
}) {
  return (
    <nav aria-label="Traverses" className="flex min-w-0 flex-wrap items-center gap-0.5">
      {tabs.map(({ href, label, name, state, isVoid, current }) => (
        <Link
          key={href}
          href={href}
          aria-current={current ? "page" : undefined}
          className={classNames(
            TAB,
            current
              ? "border border-control bg-surface text-ink"
              : "border border-transparent text-ink-2 hover:text-ink",
          )}
        >
          {isVoid ? <Shape name="cross" size={14} /> : <StateShape state={state} named />}
          <span className={isVoid ? "line-through" : undefined}>{label}</span>
          <span className="max-w-40 truncate font-normal text-ink-3">{name}</span>
          {isVoid ? <span className="sr-only">withdrawn</span> : null}
        </Link>
      ))}
      {newHref === null ? null : (
        <Link href={newHref} className={classNames(TAB, "text-action hover:text-action-2")}>
          <Shape name="plus" size={14} />
          New traverse
        </Link>
      )}
    </nav>
  );
}
