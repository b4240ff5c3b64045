import { bigint, index, int, json, mysqlTable, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { SUBJECT_LABEL_MAX } from "@/lib/audit/constants";
import { asciiText, id, sha256 } from "./columns/id";
import { instant } from "./columns/dates";

/** Append-only; triggers refuse changes. No foreign keys: it must outlive what it tells of. */
export const auditEvents = mysqlTable(
  "audit_events",
  {
    id: bigint("id", { mode: "number" }).autoincrement().primaryKey(),
    /** Case id, or "installation" for what belongs to no case. */
    chain: id("chain").notNull(),
    position: int("position").notNull(),
    at: instant("at").notNull(),
    actorId: id("actor_id"),
    actorName: varchar("actor_name", { length: 200 }).notNull(),
    actorRole: varchar("actor_role", { length: 20 }).notNull(),
    action: asciiText("action", { length: 60 }).notNull(),
    subjectKind: asciiText("subject_kind", { length: 40 }).notNull(),
    subjectId: asciiText("subject_id", { length: 40 }).notNull(),
    subjectLabel: varchar("subject_label", { length: SUBJECT_LABEL_MAX }).notNull(),
    before: json("before").$type<unknown>(),
    after: json("after").$type<unknown>(),
    previousSha256: sha256("previous_sha256").notNull(),
    sha256: sha256("sha256").notNull(),
  },
  (t) => [
    uniqueIndex("audit_by_chain_position").on(t.chain, t.position),
    index("audit_by_actor").on(t.actorId, t.at),
  ],
);

/** Last entry of each chain; locking its row puts writers in line. */
export const auditHeads = mysqlTable("audit_heads", {
  chain: id("chain").primaryKey(),
  position: int("position").notNull(),
  sha256: sha256("sha256").notNull(),
});
