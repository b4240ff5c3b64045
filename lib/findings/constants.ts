/** What a note of the second reader is about. */
export const NOTE_KINDS = ["error", "unsupported", "unclear", "style"] as const;
export type NoteKind = (typeof NOTE_KINDS)[number];
export const NOTE_KIND_NAMES: Record<NoteKind, string> = {
  error: "Error",
  unsupported: "Not supported",
  unclear: "Not clear",
  style: "Wording",
};

export const NOTE_SEVERITIES = ["major", "minor"] as const;
export type NoteSeverity = (typeof NOTE_SEVERITIES)[number];
export const NOTE_SEVERITY_NAMES: Record<NoteSeverity, string> = {
  major: "has to change",
  minor: "advice",
};

/** Open until the author answers it or says that it is done; withdrawn by the reader. */
export const NOTE_STATES = ["open", "answered", "done", "withdrawn"] as const;
export type NoteState = (typeof NOTE_STATES)[number];
export const NOTE_STATE_NAMES: Record<NoteState, string> = {
  open: "Open",
  answered: "Answered",
  done: "Done",
  withdrawn: "Withdrawn",
};

/** What was said to a note after it was left, in order. */
export type NoteReply = {
  act: "answered" | "done" | "reopened" | "withdrawn";
  words: string;
  byId: string;
  by: string;
  /** ISO time. */
  at: string;
};

/** A note of the second reader as it stands beside the text. */
export type ReviewNote = {
  id: string;
  number: number;
  section: string;
  /** Words it is about; empty for the whole section. */
  passage: string;
  /** Picture or traverse of the figure it is about. */
  figureId: string | null;
  kind: NoteKind;
  severity: NoteSeverity;
  words: string;
  state: NoteState;
  by: string;
  /** ISO time. */
  at: string;
  replies: NoteReply[];
};

export const NOTE_WORDS_MAX = 2000;
export const PASSAGE_MAX = 500;

export const noteLabel = (number: number, issueNumber: number) =>
  `note ${number} on issue ${issueNumber}`;
