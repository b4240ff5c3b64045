import type { ChangeLine } from "@/lib/audit/describe-change";

const SHOWN_CHARACTERS = 160;
const cut = (text: string) =>
  text.length > SHOWN_CHARACTERS ? `${text.slice(0, SHOWN_CHARACTERS)}…` : text;

type Props = { change: readonly ChangeLine[]; before: unknown; after: unknown };

/** What an entry changed, field by field; the entry as it is kept stands under "As recorded". */
export function HistoryChange({ change, before, after }: Props) {
  if (before === null && after === null) return null;
  return (
    <div className="raw max-w-text text-12 wrap-anywhere text-ink-2">
      {change.map((line) => (
        <p key={line.label}>
          <span className="text-ink-3">{line.label}</span>{" "}
          {line.before !== null && <s>{cut(line.before)}</s>}{" "}
          {line.after !== null && cut(line.after)}
        </p>
      ))}
      <details>
        <summary className="w-fit py-1 text-ink-3">As recorded</summary>
        <pre className="max-h-80 overflow-auto font-mono text-11 whitespace-pre-wrap">
          {JSON.stringify({ before, after }, null, 1)}
        </pre>
      </details>
    </div>
  );
}
