import { FieldRow } from "@/components/intake/field-row";
import { WorkedOut } from "@/components/ui/worked-out";
import type { Answer, Answers } from "@/lib/intake/answers";
import type { Problems } from "@/lib/intake/check-answers";
import type { FieldKey, SECTIONS } from "@/lib/intake/fields";
import { limitHardness } from "@/lib/intake/limit-hardness";

type Props = {
  section: (typeof SECTIONS)[number];
  number: number;
  answers: Answers;
  problems: Problems;
  onAnswer: (key: FieldKey, answer: Answer) => void;
  onLeave: (key: FieldKey) => void;
  children?: React.ReactNode;
};

/** One section of the field return with its questions. */
export function FormSection(props: Props) {
  const { section, answers, problems, onAnswer, onLeave } = props;
  const limit = section.key === "material" ? limitHardness(answers) : null;
  return (
    <section
      id={`section-${section.key}`}
      tabIndex={-1}
      aria-labelledby={`head-${section.key}`}
      className="scroll-mt-28 rounded-4 border border-rule-2 bg-surface"
    >
      <header className="flex min-h-10 flex-wrap items-center gap-2.5 border-b border-rule px-4.5 py-2">
        <span className="font-mono text-12 text-ink-3">{props.number}</span>
        <h2 id={`head-${section.key}`} className="text-14 font-head">
          {section.title}
        </h2>
        <span className="ml-auto text-13 text-ink-3">{section.note}</span>
      </header>
      <div className="grid gap-4 p-4.5">
        {section.groups.map((group, g) => (
          <div key={group.title ?? g} className="grid gap-x-5 gap-y-4 lg:grid-cols-12">
            {group.title && <h3 className="text-13 font-head lg:col-span-12">{group.title}</h3>}
            {group.fields.map((field) => (
              <FieldRow
                key={field.key}
                field={field}
                answer={answers[field.key]}
                problem={problems[field.key] ?? null}
                onAnswer={onAnswer}
                onLeave={onLeave}
              />
            ))}
            {g === 0 && limit && (
              <div className="lg:col-span-4">
                <WorkedOut
                  label="Limit hardness"
                  value={limit.limitHv === null ? null : String(limit.limitHv)}
                  unit={limit.scale}
                  rule={limit.rule}
                />
              </div>
            )}
          </div>
        ))}
        {props.children}
      </div>
    </section>
  );
}
