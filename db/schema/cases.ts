import { sql } from "drizzle-orm";
import {
  boolean,
  date,
  index,
  int,
  json,
  mysqlTable,
  primaryKey,
  text,
  uniqueIndex,
  varchar,
} from "drizzle-orm/mysql-core";
import { CASE_STATES, HOLD_KINDS, PRIORITIES } from "@/lib/cases/constants";
import { asciiText, id } from "./columns/id";
import { instant, madeAt } from "./columns/dates";
import { organisations, people } from "./people";

export const cases = mysqlTable(
  "cases",
  {
    id: id("id").primaryKey(),
    /** RL-2026-0142; null until it is sent to the laboratory. */
    number: asciiText("number", { length: 20 }).unique(),
    organisationId: id("organisation_id")
      .notNull()
      .references(() => organisations.id),
    requesterId: id("requester_id")
      .notNull()
      .references(() => people.id),
    state: varchar("state", { length: 20, enum: CASE_STATES }).notNull().default("draft"),
    /** STAGE_OF_STATE of `state`, kept so that the list can sort and filter by it. */
    stage: int("stage").notNull().default(0),
    title: varchar("title", { length: 200 }).notNull().default(""),
    /** Copied from the field return for list and search; the field return is the source. */
    partName: varchar("part_name", { length: 200 }).notNull().default(""),
    drawingNumber: varchar("drawing_number", { length: 100 }).notNull().default(""),
    serialNumber: varchar("serial_number", { length: 100 }).notNull().default(""),
    heatNumber: varchar("heat_number", { length: 100 }).notNull().default(""),
    material: varchar("material", { length: 100 }).notNull().default(""),
    priority: varchar("priority", { length: 4, enum: PRIORITIES }),
    investigatorId: id("investigator_id").references(() => people.id),
    leadId: id("lead_id").references(() => people.id),
    secondReaderId: id("second_reader_id").references(() => people.id),
    /** Calendar day at the laboratory; null until a date is set. */
    dueOn: date("due_on", { mode: "string" }),
    /** Orders the list by due date: open cases first, then signed, then ended; no date comes last. */
    dueKey: int("due_key").generatedAlwaysAs(
      sql`(case when stage between 1 and 5 then 0 when stage = 6 then 2 else 3 end) * 1000000 + coalesce(to_days(due_on), 999999)`,
      { mode: "stored" },
    ),
    /** Statement of the accepting lead that nobody assigned owns design, process or supplier. */
    impartialityStatement: text("impartiality_statement"),
    /** Reason given when declined, cancelled or reopened; null otherwise. */
    endReason: text("end_reason"),
    isOnHold: boolean("is_on_hold").notNull().default(false),
    isRestricted: boolean("is_restricted").notNull().default(false),
    itemCount: int("item_count").notNull().default(0),
    /** Open rows of the gate ledger, refreshed by every write to the case. */
    openGateCount: int("open_gate_count").notNull().default(8),
    /** Goes up with every write to the case. */
    revision: int("revision").notNull().default(1),
    submittedAt: instant("submitted_at"),
    acceptedAt: instant("accepted_at"),
    signedAt: instant("signed_at"),
    madeAt: madeAt(),
    changedAt: madeAt("changed_at"),
  },
  (t) => [
    // The case list sorts by one of these and pages by (column, id).
    index("cases_by_due").on(t.dueKey, t.id),
    index("cases_by_changed").on(t.changedAt, t.id),
    index("cases_by_number").on(t.number, t.id),
    index("cases_by_stage").on(t.stage, t.id),
    index("cases_by_title").on(t.title, t.id),
    index("cases_by_organisation_changed").on(t.organisationId, t.changedAt, t.id),
    index("cases_by_organisation_due").on(t.organisationId, t.dueKey, t.id),
    index("cases_by_investigator_due").on(t.investigatorId, t.dueKey, t.id),
    index("cases_by_requester").on(t.requesterId, t.state),
    index("cases_by_drawing").on(t.drawingNumber, t.id),
  ],
);

export const caseNumbers = mysqlTable("case_numbers", {
  year: int("year").primaryKey(),
  last: int("last").notNull(),
});

/** Technicians who work on a case; investigator, lead and second reader stand on the case. */
export const caseTechnicians = mysqlTable(
  "case_technicians",
  {
    caseId: id("case_id")
      .notNull()
      .references(() => cases.id),
    personId: id("person_id")
      .notNull()
      .references(() => people.id),
    madeAt: madeAt(),
  },
  (t) => [
    primaryKey({ columns: [t.caseId, t.personId] }),
    index("case_technicians_by_person").on(t.personId),
  ],
);

/** Every change of state, for the progress bar and the history. */
export const caseMoves = mysqlTable(
  "case_moves",
  {
    id: id("id").primaryKey(),
    caseId: id("case_id")
      .notNull()
      .references(() => cases.id),
    fromState: varchar("from_state", { length: 20, enum: CASE_STATES }),
    toState: varchar("to_state", { length: 20, enum: CASE_STATES }).notNull(),
    reason: text("reason"),
    byId: id("by_id").references(() => people.id),
    at: madeAt("at"),
  },
  (t) => [index("case_moves_by_case").on(t.caseId, t.at)],
);

export const caseHolds = mysqlTable(
  "case_holds",
  {
    id: id("id").primaryKey(),
    caseId: id("case_id")
      .notNull()
      .references(() => cases.id),
    kind: varchar("kind", { length: 20, enum: HOLD_KINDS }).notNull(),
    reason: text("reason").notNull(),
    setById: id("set_by_id")
      .notNull()
      .references(() => people.id),
    setAt: madeAt("set_at"),
    clearedById: id("cleared_by_id").references(() => people.id),
    clearedAt: instant("cleared_at"),
    clearReason: text("clear_reason"),
  },
  (t) => [index("case_holds_by_case").on(t.caseId, t.clearedAt)],
);

/** A question to the requester and its answer. */
export const caseQuestions = mysqlTable(
  "case_questions",
  {
    id: id("id").primaryKey(),
    caseId: id("case_id")
      .notNull()
      .references(() => cases.id),
    question: text("question").notNull(),
    askedById: id("asked_by_id")
      .notNull()
      .references(() => people.id),
    askedAt: madeAt("asked_at"),
    answer: text("answer"),
    answeredById: id("answered_by_id").references(() => people.id),
    answeredAt: instant("answered_at"),
  },
  (t) => [index("case_questions_by_case").on(t.caseId, t.askedAt)],
);

/** The field return as it is being typed. On sending it becomes a record with versions. */
export const fieldReturns = mysqlTable("field_returns", {
  caseId: id("case_id")
    .primaryKey()
    .references(() => cases.id),
  answers: json("answers").$type<Record<string, unknown>>().notNull(),
  revision: int("revision").notNull().default(1),
  savedById: id("saved_by_id").references(() => people.id),
  savedAt: madeAt("saved_at"),
});

export const savedViews = mysqlTable(
  "saved_views",
  {
    id: id("id").primaryKey(),
    personId: id("person_id")
      .notNull()
      .references(() => people.id),
    name: varchar("name", { length: 60 }).notNull(),
    /** Query string of the case list, as in the address. */
    query: varchar("query", { length: 2000 }).notNull(),
    position: int("position").notNull().default(0),
    madeAt: madeAt(),
  },
  (t) => [uniqueIndex("saved_views_by_person_name").on(t.personId, t.name)],
);

/** Installation-wide settings by name: demo marker, tables switched on. */
export const settings = mysqlTable("settings", {
  name: asciiText("name", { length: 80 }).primaryKey(),
  value: json("value").$type<unknown>().notNull(),
  changedAt: madeAt("changed_at"),
});
