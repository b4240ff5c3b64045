import { int, json, mysqlTable, text, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { NOTE_KINDS, NOTE_SEVERITIES, NOTE_STATES, type NoteReply } from "@/lib/findings/constants";
import { id } from "./columns/id";
import { madeAt } from "./columns/dates";
import { people } from "./people";
import { reportIssues } from "./reports";

/** What a second reader noted beside a text, each tied to a place in it. */
export const reviewNotes = mysqlTable(
  "review_notes",
  {
    id: id("id").primaryKey(),
    issueId: id("issue_id")
      .notNull()
      .references(() => reportIssues.id),
    /** 1, 2, 3 … in an issue, as printed beside the text. */
    number: int("number").notNull(),
    /** Revision of the text that was read. */
    revision: int("revision").notNull(),
    /** Key of the section it is about. */
    section: varchar("section", { length: 40 }).notNull(),
    /** Words of that section it is about; empty for all of it. */
    passage: varchar("passage", { length: 500 }).notNull(),
    /** Picture or traverse of the figure it is about; null where it is about words. */
    figureId: id("figure_id"),
    kind: varchar("kind", { length: 12, enum: NOTE_KINDS }).notNull(),
    severity: varchar("severity", { length: 8, enum: NOTE_SEVERITIES }).notNull(),
    words: text("words").notNull(),
    state: varchar("state", { length: 12, enum: NOTE_STATES }).notNull().default("open"),
    replies: json("replies").$type<NoteReply[]>().notNull(),
    readerId: id("reader_id")
      .notNull()
      .references(() => people.id),
    madeAt: madeAt(),
  },
  (t) => [uniqueIndex("review_notes_by_issue_number").on(t.issueId, t.number)],
);
