import { sql } from "drizzle-orm";
import { datetime } from "drizzle-orm/mysql-core";

/** UTC, to the millisecond. */
export const instant = (name: string) => datetime(name, { mode: "date", fsp: 3 });

export const madeAt = (name = "made_at") =>
  instant(name)
    .notNull()
    .default(sql`current_timestamp(3)`);
