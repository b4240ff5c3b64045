import type { UploadStatus } from "@/lib/uploads/schemas";

/**
 * waiting: its turn has not come; stopped: the connection failed or the page was left;
 * refused: by this page, the portal or the check of its content.
 */
export type FileRowState =
  "waiting" | "sending" | "paused" | "stopped" | "checking" | "taken" | "refused";

/** A file on its way in, as the page shows it. */
export type FileRow = {
  key: string;
  /** Null until the portal knows of it. */
  uploadId: string | null;
  fileName: string;
  sizeBytes: number;
  sentBytes: number;
  state: FileRowState;
  /** What was sent stays in the store when it stops. */
  keepsParts: boolean;
  /** The file has to be chosen again, since the page that had it is gone. */
  needsFile: boolean;
  refusal: string | null;
  imageId: string | null;
  imageLabel: string | null;
};

export const newRow = (key: string, file: { name: string; size: number }): FileRow => ({
  key,
  uploadId: null,
  fileName: file.name,
  sizeBytes: file.size,
  sentBytes: 0,
  state: "waiting",
  keepsParts: false,
  needsFile: false,
  refusal: null,
  imageId: null,
  imageLabel: null,
});

const STATES: Record<UploadStatus["state"], FileRowState> = {
  sending: "stopped",
  sent: "checking",
  taken: "taken",
  refused: "refused",
  cancelled: "refused",
};

/** A row for a file that an earlier page began to send. */
export const rowOfStatus = (status: UploadStatus): FileRow => ({
  key: status.uploadId,
  uploadId: status.uploadId,
  fileName: status.fileName,
  sizeBytes: status.sizeBytes,
  sentBytes: status.state === "sending" ? status.sentBytes : status.sizeBytes,
  state: STATES[status.state],
  keepsParts: status.sentBytes > 0,
  needsFile: status.state === "sending",
  refusal: status.refusal,
  imageId: status.imageId,
  imageLabel: status.imageLabel,
});

/** What the portal says of a file, on the row that the page has of it. */
export const withStatus = (row: FileRow, status: UploadStatus): FileRow => ({
  ...rowOfStatus(status),
  key: row.key,
});
