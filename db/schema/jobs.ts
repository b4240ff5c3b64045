import { index, int, json, mysqlTable, text, varchar } from "drizzle-orm/mysql-core";
import { JOB_KINDS, JOB_STATES } from "@/lib/jobs/constants";
import { asciiText, id } from "./columns/id";
import { instant, madeAt } from "./columns/dates";

/** Durable queue. Written in the transaction of the deed that calls for the job. */
export const jobs = mysqlTable(
  "jobs",
  {
    id: id("id").primaryKey(),
    kind: varchar("kind", { length: 40, enum: JOB_KINDS }).notNull(),
    state: varchar("state", { length: 10, enum: JOB_STATES }).notNull().default("ready"),
    payload: json("payload").$type<unknown>().notNull(),
    /** Same key, same job: asked for twice, done once. */
    uniqueKey: asciiText("unique_key", { length: 120 }).unique(),
    runAt: madeAt("run_at"),
    attempts: int("attempts").notNull().default(0),
    maxAttempts: int("max_attempts").notNull().default(8),
    leaseUntil: instant("lease_until"),
    worker: asciiText("worker", { length: 80 }),
    lastError: text("last_error"),
    madeAt: madeAt(),
    finishedAt: instant("finished_at"),
  },
  (t) => [
    // Equality column first, then the order columns, or SKIP LOCKED locks every ready row.
    index("jobs_ready").on(t.state, t.runAt, t.id),
    index("jobs_leased").on(t.state, t.leaseUntil),
  ],
);
