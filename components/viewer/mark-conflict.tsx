import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { Facts } from "@/components/ui/facts";
import { formatTime } from "@/lib/format/dates";
import type { Conflict } from "@/lib/errors";
import { headlineOf, markTitle } from "@/lib/images/mark-names";
import { markContent } from "@/lib/images/mark-schemas";

type Props = {
  conflict: Conflict;
  label: string;
  onKeepMine: () => void;
  onTakeTheirs: () => void;
};

function words(content: unknown): string {
  const read = markContent.safeParse(content);
  if (!read.success) return "Your points";
  const { measurements, note } = read.data;
  return [markTitle(read.data), headlineOf(measurements)?.text, note].filter(Boolean).join(", ");
}

/** Two people changed one mark: both versions, and the choice. */
export function MarkConflict({ conflict, label, onKeepMine, onTakeTheirs }: Props) {
  return (
    <Dialog
      open
      keepOpenOutside
      title={`${label} was changed by ${conflict.changedBy}`}
      description={`At ${formatTime(conflict.changedAt)}, after you opened it. Yours is kept until you choose.`}
      footer={
        <>
          <Button onClick={onTakeTheirs}>Take theirs</Button>
          <Button look="primary" onClick={onKeepMine}>
            Keep mine
          </Button>
        </>
      }
    >
      <Facts
        facts={[
          { name: "Yours", value: words(conflict.yours) },
          { name: conflict.changedBy, value: words(conflict.theirs) },
        ]}
      />
    </Dialog>
  );
}
