import type { FlaggedPhrase } from "./flagged-phrases";

/** Quiet hints on wording; they block nothing. */
export function FlaggedPanel({ phrases }: { phrases: readonly FlaggedPhrase[] }) {
  if (phrases.length === 0) return null;
  return (
    <section aria-label="Wording" className="border-t border-rule-2 p-4">
      <h2 className="text-13 font-head">Wording</h2>
      <ul className="mt-1 grid gap-1.5 text-13">
        {phrases.map(({ phrase, instead }) => (
          <li key={phrase}>
            “{phrase}”. <span className="text-ink-2">{instead}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}
