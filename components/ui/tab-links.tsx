import Link from "next/link";
import type { ReactNode } from "react";
import { TAB_ROW, tabClasses } from "@/components/ui/tab-look";

export interface TabLink {
  href: string;
  label: string;
  count?: number;
  current: boolean;
}

/** Views of one list, each with an address of its own. */
export function TabLinks({
  label,
  items,
  children,
}: {
  label: string;
  items: readonly TabLink[];
  /** After the tabs: "Save this view". */
  children?: ReactNode;
}) {
  return (
    <nav aria-label={label} className={TAB_ROW}>
      {items.map(({ href, label: words, count, current }) => (
        <Link
          key={href}
          href={href}
          aria-current={current ? "page" : undefined}
          className={tabClasses(current)}
        >
          {words}
          {count === undefined ? null : (
            <span className="tn text-13 font-normal text-ink-3">{count}</span>
          )}
        </Link>
      ))}
      {children}
    </nav>
  );
}
