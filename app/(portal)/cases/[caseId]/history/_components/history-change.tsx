const SHOWN_CHARACTERS = 160;

/** What an entry changed, field by field; long values are cut, the whole is under "All of it". */
export function HistoryChange({ before, after }: { before: unknown; after: unknown }) {
  if (before === null && after === null) return null;
  const words = (value: unknown) =>
    (typeof value === "string" ? value : JSON.stringify(value)) ?? "";
  const cut = (text: string) =>
    text.length > SHOWN_CHARACTERS ? `${text.slice(0, SHOWN_CHARACTERS)}…` : text;
  const fields = changedFields(before, after);
  const isCut = fields.some(
    (field) =>
      words(field.before).length > SHOWN_CHARACTERS || words(field.after).length > SHOWN_CHARACTERS,
  );
  return (
    <div className="raw max-w-prose text-12 break-words text-ink-2">
      {fields.map((field) => (
        <p key={field.name}>
          <span className="text-ink-3">{field.name}</span>{" "}
          {field.before === undefined || field.before === null ? null : (
            <s>{cut(words(field.before))}</s>
          )}{" "}
          {field.after === undefined || field.after === null ? null : cut(words(field.after))}
        </p>
      ))}
      {isCut && (
        <details>
          <summary>All of it</summary>
          <pre className="max-h-80 overflow-auto font-mono text-11 whitespace-pre-wrap">
            {JSON.stringify({ before, after }, null, 1)}
          </pre>
        </details>
      )}
    </div>
  );
}

function changedFields(
  before: unknown,
  after: unknown,
): { name: string; before: unknown; after: unknown }[] {
  const left = asFields(before);
  const right = asFields(after);
  return [...new Set([...Object.keys(left), ...Object.keys(right)])]
    .filter((name) => JSON.stringify(left[name] ?? null) !== JSON.stringify(right[name] ?? null))
    .map((name) => ({ name, before: left[name], after: right[name] }));
}

function asFields(value: unknown): Record<string, unknown> {
  if (value === null || value === undefined) return {};
  return typeof value === "object" && !Array.isArray(value) ? { ...value } : { value };
}
