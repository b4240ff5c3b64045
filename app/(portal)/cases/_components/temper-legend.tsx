import { STAGES } from "@/lib/cases/constants";

/** What the colours of the temper strips stand for, in their order. */
export function TemperLegend() {
  return (
    <footer className="flex min-h-9 flex-wrap items-center justify-end gap-x-4 border-t border-rule-2 bg-surface-2 px-4 text-12 text-ink-2">
      {STAGES.map((name, i) => (
        <span key={name} className="inline-flex items-center gap-1.5">
          <i
            className="size-2 border forced-color-adjust-none"
            style={{
              background: `var(--temper-${i + 1})`,
              borderColor: `var(--temper-${i + 1}-edge)`,
            }}
          />
          {name}
        </span>
      ))}
    </footer>
  );
}
