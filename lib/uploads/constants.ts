/** Files above this go in parts; S3 asks for parts of at least 5 MiB. */
export const PART_THRESHOLD_BYTES = 16 * 1024 * 1024;
export const PART_SIZE_BYTES = 8 * 1024 * 1024;
export const PRESIGNED_VALID_SECONDS = 15 * 60;
/** Addresses handed out at once; they live for minutes only. */
export const PART_BATCH = 10;
/** An upload that nobody went on with for so long is given up. */
export const UNFINISHED_KEPT_DAYS = 7;

export const UPLOAD_PURPOSES = ["image", "request_file"] as const;
export type UploadPurpose = (typeof UPLOAD_PURPOSES)[number];
export const UPLOAD_STATES = ["sending", "sent", "taken", "refused", "cancelled"] as const;
export type UploadState = (typeof UPLOAD_STATES)[number];

export const REQUEST_FILE_MEDIA_TYPES = [
  "image/jpeg",
  "image/png",
  "image/tiff",
  "application/pdf",
] as const;
export const REQUEST_FILE_MAX_BYTES = 100 * 1024 * 1024;
