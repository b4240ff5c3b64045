import type { ReactNode } from "react";

/** A key as it is printed on the keyboard. */
export function Kbd({ children }: { children: ReactNode }) {
  return (
    <kbd className="rounded-3 border border-b-2 border-rule-2 bg-surface-2 px-1 font-mono text-11 text-ink-2">
      {children}
    </kbd>
  );
}
