import { and, desc, eq, lt, lte, sql } from "drizzle-orm";
import { z } from "zod";
import { notFound } from "@/lib/problem";
import { auditMay } from "../abilities";
import { defineQuery } from "../define-query";
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

/** The history of one record: each change with who and why, newest first. */
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
    const rows = ctx.db
      .select({
        id: auditChange.id,
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
          eq(auditChange.rowKey, key),
          before === undefined ? undefined : lt(auditChange.id, before),
        ),
      )
      .orderBy(desc(auditChange.id))
      .limit(limit + 1)
      .all();
    if (rows.length === 0) throw notFound("such record");
    return { table, key, changes: rows.slice(0, limit), hasOlder: rows.length > limit };
  },
});

export type RecordHistory = ReturnType<typeof getRecordHistory.run>;

/**
 * A record as it was at a moment (UTC epoch ms, what was done in that very millisecond included), rebuilt from its changes.
 * `row` is null where there was no such record then: not yet, or not any more.
 */
export const getRecordAt = defineQuery({
  name: "getRecordAt",
  permission: auditMay.readRecord,
  input: z.strictObject({ ...record, at: z.coerce.number().int() }),
  run(ctx, { table, key, at }) {
    mustSeeRecord(ctx, table, key);
    const found = ctx.db
      .select({ after: auditChange.after, ...entryOfChange })
      .from(auditChange)
      .innerJoin(auditEntry, eq(auditEntry.id, auditChange.entryId))
      .where(and(eq(auditChange.tableName, table), eq(auditChange.rowKey, key), lte(auditEntry.at, at)))
      .orderBy(desc(auditChange.id))
      .limit(1)
      .get();
    if (!found && !recordExists(ctx, table, key)) throw notFound("such record");
    const row = found?.after ? (JSON.parse(found.after) as Record<string, unknown>) : null;
    return { table, key, at, row, entry: found ? withoutRow(found) : null };
  },
});

export type RecordAt = ReturnType<typeof getRecordAt.run>;

function withoutRow<T extends { after: unknown }>({ after: _row, ...entry }: T): Omit<T, "after"> {
  return entry;
}

function recordExists(ctx: Parameters<typeof getRecordAt.run>[0], table: string, key: string): boolean {
  const found = ctx.db.get<{ n: number }>(
    sql`select 1 as n from audit_change where table_name = ${table} and row_key = ${key} limit 1`,
  );
  return found !== undefined;
}
