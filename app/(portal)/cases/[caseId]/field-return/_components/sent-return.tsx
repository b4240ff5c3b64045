import { PageHeader } from "@/components/frame/page-header";
import { Dash } from "@/components/ui/dash";
import { Facts } from "@/components/ui/facts";
import { Notice } from "@/components/ui/notice";
import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import { ANSWER_KIND_NAMES, type Answer } from "@/lib/intake/answers";
import { type Field, SECTIONS } from "@/lib/intake/fields";
import type { FieldReturnPage } from "@/lib/intake/read-field-return";
import { valueText } from "@/lib/intake/show-answer";
import { AddFiles } from "./add-files";
import { AnswerForm } from "./answer-form";
import { EarlierReturns } from "./earlier-returns";
import { FileList } from "./file-list";

function Said({ field, answer }: { field: Field; answer: Answer | undefined }) {
  if (!answer) return <Dash words="not asked" />;
  if (answer.kind === "value")
    return (
      <span className="raw whitespace-pre-line">
        {valueText(field, answer) || <Dash words="nothing" />}
      </span>
    );
  return (
    <span className="raw text-ink-2">
      {ANSWER_KIND_NAMES[answer.kind]}
      {answer.kind === "unknown" && `: ${answer.why}`}
    </span>
  );
}

/** A field return that was sent: as the owner stated it, not verified. */
export function SentReturn({ page }: { page: FieldReturnPage }) {
  const open = page.questions.filter((question) => question.answer === null);
  return (
    <div className="pb-8">
      <PageHeader title="Field return" note={`${page.client}, as stated, not verified`} />
      <div className="grid gap-3.5 px-4">
        {page.mayAnswer &&
          open.map((question) => (
            <AnswerForm key={question.id} caseId={page.caseId} question={question} />
          ))}
        <EarlierReturns earlier={page.earlier} />
        <div className="grid gap-3.5 xl:grid-cols-2">
          {SECTIONS.map((section) => (
            <Panel key={section.key}>
              <PanelHead title={section.title} />
              <PanelBody>
                <Facts
                  facts={section.groups
                    .flatMap((group) => group.fields)
                    .filter((field) => page.answers[field.key])
                    .map((field) => ({
                      name: field.label,
                      value: <Said field={field} answer={page.answers[field.key]} />,
                    }))}
                />
              </PanelBody>
            </Panel>
          ))}
        </div>
        <Panel>
          <PanelHead title="Photographs and papers" note={String(page.files.length)} />
          <PanelBody>
            <FileList files={page.files} />
            <AddFiles caseId={page.caseId} disabledReason={page.mayAddFiles} />
          </PanelBody>
        </Panel>
        {page.questions.length > open.length && (
          <Panel>
            <PanelHead title="Questions answered" />
            <PanelBody>
              {page.questions
                .filter((question) => question.answer !== null)
                .map((question) => (
                  <p key={question.id} className="raw text-13">
                    <span className="text-ink-2">{question.question}</span> {question.answer}
                  </p>
                ))}
            </PanelBody>
          </Panel>
        )}
        <Notice kind="note" title="Keep the parts as they are">
          Do not drill, weld or dress a crack on a returned part, and do not fit the broken faces
          together.
        </Notice>
      </div>
    </div>
  );
}
