import type { DraftConflict } from "@/components/forms/use-draft-saving";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Table, Td, Th, Tr } from "@/components/ui/table";
import { formatTime } from "@/lib/format/dates";
import { ANSWER_KIND_NAMES, type Answer, type Answers } from "@/lib/intake/answers";
import { type Field, FIELDS } from "@/lib/intake/fields";
import { valueText } from "@/lib/intake/show-answer";

type Props = {
  conflict: DraftConflict<{ answers: Answers }>;
  onKeepMine: () => void;
  onTakeTheirs: () => void;
};

const said = (field: Field, answer: Answer | undefined) =>
  !answer
    ? "–"
    : answer.kind === "value"
      ? valueText(field, answer) || "–"
      : answer.kind === "unknown"
        ? `Not known: ${answer.why}`
        : ANSWER_KIND_NAMES[answer.kind];

/** Two people saved: the answers that differ, side by side, and the choice. */
export function ConflictNotice({ conflict, onKeepMine, onTakeTheirs }: Props) {
  const { yours, theirs } = conflict;
  const differing = FIELDS.filter(
    (field) =>
      JSON.stringify(yours.answers[field.key]) !== JSON.stringify(theirs.answers[field.key]),
  );
  return (
    <div className="grid gap-2">
      <Notice
        kind="conflict"
        title="The field return was not saved."
        live="assertive"
        actions={
          <>
            <Button small onClick={onTakeTheirs}>
              Take theirs
            </Button>
            <Button small look="primary" onClick={onKeepMine}>
              Keep mine
            </Button>
          </>
        }
      >
        {conflict.changedBy} saved at {formatTime(conflict.changedAt)}, after you opened it. Yours
        is kept here.
      </Notice>
      <Table caption="Answers that differ">
        <thead>
          <tr>
            <Th>Question</Th>
            <Th>Yours</Th>
            <Th>{conflict.changedBy}</Th>
          </tr>
        </thead>
        <tbody>
          {differing.map((field) => (
            <Tr key={field.key}>
              <Td>{field.label}</Td>
              <Td className="raw">{said(field, yours.answers[field.key])}</Td>
              <Td className="raw">{said(field, theirs.answers[field.key])}</Td>
            </Tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}
