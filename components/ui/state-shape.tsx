export type PartState = "untouched" | "under-way" | "complete" | "needs-attention";

export const PART_STATE_NAMES: Record<PartState, string> = {
  untouched: "Untouched",
  "under-way": "Under way",
  complete: "Complete",
  "needs-attention": "Needs attention",
};

/** The four state shapes on a 14 px square, as SVG content for use inside a larger drawing. */
export function StateDrawing({ state }: { state: PartState }) {
  switch (state) {
    case "untouched":
      return (
        <circle
          cx="7"
          cy="7"
          r="5.3"
          fill="var(--surface)"
          stroke="var(--control)"
          strokeWidth="1.5"
        />
      );
    case "under-way":
      return (
        <>
          <circle
            cx="7"
            cy="7"
            r="5.3"
            fill="var(--surface)"
            stroke="var(--action)"
            strokeWidth="1.5"
          />
          <path d="M7 1.7a5.3 5.3 0 0 0 0 10.6z" fill="var(--action)" />
        </>
      );
    case "complete":
      return (
        <>
          <circle cx="7" cy="7" r="6" fill="var(--action)" />
          <path
            d="m4.2 7.2 2 2 3.7-4.2"
            fill="none"
            stroke="var(--on-action)"
            strokeWidth="1.6"
            strokeLinecap="round"
            strokeLinejoin="round"
          />
        </>
      );
    case "needs-attention":
      return (
        <>
          <path
            d="M7 .9 13.3 12.6H.7z"
            fill="var(--warn-tint)"
            stroke="var(--warn-mark)"
            strokeWidth="1.4"
            strokeLinejoin="round"
          />
          <path d="M7 5v3.4M7 10v.6" stroke="var(--warn)" strokeWidth="1.5" strokeLinecap="round" />
        </>
      );
  }
}

/** Shape of a part's state. Give the word beside it, or set named to have it read out. */
export function StateShape({ state, named = false }: { state: PartState; named?: boolean }) {
  return (
    <svg
      width="14"
      height="14"
      viewBox="0 0 14 14"
      className="shrink-0"
      {...(named
        ? { role: "img", "aria-label": PART_STATE_NAMES[state] }
        : { "aria-hidden": true })}
    >
      <StateDrawing state={state} />
    </svg>
  );
}
