import { sql } from "drizzle-orm";
import { customType } from "drizzle-orm/mysql-core";

const isAscii = (text: string) => /^[\u0000-\u007f]*$/.test(text);

/** Ids and digests compare byte by byte, so "A" and "a" stay two things. */
export const asciiText = customType<{ data: string; config: { length: number } }>({
  dataType: (config) => `varchar(${config?.length ?? 64}) character set ascii collate ascii_bin`,
  // Compared with other letters MariaDB fails ("illegal mix of collations") unless told how; so an
  // id with such letters, from an address say, is simply not there. Writing one still fails.
  toDriver: (text) => (isAscii(text) ? text : sql`${text} collate utf8mb4_bin`),
});

/** Prefixed id made in the application, e.g. `case_0j3k…`. */
export const id = (name: string) => asciiText(name, { length: 40 });

/** SHA-256 in lower-case hexadecimal. */
export const sha256 = (name: string) => asciiText(name, { length: 64 });
