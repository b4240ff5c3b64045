/** A handler may run twice for the same job, so each must be safe to repeat. */
export type JobHandler = {
  run(payload: unknown): Promise<void>;
  /** Called once when the last try failed, to tell people. */
  givenUp?(payload: unknown): Promise<void>;
};
