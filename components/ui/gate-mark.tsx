/** A gate: green square with a tick when met, dashed square while open. The word is read out. */
export function GateMark({ met }: { met: boolean }) {
  return (
    <svg
      width="14"
      height="14"
      viewBox="0 0 14 14"
      className="shrink-0"
      role="img"
      aria-label={met ? "Met" : "Open"}
    >
      <rect
        x=".8"
        y=".8"
        width="12.4"
        height="12.4"
        rx="1.5"
        fill={met ? "var(--met-tint)" : "var(--surface)"}
        stroke={met ? "var(--met-mark)" : "var(--control)"}
        strokeWidth="1.3"
        strokeDasharray={met ? undefined : "2.6 1.8"}
      />
      {met ? (
        <path
          d="m3.8 7.2 2.2 2.2 4.2-4.8"
          fill="none"
          stroke="var(--met)"
          strokeWidth="1.7"
          strokeLinecap="round"
          strokeLinejoin="round"
        />
      ) : null}
    </svg>
  );
}
