import {
  double,
  index,
  int,
  json,
  mysqlTable,
  primaryKey,
  text,
  uniqueIndex,
  varchar,
} from "drizzle-orm/mysql-core";
import { type CitableValues, RECORD_KINDS, RECORD_STATES } from "@/lib/records/constants";
import { asciiText, id, sha256 } from "./columns/id";
import { madeAt } from "./columns/dates";
import { cases } from "./cases";
import { people } from "./people";

/** Everything that can be cited. What it says stands in its versions. */
export const records = mysqlTable(
  "records",
  {
    id: id("id").primaryKey(),
    caseId: id("case_id")
      .notNull()
      .references(() => cases.id),
    kind: varchar("kind", { length: 30, enum: RECORD_KINDS }).notNull(),
    /** Case id, or for marks and calibrations the id of their image; a label is unique in it. */
    scopeId: id("scope_id").notNull(),
    label: asciiText("label", { length: 20 }).notNull(),
    state: varchar("state", { length: 10, enum: RECORD_STATES }).notNull().default("recorded"),
    /** Reason given when void; null otherwise. */
    voidReason: text("void_reason"),
    latestVersion: int("latest_version").notNull().default(0),
    madeById: id("made_by_id")
      .notNull()
      .references(() => people.id),
    madeAt: madeAt(),
  },
  (t) => [
    uniqueIndex("records_by_scope_label").on(t.scopeId, t.label),
    index("records_by_case_kind").on(t.caseId, t.kind),
  ],
);

/** A version is never changed. The headline is the value people quote most. */
export const recordVersions = mysqlTable(
  "record_versions",
  {
    id: id("id").primaryKey(),
    recordId: id("record_id")
      .notNull()
      .references(() => records.id),
    number: int("number").notNull(),
    /** Validated content of the record's kind. */
    content: json("content").$type<unknown>().notNull(),
    /** Quotable fields by name, ready to print. */
    quotes: json("quotes").$type<CitableValues>().notNull(),
    headlineValue: double("headline_value"),
    headlineUnit: varchar("headline_unit", { length: 20 }),
    /** Expanded uncertainty, k = 2, in the headline's unit; null when not known. */
    headlineUncertainty: double("headline_uncertainty"),
    method: varchar("method", { length: 120 }),
    methodVersion: varchar("method_version", { length: 60 }),
    /** Why this version was made; null for the first. */
    reason: text("reason"),
    madeById: id("made_by_id")
      .notNull()
      .references(() => people.id),
    madeAt: madeAt(),
    /** Of the canonical JSON of content, quotes, method and inputs. */
    sha256: sha256("sha256").notNull(),
  },
  (t) => [uniqueIndex("record_versions_by_record_number").on(t.recordId, t.number)],
);

/** A version was made from these versions. */
export const recordEdges = mysqlTable(
  "record_edges",
  {
    versionId: id("version_id")
      .notNull()
      .references(() => recordVersions.id),
    inputVersionId: id("input_version_id")
      .notNull()
      .references(() => recordVersions.id),
  },
  (t) => [
    primaryKey({ columns: [t.versionId, t.inputVersionId] }),
    index("record_edges_by_input").on(t.inputVersionId),
  ],
);

/** Labels are handed out once and never used again. */
export const labelCounters = mysqlTable(
  "label_counters",
  {
    scopeId: id("scope_id").notNull(),
    prefix: asciiText("prefix", { length: 16 }).notNull(),
    last: int("last").notNull(),
  },
  (t) => [primaryKey({ columns: [t.scopeId, t.prefix] })],
);
