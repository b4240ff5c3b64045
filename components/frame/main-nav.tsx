"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import { classNames } from "@/components/ui/class-names";

export interface MainNavItem {
  href: string;
  label: string;
  /** Where the address alone does not tell; otherwise the item whose address the page is under. */
  current?: boolean;
}

// The line that ends in a dot: "leads to".
const CURRENT =
  "font-strong text-ink before:absolute before:right-[15px] before:bottom-1.5 before:left-3 before:h-[1.5px] before:bg-action after:absolute after:right-[11px] after:bottom-1 after:size-[5.5px] after:rounded-full after:bg-action";

export function MainNav({ items }: { items: readonly MainNavItem[] }) {
  const pathname = usePathname() ?? "";
  return (
    <nav aria-label="Main" className="flex gap-1">
      {items.map(({ href, label, current }) => {
        const isCurrent = current ?? (pathname === href || pathname.startsWith(`${href}/`));
        return (
          <Link
            key={href}
            href={href}
            aria-current={isCurrent ? "page" : undefined}
            className={classNames(
              "relative flex items-center px-3 whitespace-nowrap no-underline",
              isCurrent ? CURRENT : "text-ink-2 hover:text-ink",
            )}
          >
            {label}
          </Link>
        );
      })}
    </nav>
  );
}
