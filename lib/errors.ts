/** Closed list of the ways a request can fail; every adapter maps these and nothing else. */
export const ERROR_CODES = [
  "NOT_SIGNED_IN",
  "NOT_FOUND",
  "NOT_ALLOWED",
  "INVALID",
  "CONFLICT",
  "LOCKED",
  "OUT_OF_RANGE",
  "TOO_LARGE",
  "TOO_MANY",
  "UNKNOWN_NAME",
  "UNEXPECTED",
] as const;
export type ErrorCode = (typeof ERROR_CODES)[number];

export const ERROR_STATUS: Record<ErrorCode, number> = {
  NOT_SIGNED_IN: 401,
  NOT_FOUND: 404,
  NOT_ALLOWED: 403,
  INVALID: 400,
  CONFLICT: 409,
  LOCKED: 423,
  OUT_OF_RANGE: 422,
  TOO_LARGE: 413,
  TOO_MANY: 429,
  UNKNOWN_NAME: 422,
  UNEXPECTED: 500,
};

export const ERROR_SENTENCE: Record<ErrorCode, string> = {
  NOT_SIGNED_IN: "You are signed out. Sign in again; drafts are kept.",
  NOT_FOUND: "This is not here, or it is not yours to see.",
  NOT_ALLOWED: "Your role does not do this.",
  INVALID: "Some answers need correcting. Everything else is kept.",
  CONFLICT: "Someone else changed this in the meantime. Yours is kept; compare the two.",
  LOCKED: "This is locked and cannot be changed.",
  OUT_OF_RANGE: "The value is outside the published range. No number is given.",
  TOO_LARGE: "This is more than can be taken at once.",
  TOO_MANY: "Too many tries. Wait a little and try again.",
  UNKNOWN_NAME: "A name in the request is not known here.",
  UNEXPECTED:
    "Riverline failed at this. Nothing was changed. Try again, and quote the number if it stays.",
};

/** Messages by field path, as a form shows them. */
export type FieldErrors = Record<string, string>;

/** What the other person wrote, beside what this one saw, for a conflict screen. */
export type Conflict = {
  yours: unknown;
  theirs: unknown;
  changedBy: string;
  changedAt: string;
};

export class AppError extends Error {
  readonly code: ErrorCode;
  readonly fields: FieldErrors | undefined;
  readonly conflict: Conflict | undefined;

  constructor(
    code: ErrorCode,
    message: string = ERROR_SENTENCE[code],
    extra: { fields?: FieldErrors; conflict?: Conflict; cause?: unknown } = {},
  ) {
    super(message, extra.cause === undefined ? undefined : { cause: extra.cause });
    this.name = "AppError";
    this.code = code;
    this.fields = extra.fields;
    this.conflict = extra.conflict;
  }
}

export function notFound(): AppError {
  return new AppError("NOT_FOUND");
}
