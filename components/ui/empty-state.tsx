import type { ReactNode } from "react";

/** Nothing here yet: what the thing is, and the one way to start. */
export function EmptyState({
  title,
  children,
  action,
}: {
  title: string;
  children?: ReactNode;
  action?: ReactNode;
}) {
  return (
    <div className="px-6 py-5.5 text-center">
      <svg
        width="120"
        height="52"
        viewBox="0 0 120 52"
        fill="none"
        aria-hidden="true"
        className="mx-auto mb-1.5"
      >
        <path
          d="M2 4C40 4 60 20 84 25M2 15c36 0 54 8 82 10M2 26h90M2 37c36 0 54-8 82-10M2 48C40 48 60 32 84 27"
          stroke="var(--ink)"
          strokeOpacity=".3"
          strokeWidth="1.3"
        />
        <circle
          cx="98"
          cy="26"
          r="8"
          fill="var(--surface)"
          stroke="var(--control)"
          strokeDasharray="3 2"
        />
      </svg>
      <b className="font-strong">{title}</b>
      {children ? (
        <p className="mx-auto mt-1 mb-3 max-w-[26rem] text-13 text-ink-2">{children}</p>
      ) : null}
      {action}
    </div>
  );
}
