import { and, desc, eq, inArray, lt, lte } from "drizzle-orm";
import { z } from "zod";
import { notFound } from "@/lib/problem";
import { auditMay } from "../abilities";
import { defineQuery } from "../define-query";
import { supersededBy, versionsOf } from "../lineage";
import { mustSeeRecord } from "../record-gates";
import { auditChange, auditEntry } from "../schema";

/** Which record: its table, and its key as the history writes it. */
const record = {
  table: z
    .string()
    .regex(/^[a-z_]+$/)
    .max(64),
  key: z.string().min(1).max(120),
};

const entryOfChange = {
  entryId: auditEntry.id,
  at: auditEntry.at,
  verb: auditEntry.verb,
  actorKind: auditEntry.actorKind,
  actorId: auditEntry.actorId,
  reason: auditEntry.reason,
};

/**
 * The history of one record, its corrections included: each change with who and why, newest first. A version that supersedes
 * another comes with the other as `superseded`.
 */
export const getRecordHistory = defineQuery({
  name: "getRecordHistory",
  permission: auditMay.readRecord,
  input: z.strictObject({
    ...record,
    /** Changes before this one (its number), for the next page. */
    before: z.coerce.number().int().positive().optional(),
    limit: z.coerce.number().int().min(1).max(200).default(50),
  }),
  run(ctx, { table, key, before, limit }) {
    mustSeeRecord(ctx, table, key);
    const versions = versionsOf(ctx.db, table, key);
    const rows = ctx.db
      .select({
        id: auditChange.id,
        rowKey: auditChange.rowKey,
        operation: auditChange.operation,
        before: auditChange.before,
        after: auditChange.after,
        ...entryOfChange,
      })
      .from(auditChange)
      .innerJoin(auditEntry, eq(auditEntry.id, auditChange.entryId))
      .where(
        and(
          eq(auditChange.tableName, table),
          inArray(auditChange.rowKey, versions),
          before === undefined ? undefined : lt(auditChange.id, before),
        ),
      )
      .orderBy(desc(auditChange.id))
      .limit(limit + 1)
      .all();
    if (rows.length === 0) throw notFound("such record");
    const changes = rows.slice(0, limit).map((row) => ({
      ...row,
      superseded: row.operation === "insert" ? supersededBy(ctx.db, table, row.after) : null,
    }));
    return { table, key, versions, changes, hasOlder: rows.length > limit };
  },
});

export type RecordHistory = ReturnType<typeof getRecordHistory.run>;

/**
 * A record as it was at a moment (UTC epoch ms, what was done in that very millisecond included), rebuilt from its changes:
 * the version that was in force then. `row` is null where there was no such record then: not yet, or not any more.
 */
export const getRecordAt = defineQuery({
  name: "getRecordAt",
  permission: auditMay.readRecord,
  input: z.strictObject({ ...record, at: z.coerce.number().int() }),
  run(ctx, { table, key, at }) {
    mustSeeRecord(ctx, table, key);
    const changesOf = and(
      eq(auditChange.tableName, table),
      inArray(auditChange.rowKey, versionsOf(ctx.db, table, key)),
    );
    const found = ctx.db
      .select({ after: auditChange.after, rowKey: auditChange.rowKey, ...entryOfChange })
      .from(auditChange)
      .innerJoin(auditEntry, eq(auditEntry.id, auditChange.entryId))
      .where(and(changesOf, lte(auditEntry.at, at)))
      .orderBy(desc(auditChange.id))
      .limit(1)
      .get();
    const known =
      found ?? ctx.db.select({ id: auditChange.id }).from(auditChange).where(changesOf).limit(1).get();
    if (!known) throw notFound("such record");
    if (!found) return { table, key, at, row: null, entry: null };
    const { after, ...entry } = found;
    return {
      table,
      key,
      at,
      row: after === null ? null : (JSON.parse(after) as Record<string, unknown>),
      entry,
    };
  },
});

export type RecordAt = ReturnType<typeof getRecordAt.run>;
