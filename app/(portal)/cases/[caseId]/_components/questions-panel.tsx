import Link from "next/link";
import { Panel, PanelHead } from "@/components/ui/panel";
import { StateShape } from "@/components/ui/state-shape";
import type { CaseOverview } from "@/lib/cases/case-overview";
import { formatDay } from "@/lib/format/dates";
import { routes } from "@/lib/routes";

/** Questions to the requester, open ones first. */
export function QuestionsPanel({ overview }: { overview: CaseOverview }) {
  if (overview.questions.length === 0) return null;
  const open = overview.questions.filter((question) => question.answer === null);
  const answered = overview.questions.filter((question) => question.answer !== null);
  return (
    <Panel>
      <PanelHead title="Questions" note={`${open.length} open`} />
      <ul>
        {[...open, ...answered].map((question) => (
          <li
            key={question.id}
            className="flex items-start gap-2.5 border-b border-rule px-3.5 py-2 text-13 last:border-0"
          >
            <StateShape state={question.answer === null ? "needs-attention" : "complete"} />
            <span className="raw min-w-0 flex-1">
              {question.question}{" "}
              <span className="text-ink-3">
                {question.askedBy}, {formatDay(question.askedAt)}
                {question.answer === null ? ", no answer yet" : ""}
              </span>
              {question.answer !== null && (
                <span className="block text-ink-2">{question.answer}</span>
              )}
            </span>
            {question.answer === null && (
              <Link href={routes.fieldReturn(overview.id)}>Answer it</Link>
            )}
          </li>
        ))}
      </ul>
    </Panel>
  );
}
