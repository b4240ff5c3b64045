import {
  boolean,
  double,
  index,
  int,
  json,
  mysqlTable,
  text,
  varchar,
} from "drizzle-orm/mysql-core";
import { CALIBRATION_SOURCES, IMAGE_STATES, MARK_TOOLS } from "@/lib/images/constants";
import { asciiText, id } from "./columns/id";
import { cases } from "./cases";
import { storedObjects } from "./files";
import { records, recordVersions } from "./records";

/** A picture, keyed by its record. Caption, technique and item are in the versions. */
export const images = mysqlTable(
  "images",
  {
    recordId: id("record_id")
      .primaryKey()
      .references(() => records.id),
    caseId: id("case_id")
      .notNull()
      .references(() => cases.id),
    objectId: id("object_id")
      .notNull()
      .references(() => storedObjects.id),
    state: varchar("state", { length: 10, enum: IMAGE_STATES }).notNull().default("checking"),
    refusal: text("refusal"),
    /** Null until the server has looked into the file. */
    widthPx: int("width_px"),
    heightPx: int("height_px"),
    bitDepth: int("bit_depth"),
    channels: int("channels"),
    /** µm per pixel from the file's own resolution data, a proposal only; null when it has none. */
    fileUmPerPxX: double("file_um_per_px_x"),
    fileUmPerPxY: double("file_um_per_px_y"),
    metadata: json("metadata").$type<Record<string, unknown>>(),
    /** Prefix of the tile pyramid and thumbnail in the store; null until made. */
    tilePrefix: asciiText("tile_prefix", { length: 200 }),
    /** Levels of the pyramid as in its info.json. */
    scaleFactors: json("scale_factors").$type<number[]>(),
    /** May be shown to the requester before the report is released. */
    isShareable: boolean("is_shareable").notNull().default(false),
  },
  (t) => [index("images_by_case").on(t.caseId), index("images_by_object").on(t.objectId)],
);

export const calibrations = mysqlTable(
  "calibrations",
  {
    versionId: id("version_id")
      .primaryKey()
      .references(() => recordVersions.id),
    recordId: id("record_id")
      .notNull()
      .references(() => records.id),
    imageId: id("image_id")
      .notNull()
      .references(() => images.recordId),
    source: varchar("source", { length: 20, enum: CALIBRATION_SOURCES }).notNull(),
    umPerPx: double("um_per_px").notNull(),
    /** Relative expanded uncertainty of the pixel size, k = 2. */
    relativeUncertainty: double("relative_uncertainty").notNull(),
  },
  (t) => [index("calibrations_by_image").on(t.imageId)],
);

/** One version of a mark; geometry in image pixels, origin top left. */
export const marks = mysqlTable(
  "marks",
  {
    versionId: id("version_id")
      .primaryKey()
      .references(() => recordVersions.id),
    recordId: id("record_id")
      .notNull()
      .references(() => records.id),
    imageId: id("image_id")
      .notNull()
      .references(() => images.recordId),
    tool: varchar("tool", { length: 12, enum: MARK_TOOLS }).notNull(),
    /** Three-letter feature code; null for plain measurements and notes. */
    featureCode: asciiText("feature_code", { length: 3 }),
    geometry: json("geometry").$type<unknown>().notNull(),
  },
  (t) => [index("marks_by_image").on(t.imageId), index("marks_by_record").on(t.recordId)],
);
