import "server-only";

/** Chain of events that belong to no case. */
export const INSTALLATION_CHAIN = "installation";
export const START_OF_CHAIN = "0".repeat(64);

/** What the digest of an event covers: all of it, and the digest of the one before. */
export type ChainedEvent = {
  chain: string;
  position: number;
  at: Date;
  actorId: string | null;
  actorName: string;
  actorRole: string;
  action: string;
  subjectKind: string;
  subjectId: string;
  subjectLabel: string;
  before: unknown;
  after: unknown;
  previousSha256: string;
};
