import Link from "next/link";
import type { ReactNode } from "react";

/** Working screens need room. Under 700 px the page gives its title and the way on instead. */
export function SmallScreenGuard({
  title,
  statusHref,
  children,
}: {
  title: string;
  /** Where the status can be read on a phone. */
  statusHref: string;
  children: ReactNode;
}) {
  return (
    <>
      <div className="p-4 sm:hidden">
        <p className="text-16 font-head">{title}</p>
        <p className="mt-1 mb-3 text-ink-2">Open this on a larger screen.</p>
        <Link href={statusHref}>See the status</Link>
      </div>
      <div className="contents max-sm:hidden">{children}</div>
    </>
  );
}
