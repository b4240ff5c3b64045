import {
  int,
  json,
  index,
  mysqlTable,
  primaryKey,
  text,
  uniqueIndex,
  varchar,
} from "drizzle-orm/mysql-core";
import { ISSUE_STATES } from "@/lib/reports/constants";
import { id, sha256 } from "./columns/id";
import { instant, madeAt } from "./columns/dates";
import { cases } from "./cases";
import { storedObjects } from "./files";
import { people } from "./people";

/** One issue of the findings report: the draft while it is written, frozen once signed. */
export const reportIssues = mysqlTable(
  "report_issues",
  {
    id: id("id").primaryKey(),
    caseId: id("case_id")
      .notNull()
      .references(() => cases.id),
    number: int("number").notNull(),
    state: varchar("state", { length: 12, enum: ISSUE_STATES }).notNull().default("drafting"),
    /** Why a further issue was opened; null for the first. */
    reason: text("reason"),
    document: json("document").$type<unknown>().notNull(),
    /** One-sentence root cause as it will be signed. */
    rootCause: text("root_cause"),
    revision: int("revision").notNull().default(1),
    savedById: id("saved_by_id").references(() => people.id),
    savedAt: madeAt("saved_at"),
    /** Everything the signed report renders from, as it was; null until signed. */
    frozen: json("frozen").$type<unknown>(),
    /** Versions under the report with their digests. */
    manifest: json("manifest").$type<unknown>(),
    manifestSha256: sha256("manifest_sha256"),
    pdfObjectId: id("pdf_object_id").references(() => storedObjects.id),
    signedById: id("signed_by_id").references(() => people.id),
    signedAt: instant("signed_at"),
    releasedAt: instant("released_at"),
    madeById: id("made_by_id")
      .notNull()
      .references(() => people.id),
    madeAt: madeAt(),
  },
  (t) => [uniqueIndex("report_issues_by_case_number").on(t.caseId, t.number)],
);

/** Each saved state of a draft, so that nothing written is lost. */
export const reportRevisions = mysqlTable(
  "report_revisions",
  {
    issueId: id("issue_id")
      .notNull()
      .references(() => reportIssues.id),
    revision: int("revision").notNull(),
    document: json("document").$type<unknown>().notNull(),
    savedById: id("saved_by_id")
      .notNull()
      .references(() => people.id),
    savedAt: madeAt("saved_at"),
  },
  (t) => [
    primaryKey({ columns: [t.issueId, t.revision] }),
    index("report_revisions_by_writer").on(t.savedById),
  ],
);
