/** A line, a bar, and a point beyond it: the value lies outside the table. */
export function EndOfTableMark({ named = false }: { named?: boolean }) {
  return (
    <svg
      width="14"
      height="14"
      viewBox="0 0 14 14"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.4"
      className="inline-block shrink-0 text-ink-3"
      {...(named ? { role: "img", "aria-label": "outside the table" } : { "aria-hidden": true })}
    >
      <path d="M0 7h6M7 2.5v9" />
      <circle cx="11.2" cy="7" r="1.9" />
    </svg>
  );
}
