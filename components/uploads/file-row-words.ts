import { formatBytes } from "@/lib/format/numbers";
import { NO_BREAK_SPACE } from "@/lib/format/marks";
import type { FileRow } from "./file-row";

/** Where a file stands: what happened, what was kept, what to do. */
export function wordsOf(row: FileRow): string {
  const { fileName, sentBytes, sizeBytes } = row;
  const kept =
    row.keepsParts && sentBytes > 0
      ? "The part sent so far is kept."
      : "Nothing of it is here yet.";
  const at = sentBytes > 0 ? ` at ${formatBytes(sentBytes)}` : "";
  switch (row.state) {
    case "waiting":
      return `${formatBytes(sizeBytes)}, waiting for its turn`;
    case "sending": {
      const percent = Math.floor((100 * sentBytes) / sizeBytes);
      return `${formatBytes(sentBytes)} of ${formatBytes(sizeBytes)}, ${percent}${NO_BREAK_SPACE}%`;
    }
    case "paused":
      return `Paused${at}. ${kept}`;
    case "stopped":
      return row.needsFile
        ? `${fileName} stopped${at}. ${kept} Choose the same file again to carry on.`
        : `${fileName} stopped${at}. ${kept}`;
    case "checking":
      return "Sent. Being checked";
    case "taken":
      return row.imageLabel ? `Ready as ${row.imageLabel}` : "Added";
    case "refused":
      return row.refusal ?? "It was not taken. Choose it again.";
  }
}

/** What is read out when a file's state changes; progress alone is not. */
export function spokenState(row: FileRow): string {
  switch (row.state) {
    case "waiting":
      return "";
    case "sending":
      return `Sending ${row.fileName}.`;
    case "paused":
    case "checking":
    case "taken":
      return `${row.fileName}: ${wordsOf(row)}.`;
    case "stopped":
    case "refused":
      return wordsOf(row);
  }
}
