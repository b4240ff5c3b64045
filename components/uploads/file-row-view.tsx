import Link from "next/link";
import { Button } from "@/components/ui/button";
import { ProgressBar } from "@/components/ui/progress-bar";
import { Shape, type ShapeName } from "@/components/ui/shapes";
import { routes } from "@/lib/routes";
import type { FileRow, FileRowState } from "./file-row";
import { wordsOf } from "./file-row-words";

export type RowActs = {
  pause(key: string): void;
  carryOn(key: string): void;
  remove(key: string): void;
  /** Opens the choice of a file, for one that was left unfinished. */
  choose(): void;
};

const SHAPES: Partial<Record<FileRowState, { name: ShapeName; look: string }>> = {
  stopped: { name: "offline", look: "text-warn" },
  refused: { name: "triangle", look: "text-bad" },
  taken: { name: "tick", look: "text-met" },
};

const REMOVE_WORDS: Record<FileRowState, string | null> = {
  waiting: "Cancel",
  sending: "Cancel",
  paused: "Cancel",
  stopped: "Cancel",
  checking: null,
  taken: "Put away",
  refused: "Put away",
};

/** One file: its name, how far it is, and what can be done about it. */
export function FileRowView({
  row,
  caseId,
  acts,
}: {
  row: FileRow;
  caseId: string;
  acts: RowActs;
}) {
  const shape = SHAPES[row.state];
  const remove = REMOVE_WORDS[row.state];
  const named = (act: string) => `${act}: ${row.fileName}`;
  return (
    <li className="grid gap-1.5 border-t border-rule px-3.5 py-2.5 first:border-t-0">
      <div className="flex flex-wrap items-start gap-x-3 gap-y-1.5">
        {shape ? <Shape name={shape.name} className={`mt-0.5 shrink-0 ${shape.look}`} /> : null}
        <div className="min-w-0 flex-1 basis-60">
          <p className="text-13 font-medium break-words">{row.fileName}</p>
          <p className="tn text-12 text-ink-2">{wordsOf(row)}</p>
        </div>
        <div className="flex shrink-0 items-center gap-2">
          {row.state === "sending" && (
            <Button small aria-label={named("Pause")} onClick={() => acts.pause(row.key)}>
              Pause
            </Button>
          )}
          {(row.state === "paused" || row.state === "stopped") && (
            <Button
              small
              look="primary"
              aria-label={named(row.needsFile ? "Choose the file" : "Carry on")}
              onClick={() => (row.needsFile ? acts.choose() : acts.carryOn(row.key))}
            >
              {row.needsFile ? "Choose the file" : "Carry on"}
            </Button>
          )}
          {row.state === "taken" && row.imageId && (
            <Link
              className="text-13 text-action underline"
              href={routes.image(caseId, row.imageId)}
            >
              Open {row.imageLabel}
            </Link>
          )}
          {remove && (
            <Button
              small
              look="quiet"
              aria-label={named(remove)}
              onClick={() => acts.remove(row.key)}
            >
              {remove}
            </Button>
          )}
        </div>
      </div>
      {(row.state === "sending" || row.state === "paused") && (
        <ProgressBar label={`Sent of ${row.fileName}`} done={row.sentBytes} of={row.sizeBytes} />
      )}
    </li>
  );
}
