import { initials } from "@/lib/format/initials";
import { classNames } from "@/components/ui/class-names";

/** Initials in a square; the name stands beside it or is read out. */
export function Avatar({ name, named = false }: { name: string; named?: boolean }) {
  return (
    <span
      className="inline-grid size-6 shrink-0 place-items-center rounded-3 border border-control bg-surface-2 text-[0.65625rem] font-head tracking-[0.02em] text-ink-2"
      {...(named ? { role: "img", "aria-label": name } : { "aria-hidden": true })}
    >
      {initials(name)}
    </span>
  );
}

/** A person's name, or in quiet words that nobody is there yet. */
export function PersonName({
  name,
  roleName,
  avatar = false,
  missing = "Unassigned",
  strong = false,
}: {
  name: string | null | undefined;
  roleName?: string;
  avatar?: boolean;
  missing?: string;
  strong?: boolean;
}) {
  if (!name) return <span className="text-ink-3">{missing}</span>;
  return (
    <span className="inline-flex items-center gap-2 whitespace-nowrap">
      {avatar ? <Avatar name={name} /> : null}
      <span className={classNames(strong && "font-strong")}>{name}</span>
      {roleName ? <span className="text-ink-3">{roleName}</span> : null}
    </span>
  );
}
