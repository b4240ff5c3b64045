import { sql } from "drizzle-orm";
import { database } from "@/db/client";

export const FAILURE = "the disk is full";

/** Where a deed can be made to fail, as a disk that is full would. */
const PLACES = {
  /** Before a mail or another job goes into the outbox. */
  outbox: `before insert on jobs for each row signal sqlstate '45000' set message_text = '${FAILURE}'`,
  /** At the very end of a write to a case, when all else of it is written. */
  lastStepOfCase: `before update on cases for each row if new.revision <> old.revision then signal sqlstate '45000' set message_text = '${FAILURE}'; end if`,
  /** When an event is written to the audit log. */
  auditLog: `before insert on audit_events for each row signal sqlstate '45000' set message_text = '${FAILURE}'`,
};

/** Does `work` while the database fails at one place. */
export async function whileFailing<T>(
  place: keyof typeof PLACES,
  work: () => Promise<T>,
): Promise<T> {
  await database().execute(sql.raw(`create or replace trigger test_failure ${PLACES[place]}`));
  try {
    return await work();
  } finally {
    await database().execute(sql.raw("drop trigger if exists test_failure"));
  }
}

/** The words of a failure, the database's own included. */
export const failureOf = (error: unknown): string =>
  error instanceof Error
    ? [error.message, error.cause instanceof Error ? error.cause.message : ""].join(" ")
    : String(error);
