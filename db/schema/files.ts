import {
  bigint,
  boolean,
  index,
  int,
  json,
  mysqlTable,
  primaryKey,
  text,
  uniqueIndex,
  varchar,
} from "drizzle-orm/mysql-core";
import { UPLOAD_PURPOSES, UPLOAD_STATES } from "@/lib/uploads/constants";
import { asciiText, id, sha256 } from "./columns/id";
import { instant, madeAt } from "./columns/dates";
import { cases } from "./cases";
import { people } from "./people";

/** An object in the store that is kept unchanged. */
export const storedObjects = mysqlTable(
  "stored_objects",
  {
    id: id("id").primaryKey(),
    caseId: id("case_id").references(() => cases.id),
    key: asciiText("key", { length: 255 }).notNull().unique(),
    fileName: varchar("file_name", { length: 255 }).notNull(),
    mediaType: varchar("media_type", { length: 100 }).notNull(),
    sizeBytes: bigint("size_bytes", { mode: "number" }).notNull(),
    sha256: sha256("sha256").notNull(),
    madeById: id("made_by_id").references(() => people.id),
    madeAt: madeAt(),
  },
  // "Is the same picture already in a case?"
  (t) => [
    index("stored_objects_by_sha").on(t.sha256),
    index("stored_objects_by_case").on(t.caseId),
  ],
);

/** A file on its way from a browser to the store. */
export const uploads = mysqlTable(
  "uploads",
  {
    id: id("id").primaryKey(),
    caseId: id("case_id")
      .notNull()
      .references(() => cases.id),
    purpose: varchar("purpose", { length: 20, enum: UPLOAD_PURPOSES }).notNull(),
    state: varchar("state", { length: 12, enum: UPLOAD_STATES }).notNull().default("sending"),
    fileName: varchar("file_name", { length: 255 }).notNull(),
    /** What the browser said; the server looks for itself afterwards. */
    claimedMediaType: varchar("claimed_media_type", { length: 100 }).notNull(),
    sizeBytes: bigint("size_bytes", { mode: "number" }).notNull(),
    lastModified: bigint("last_modified", { mode: "number" }),
    /** SHA-256 of the first part as told by the browser, so that a resumed file is the same file. */
    firstPartSha256: sha256("first_part_sha256"),
    /** SHA-256 of the whole file as told by the browser when it finished. */
    claimedSha256: sha256("claimed_sha256"),
    key: asciiText("key", { length: 255 }).notNull().unique(),
    /** Null for a file that goes in one piece. */
    s3UploadId: varchar("s3_upload_id", { length: 400 }),
    partSizeBytes: int("part_size_bytes"),
    /** Details for the picture that is made of it: item, technique, caption. */
    details: json("details").$type<unknown>(),
    objectId: id("object_id").references(() => storedObjects.id),
    /** Record id of the picture, once made. */
    imageId: id("image_id"),
    refusal: text("refusal"),
    byId: id("by_id")
      .notNull()
      .references(() => people.id),
    madeAt: madeAt(),
    changedAt: madeAt("changed_at"),
    finishedAt: instant("finished_at"),
  },
  (t) => [
    index("uploads_by_case").on(t.caseId, t.state),
    index("uploads_by_state").on(t.state, t.changedAt),
  ],
);

export const uploadParts = mysqlTable(
  "upload_parts",
  {
    uploadId: id("upload_id")
      .notNull()
      .references(() => uploads.id),
    partNumber: int("part_number").notNull(),
    etag: varchar("etag", { length: 100 }).notNull(),
    sizeBytes: int("size_bytes").notNull(),
    madeAt: madeAt(),
  },
  (t) => [primaryKey({ columns: [t.uploadId, t.partNumber] })],
);

/** Photographs and papers that came with the field return. */
export const requestFiles = mysqlTable(
  "request_files",
  {
    id: id("id").primaryKey(),
    caseId: id("case_id")
      .notNull()
      .references(() => cases.id),
    objectId: id("object_id")
      .notNull()
      .references(() => storedObjects.id),
    caption: varchar("caption", { length: 300 }).notNull().default(""),
    isWithdrawn: boolean("is_withdrawn").notNull().default(false),
    byId: id("by_id")
      .notNull()
      .references(() => people.id),
    madeAt: madeAt(),
  },
  (t) => [uniqueIndex("request_files_by_case_object").on(t.caseId, t.objectId)],
);
