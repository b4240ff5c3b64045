import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Table, Td, Th, Tr } from "@/components/ui/table";
import { formatDateTime } from "@/lib/format/dates";
import type { TraverseContent, TypedReading } from "@/lib/traverses/schemas";
import type { TheirVersion } from "./use-autosave";

const ROWS_SHOWN = 12;

const rowText = (row: TypedReading | undefined) =>
  row
    ? [row.depth, row.d1, row.d2, row.hardness, row.leftOutReason && "left out"]
        .filter(Boolean)
        .join("  ")
    : "–";

/** Both versions of a traverse side by side; nothing is lost until the person has chosen. */
export function ConflictNotice({
  message,
  mine,
  theirs,
  onKeepMine,
  onTakeTheirs,
}: {
  message: string;
  mine: TraverseContent;
  theirs: TheirVersion;
  onKeepMine: () => void;
  onTakeTheirs: () => void;
}) {
  const length = Math.max(mine.readings.length, theirs.content.readings.length);
  const rows = Array.from({ length }, (_, index) => ({
    number: index + 1,
    mine: rowText(mine.readings[index]),
    theirs: rowText(theirs.content.readings[index]),
  })).filter((row) => row.mine !== row.theirs);
  return (
    <div className="mx-4 mb-3">
      <Notice
        kind="conflict"
        title={message}
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
        {rows.length === 0 ? (
          <p>The rows are the same; the settings differ.</p>
        ) : (
          <Table caption="Rows that differ" boxClassName="mt-2 bg-surface">
            <thead>
              <tr>
                <Th numeric>Row</Th>
                <Th>Yours</Th>
                <Th>
                  {theirs.by}, {formatDateTime(theirs.at)}
                </Th>
              </tr>
            </thead>
            <tbody>
              {rows.slice(0, ROWS_SHOWN).map((row) => (
                <Tr key={row.number}>
                  <Td numeric>{row.number}</Td>
                  <Td className="whitespace-pre">{row.mine}</Td>
                  <Td className="whitespace-pre">{row.theirs}</Td>
                </Tr>
              ))}
            </tbody>
          </Table>
        )}
        {rows.length > ROWS_SHOWN ? <p>And {rows.length - ROWS_SHOWN} more rows.</p> : null}
      </Notice>
    </div>
  );
}
