"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import { spineGeometry } from "@/components/frame/spine-geometry";
import { SpineDrawing } from "@/components/frame/spine-drawing";
import { classNames } from "@/components/ui/class-names";
import { PART_STATE_NAMES, type PartState } from "@/components/ui/state-shape";

export interface SpineNode {
  key: string;
  label: string;
  /** null where this person has no such page; the node is then left out. */
  href: string | null;
  state: PartState;
  count?: number | null;
  /** Line two: what is needed, how far, the result, or the problem counted. */
  note?: string | null;
}

export interface CaseSpineProps {
  nodes: readonly SpineNode[];
  /** Key of the current part; otherwise the part whose address the page is under. */
  current?: string | null;
  /** Beneath the origin. */
  rootCause?: string;
}

type OpenNode = SpineNode & { href: string };

function isOpen(node: SpineNode): node is OpenNode {
  return node.href !== null;
}

function SpineLink({ node, isCurrent }: { node: OpenNode; isCurrent: boolean }) {
  const needsAttention = node.state === "needs-attention";
  return (
    <Link
      href={node.href}
      aria-current={isCurrent ? "page" : undefined}
      className={classNames(
        "group relative flex h-[3.25rem] flex-col justify-center pr-3 pl-[3.875rem] leading-[1.125rem] text-ink no-underline -outline-offset-2 hover:text-ink max-lg:p-0",
        isCurrent && "bg-action-tint font-strong",
      )}
    >
      <span className="flex flex-col max-lg:pointer-events-none max-lg:absolute max-lg:left-full max-lg:z-30 max-lg:ml-1 max-lg:rounded-3 max-lg:bg-surface max-lg:px-2.5 max-lg:py-1.5 max-lg:opacity-0 max-lg:shadow-lift-2 max-lg:group-hover:opacity-100 max-lg:group-focus-visible:opacity-100">
        <span className="flex justify-between gap-2 whitespace-nowrap">
          {node.label}
          <span className="sr-only">, {PART_STATE_NAMES[node.state]}, </span>
          {node.count === null || node.count === undefined ? null : (
            <span className="tn text-13 font-normal text-ink-2">
              {node.count}
              <span className="sr-only">, </span>
            </span>
          )}
        </span>
        {node.note ? (
          <span
            className={classNames(
              "truncate text-12 font-normal",
              needsAttention ? "text-warn" : isCurrent ? "text-ink-2" : "text-ink-3",
            )}
          >
            {node.note}
          </span>
        ) : null}
      </span>
    </Link>
  );
}

/** Navigation and progress of a case in one. */
export function CaseSpine({
  nodes,
  current,
  rootCause = "Not stated until sign-off",
}: CaseSpineProps) {
  const pathname = usePathname() ?? "";
  const open = nodes.filter(isOpen);
  const geometry = spineGeometry(open.length);
  const currentIndex = open.findIndex(({ key, href }) =>
    current === undefined ? pathname === href || pathname.startsWith(`${href}/`) : key === current,
  );
  return (
    <nav
      aria-label="Parts of the case"
      className="no-print relative w-spine shrink-0 border-r border-rule-2 bg-surface-2 max-lg:w-spine-narrow"
    >
      <div
        className="sticky top-[calc(var(--topbar-h)+var(--casebar-h))]"
        style={{ height: `${geometry.height / 16}rem` }}
      >
        <ul className="pt-2.5">
          {open.map((node, index) => (
            <li key={node.key}>
              <SpineLink node={node} isCurrent={index === currentIndex} />
            </li>
          ))}
        </ul>
        <SpineDrawing
          geometry={geometry}
          states={open.map(({ state }) => state)}
          currentIndex={currentIndex}
        />
        <p
          className="absolute right-3 left-[3.875rem] text-12 text-ink-2 max-lg:sr-only"
          style={{ top: `${(geometry.originY - 17) / 16}rem` }}
        >
          <b className="block font-strong text-ink">Root cause</b>
          {rootCause}
        </p>
      </div>
    </nav>
  );
}
