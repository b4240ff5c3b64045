/** The mark: strands running together to one point. */
export function RiverMark({ size = 26, plain = false }: { size?: number; plain?: boolean }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 28 28"
      fill="none"
      aria-hidden="true"
      className="shrink-0"
    >
      <g stroke="currentColor" strokeWidth="1.35" strokeLinecap="round">
        <path d="M2 3.5C9 3.5 12.5 9.2 16.2 12.2" />
        <path d="M2 8.7c5.2 0 8.6 2.4 14.2 3.5" />
        <path d="M2 14h19" />
        <path d="M2 19.3c6 0 8.8-3 13-5.3" />
        <path d="M2 24.5c7 0 9.6-4.6 13-8.2 1-1 1.8-1.7 3-2.3" />
        <path d="M16.2 12.2C18 13.3 19 14 21 14" />
      </g>
      <circle cx="22.6" cy="14" r="3.7" fill={plain ? "currentColor" : "var(--action)"} />
    </svg>
  );
}
