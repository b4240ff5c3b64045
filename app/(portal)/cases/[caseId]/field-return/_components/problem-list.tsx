import { Notice } from "@/components/ui/notice";
import type { Problems } from "@/lib/intake/check-answers";
import type { Field } from "@/lib/intake/fields";

/** What keeps the field return from being sent, each with the way to it. */
export function ProblemList({
  problems,
  fields,
}: {
  problems: Problems;
  fields: readonly Field[];
}) {
  const listed = fields.filter((field) => problems[field.key]);
  if (listed.length === 0) return null;
  return (
    <Notice
      kind="bad"
      title={
        listed.length === 1
          ? "One answer needs correcting"
          : `${listed.length} answers need correcting`
      }
      live="polite"
    >
      <span>Everything else is kept.</span>
      <ul className="mt-1 grid max-h-60 gap-0.5 overflow-y-auto">
        {listed.map((field) => (
          <li key={field.key}>
            <a
              className="block min-h-6 py-0.5"
              href={`#${field.key}`}
              onClick={(event) => {
                event.preventDefault();
                const element = document.getElementById(field.key);
                element?.scrollIntoView({ block: "center" });
                element?.focus();
              }}
            >
              {field.label}
            </a>
          </li>
        ))}
      </ul>
    </Notice>
  );
}
