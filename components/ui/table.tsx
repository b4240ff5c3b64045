import type { ComponentProps, ReactNode } from "react";
import Link from "next/link";
import { classNames } from "@/components/ui/class-names";
import { Shape } from "@/components/ui/shapes";

/** A real table. Wide tables scroll inside their own box; the caption is read out, not shown. */
export function Table({
  caption,
  className,
  boxClassName,
  headSticks = false,
  children,
  ...rest
}: ComponentProps<"table"> & {
  caption: string;
  boxClassName?: string;
  /** The head stays under the top bar; the page then scrolls sideways, not the table. */
  headSticks?: boolean;
}) {
  return (
    <div className={classNames(!headSticks && "overflow-x-auto", boxClassName)}>
      <table
        className={classNames("w-full border-separate border-spacing-0 text-13", className)}
        {...rest}
      >
        <caption className="sr-only">{caption}</caption>
        {children}
      </table>
    </div>
  );
}

interface ThProps extends ComponentProps<"th"> {
  /** Numbers stand at the right with tabular figures; their unit goes in the head, once. */
  numeric?: boolean;
}

export function Th({ numeric = false, className, scope = "col", ...rest }: ThProps) {
  return (
    <th
      scope={scope}
      className={classNames(
        "h-8 border-b border-rule-2 bg-surface-2 px-2 text-left text-12 font-strong whitespace-nowrap text-ink-2 first:pl-4 last:pr-4",
        numeric && "num",
        className,
      )}
      {...rest}
    />
  );
}

/** A head that sorts by going to another address. The arrow stands on the sorted column only. */
export function SortTh({
  href,
  sorted,
  children,
  ...rest
}: Omit<ThProps, "children"> & {
  href: string;
  sorted: "ascending" | "descending" | null;
  children: ReactNode;
}) {
  return (
    <Th aria-sort={sorted ?? undefined} {...rest}>
      <Link
        href={href}
        className={classNames(
          "inline-flex min-h-6 items-center gap-0.5 no-underline hover:underline",
          sorted ? "text-ink" : "text-ink-2",
        )}
      >
        {children}
        {sorted ? (
          <Shape
            name="chevron"
            size={12}
            className={sorted === "ascending" ? undefined : "rotate-180"}
          />
        ) : null}
      </Link>
    </Th>
  );
}

export function Td({
  numeric = false,
  className,
  ...rest
}: ComponentProps<"td"> & { numeric?: boolean }) {
  return (
    <td
      className={classNames(
        "h-row border-b border-rule px-2 first:pl-4 last:pr-4",
        numeric && "num whitespace-nowrap",
        className,
      )}
      {...rest}
    />
  );
}

export function Tr({
  chosen = false,
  className,
  ...rest
}: ComponentProps<"tr"> & { chosen?: boolean }) {
  return (
    <tr
      aria-selected={chosen || undefined}
      className={classNames(chosen ? "bg-action-tint" : "bg-surface", className)}
      {...rest}
    />
  );
}

/** Heads a group of rows with its name and count. */
export function GroupRow({
  columns,
  count,
  children,
}: {
  columns: number;
  count?: number;
  children: ReactNode;
}) {
  return (
    <tr className="bg-bench">
      <th
        scope="rowgroup"
        colSpan={columns}
        className="h-7 border-b border-rule-2 px-4 text-left text-12 font-strong text-ink-2"
      >
        {children}
        {count === undefined ? null : <span className="tn ml-1.5 font-normal">{count}</span>}
      </th>
    </tr>
  );
}
