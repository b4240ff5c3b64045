import { index, int, json, mysqlTable, text, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { CUSTODY_ACTS, ITEM_KINDS } from "@/lib/evidence/constants";
import { id, sha256 } from "./columns/id";
import { instant, madeAt } from "./columns/dates";
import { cases } from "./cases";
import { people } from "./people";
import { records } from "./records";

/** A piece of evidence, keyed by its record; description and condition are in the versions. */
export const items = mysqlTable(
  "items",
  {
    recordId: id("record_id")
      .primaryKey()
      .references(() => records.id),
    caseId: id("case_id")
      .notNull()
      .references(() => cases.id),
    kind: varchar("kind", { length: 20, enum: ITEM_KINDS }).notNull(),
    parentId: id("parent_id").references(() => records.id),
  },
  (t) => [index("items_by_case").on(t.caseId), index("items_by_parent").on(t.parentId)],
);

/** Chain of custody, append-only. The place an entry starts from is where the last one ended. */
export const custodyEntries = mysqlTable(
  "custody_entries",
  {
    id: id("id").primaryKey(),
    caseId: id("case_id")
      .notNull()
      .references(() => cases.id),
    itemId: id("item_id")
      .notNull()
      .references(() => records.id),
    position: int("position").notNull(),
    act: varchar("act", { length: 20, enum: CUSTODY_ACTS }).notNull(),
    at: instant("at").notNull(),
    fromPlace: varchar("from_place", { length: 200 }).notNull(),
    toPlace: varchar("to_place", { length: 200 }).notNull(),
    /** Who holds it after this entry; null when it has left the laboratory. */
    holderId: id("holder_id").references(() => people.id),
    reason: text("reason").notNull(),
    /** Condition words, waybill, what was seen; null when nothing was noted. */
    conditionNote: text("condition_note"),
    sealBroken: varchar("seal_broken", { length: 60 }),
    sealFitted: varchar("seal_fitted", { length: 60 }),
    dueBackAt: instant("due_back_at"),
    /** The entry that this one corrects; entries themselves are never edited. */
    correctsId: id("corrects_id"),
    imageIds: json("image_ids").$type<string[]>(),
    byId: id("by_id")
      .notNull()
      .references(() => people.id),
    madeAt: madeAt(),
    /** Of this entry and the check code of the one before. */
    sha256: sha256("sha256").notNull(),
  },
  (t) => [
    uniqueIndex("custody_by_item_position").on(t.itemId, t.position),
    index("custody_by_case").on(t.caseId, t.at),
  ],
);
