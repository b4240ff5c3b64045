import { boolean, double, index, int, mysqlTable, primaryKey, text } from "drizzle-orm/mysql-core";
import { id } from "./columns/id";
import { records, recordVersions } from "./records";

/** One indent of one version of a traverse; what was typed, never what was worked out. */
export const traverseReadings = mysqlTable(
  "traverse_readings",
  {
    versionId: id("version_id")
      .notNull()
      .references(() => recordVersions.id),
    recordId: id("record_id")
      .notNull()
      .references(() => records.id),
    position: int("position").notNull(),
    /** Below the true surface, mm. */
    depthMm: double("depth_mm").notNull(),
    /** Diagonals, µm; null when hardness was typed instead. */
    d1Um: double("d1_um"),
    d2Um: double("d2_um"),
    /** Typed hardness; null when worked out from the diagonals. */
    enteredHardness: double("entered_hardness"),
    lateralMm: double("lateral_mm"),
    track: int("track"),
    isLeftOut: boolean("is_left_out").notNull().default(false),
    leftOutReason: text("left_out_reason"),
    keptReason: text("kept_reason"),
  },
  (t) => [
    primaryKey({ columns: [t.versionId, t.position] }),
    index("traverse_readings_by_record").on(t.recordId),
  ],
);
