import { boolean, index, int, mysqlTable, varchar } from "drizzle-orm/mysql-core";
import { ORGANISATION_KINDS, ROLES, TOKEN_KINDS } from "@/lib/people/constants";
import { asciiText, id, sha256 } from "./columns/id";
import { instant, madeAt } from "./columns/dates";

export const organisations = mysqlTable("organisations", {
  id: id("id").primaryKey(),
  kind: varchar("kind", { length: 20, enum: ORGANISATION_KINDS }).notNull(),
  name: varchar("name", { length: 200 }).notNull().unique(),
  /** Letterhead line of the laboratory; null where none was given. */
  addressLine: varchar("address_line", { length: 300 }),
  madeAt: madeAt(),
});

export const people = mysqlTable(
  "people",
  {
    id: id("id").primaryKey(),
    organisationId: id("organisation_id")
      .notNull()
      .references(() => organisations.id),
    email: varchar("email", { length: 254 }).notNull().unique(),
    name: varchar("name", { length: 200 }).notNull(),
    role: varchar("role", { length: 20, enum: ROLES }).notNull(),
    isActive: boolean("is_active").notNull().default(true),
    /** Argon2id, PHC string; null until the invitation is taken up. */
    passwordHash: varchar("password_hash", { length: 255 }),
    /** Goes up when role, password or activity changes; older sign-ins end. */
    signInEpoch: int("sign_in_epoch").notNull().default(1),
    madeAt: madeAt(),
  },
  (t) => [index("people_by_organisation").on(t.organisationId, t.role)],
);

/** A sign-in that holds on every instance; ended by idle time, age, sign-out or a changed epoch. */
export const signIns = mysqlTable(
  "sign_ins",
  {
    id: id("id").primaryKey(),
    personId: id("person_id")
      .notNull()
      .references(() => people.id),
    epoch: int("epoch").notNull(),
    startedAt: madeAt("started_at"),
    lastUsedAt: madeAt("last_used_at"),
    endedAt: instant("ended_at"),
    /** Wrong passwords at signing in a row; three end the sign-in. */
    failedConfirmations: int("failed_confirmations").notNull().default(0),
  },
  (t) => [index("sign_ins_by_person").on(t.personId)],
);

/** One-time links sent by mail. Only the digest is stored. */
export const personTokens = mysqlTable("person_tokens", {
  digest: sha256("digest").primaryKey(),
  personId: id("person_id")
    .notNull()
    .references(() => people.id),
  kind: varchar("kind", { length: 20, enum: TOKEN_KINDS }).notNull(),
  expiresAt: instant("expires_at").notNull(),
  usedAt: instant("used_at"),
  madeAt: madeAt(),
});

/** Failed tries per account and per address, in fixed windows. */
export const throttles = mysqlTable("throttles", {
  key: asciiText("key", { length: 80 }).primaryKey(),
  windowStartedAt: instant("window_started_at").notNull(),
  tries: int("tries").notNull(),
});
