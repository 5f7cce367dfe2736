import { sql } from "drizzle-orm";
import { index, integer, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { Finding } from "./verify";

/** One command that was carried out. Never updated, never deleted; `hash` covers the entry, its changes and `prevHash`. */
export const auditEntry = sqliteTable(
  "audit_entry",
  {
    id: integer("id").primaryKey(),
    at: integer("at").notNull(),
    verb: text("verb").notNull(),
    version: integer("version").notNull(),
    actorKind: text("actor_kind", { enum: ["person", "system"] }).notNull(),
    actorId: integer("actor_id"),
    roles: text("roles").notNull(),
    subjectType: text("subject_type"),
    subjectId: text("subject_id"),
    reason: text("reason"),
    payload: text("payload").notNull(),
    requestId: text("request_id"),
    changeCount: integer("change_count").notNull(),
    prevHash: text("prev_hash").notNull(),
    hash: text("hash").notNull(),
  },
  (table) => [
    // Each search of the history has an index that also gives its order (time, then number).
    index("audit_entry_at").on(table.at),
    index("audit_entry_actor").on(table.actorId, table.at),
    index("audit_entry_verb").on(table.verb, table.at),
    index("audit_entry_actor_verb").on(table.actorId, table.verb, table.at),
    index("audit_entry_subject").on(table.subjectType, table.subjectId, table.at),
    index("audit_entry_subject_type").on(table.subjectType, table.at),
  ],
);

/** One row that a command inserted, updated or deleted, before and after as JSON. Written by triggers alone. */
export const auditChange = sqliteTable(
  "audit_change",
  {
    id: integer("id").primaryKey(),
    entryId: integer("entry_id").notNull(),
    tableName: text("table_name").notNull(),
    rowKey: text("row_key").notNull(),
    operation: text("operation", { enum: ["insert", "update", "delete", "migrate"] }).notNull(),
    before: text("before"),
    after: text("after"),
  },
  (table) => [
    index("audit_change_entry").on(table.entryId),
    index("audit_change_row").on(table.tableName, table.rowKey, table.id),
  ],
);

/** The first answer to a command that carried an idempotency key; kept without expiry. */
export const auditIdempotency = sqliteTable("audit_idempotency", {
  key: text("key").primaryKey(),
  actorId: integer("actor_id"),
  command: text("command").notNull(),
  inputHash: text("input_hash").notNull(),
  answer: text("answer").notNull(),
  entryId: integer("entry_id").notNull(),
  at: integer("at").notNull(),
});

/** Work that follows a command: written in its transaction, carried out after COMMIT, at least once. */
export const auditJob = sqliteTable(
  "audit_job",
  {
    id: integer("id").primaryKey(),
    kind: text("kind").notNull(),
    input: text("input").notNull(),
    causeEntryId: integer("cause_entry_id"),
    createdAt: integer("created_at").notNull(),
    runAt: integer("run_at").notNull(),
    attempts: integer("attempts").notNull().default(0),
    doneAt: integer("done_at"),
    failedAt: integer("failed_at"),
    error: text("error"),
  },
  (table) => [
    index("audit_job_due").on(table.runAt).where(sql`${table.doneAt} is null and ${table.failedAt} is null`),
    uniqueIndex("audit_job_id_kind").on(table.id, table.kind),
  ],
);

/** One check of the whole history that a person asked for on screen, and what it found. */
export const auditVerification = sqliteTable("audit_verification", {
  id: integer("id").primaryKey(),
  askedBy: integer("asked_by"),
  askedAt: integer("asked_at").notNull(),
  finishedAt: integer("finished_at"),
  /** Entries in the copy that was checked, and its newest entry's number and hash. */
  entries: integer("entries"),
  headEntryId: integer("head_entry_id"),
  headHash: text("head_hash"),
  findingCount: integer("finding_count"),
  findings: text("findings", { mode: "json" }).$type<Finding[]>().notNull().default([]),
  /** Why the check itself could not be made. */
  trouble: text("trouble"),
});
