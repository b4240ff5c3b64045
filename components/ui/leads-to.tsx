/** A line that ends in a dot means "leads to": from holder to holder, from old value to new. */
export function LeadsTo({ words = "to", length = 18 }: { words?: string; length?: number }) {
  return (
    <span className="inline-flex items-center">
      <svg width={length} height="8" viewBox={`0 0 ${length} 8`} aria-hidden="true">
        <path d={`M0 4h${length - 5}`} stroke="currentColor" strokeWidth="1.2" />
        <circle cx={length - 3.5} cy="4" r="2.6" fill="currentColor" />
      </svg>
      <span className="sr-only">{words}</span>
    </span>
  );
}
