import { sql } from "drizzle-orm";
import { index, integer, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import { ROLES } from "@/modules/access/model";
import { GRANT_STATES, LINK_PURPOSES, PERSON_STATES } from "./model";

/** A person of the facility. The history names people by this id; the name can be corrected. */
export const person = sqliteTable(
  "identity_person",
  {
    id: integer("id").primaryKey(),
    name: text("name").notNull(),
    email: text("email").notNull(),
    state: text("state", { enum: PERSON_STATES }).notNull(),
    createdAt: integer("created_at").notNull(),
    suspendedReason: text("suspended_reason"),
    /** JSON: the units a person likes to read and type, by dimension. */
    preferredUnits: text("preferred_units").notNull().default("{}"),
  },
  (table) => [uniqueIndex("identity_person_email").on(sql`lower(${table.email})`)],
);

/** A role given to a person; ended, never deleted. A grant to oneself waits for a second administrator. */
export const roleGrant = sqliteTable(
  "identity_role_grant",
  {
    id: integer("id").primaryKey(),
    personId: integer("person_id")
      .notNull()
      .references(() => person.id),
    role: text("role", { enum: ROLES }).notNull(),
    state: text("state", { enum: GRANT_STATES }).notNull(),
    grantedBy: integer("granted_by").references(() => person.id),
    grantedAt: integer("granted_at").notNull(),
    decidedBy: integer("decided_by").references(() => person.id),
    decidedAt: integer("decided_at"),
    endedBy: integer("ended_by").references(() => person.id),
    endedAt: integer("ended_at"),
  },
  (table) => [
    uniqueIndex("identity_role_grant_open")
      .on(table.personId, table.role)
      .where(sql`${table.state} in ('waiting', 'active')`),
  ],
);

/** An area a person is bound to. A person bound to none works everywhere that the role allows. */
export const areaBinding = sqliteTable(
  "identity_area_binding",
  {
    id: integer("id").primaryKey(),
    personId: integer("person_id")
      .notNull()
      .references(() => person.id),
    areaId: integer("area_id").notNull(),
    boundAt: integer("bound_at").notNull(),
    endedAt: integer("ended_at"),
  },
  (table) => [
    uniqueIndex("identity_area_binding_open")
      .on(table.personId, table.areaId)
      .where(sql`${table.endedAt} is null`),
  ],
);

/** Somebody stands in for somebody in one role, from a day to a day (both included). */
export const deputy = sqliteTable(
  "identity_deputy",
  {
    id: integer("id").primaryKey(),
    personId: integer("person_id")
      .notNull()
      .references(() => person.id),
    deputyId: integer("deputy_id")
      .notNull()
      .references(() => person.id),
    role: text("role", { enum: ROLES }).notNull(),
    fromOn: text("from_on").notNull(),
    toOn: text("to_on").notNull(),
    namedBy: integer("named_by")
      .notNull()
      .references(() => person.id),
    endedAt: integer("ended_at"),
  },
  (table) => [index("identity_deputy_deputy").on(table.deputyId)],
);

/** Password hashes (argon2id); exempt from the history, since a secret must not be copied. */
export const credential = sqliteTable("identity_credential", {
  personId: integer("person_id")
    .primaryKey()
    .references(() => person.id),
  passwordHash: text("password_hash").notNull(),
  changedAt: integer("changed_at").notNull(),
});

/** A sign-in that lasts. The cookie holds the id alone; every request looks here. */
export const session = sqliteTable(
  "identity_session",
  {
    /** SHA-256 of the opaque id in the cookie. */
    id: text("id").primaryKey(),
    personId: integer("person_id")
      .notNull()
      .references(() => person.id),
    startedAt: integer("started_at").notNull(),
    seenAt: integer("seen_at").notNull(),
    endedAt: integer("ended_at"),
    address: text("address"),
  },
  (table) => [index("identity_session_person").on(table.personId)],
);

/** A link that works once: an invitation or a new password. Holds the hash of the secret. */
export const oneTimeLink = sqliteTable("identity_one_time_link", {
  tokenHash: text("token_hash").primaryKey(),
  personId: integer("person_id")
    .notNull()
    .references(() => person.id),
  purpose: text("purpose", { enum: LINK_PURPOSES }).notNull(),
  createdAt: integer("created_at").notNull(),
  expiresAt: integer("expires_at").notNull(),
  usedAt: integer("used_at"),
});

/** Failed sign-ins per account and per address within a window. */
export const throttle = sqliteTable("identity_throttle", {
  key: text("key").primaryKey(),
  windowStartedAt: integer("window_started_at").notNull(),
  failures: integer("failures").notNull(),
});
