import type { ReactNode } from "react";

/** Title of a page, its one quiet line, and its acts; the act the page is for stands last. */
export function PageHeader({
  title,
  note,
  actions,
}: {
  title: ReactNode;
  note?: ReactNode;
  actions?: ReactNode;
}) {
  return (
    <div className="flex flex-wrap items-center gap-x-3 gap-y-2 px-4 pt-3.5 pb-2.5">
      <h1 className="text-19 font-head tracking-[-0.012em]">{title}</h1>
      {note ? <span className="text-ink-3">{note}</span> : null}
      {actions ? <div className="ml-auto flex items-center gap-2">{actions}</div> : null}
    </div>
  );
}
