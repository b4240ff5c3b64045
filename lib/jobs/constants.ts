export const JOB_KINDS = ["mail.send", "image.take-in", "upload.tidy", "report.store"] as const;
export type JobKind = (typeof JOB_KINDS)[number];
export const JOB_STATES = ["ready", "running", "done", "dead"] as const;
export type JobState = (typeof JOB_STATES)[number];
