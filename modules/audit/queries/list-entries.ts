import { and, asc, desc, eq, gte, isNull, lt, type SQL, sql } from "drizzle-orm";
import { z } from "zod";
import type { Orm } from "@/db/database";
import { auditMay } from "../abilities";
import { defineQuery } from "../define-query";
import type { ListedEntry } from "../model";
import { auditEntry } from "../schema";

const id = z.coerce.number().int().positive();
const moment = z.coerce.number().int();

/** What the history is searched by. */
export const historyFilter = z.strictObject({
  /** Acts of one person; `actorKind` "system" finds what the product did by itself. */
  personId: id.optional(),
  actorKind: z.enum(["system"]).optional(),
  verb: z.string().max(80).optional(),
  subjectType: z.string().max(40).optional(),
  subjectId: z.string().max(80).optional(),
  fromAt: moment.optional(),
  toAt: moment.optional(),
});

export type HistoryFilter = z.output<typeof historyFilter>;

/** The condition of a search; every part of it has an index that also orders by time. */
export function filterCondition(filter: HistoryFilter): SQL | undefined {
  return and(
    filter.personId === undefined ? undefined : eq(auditEntry.actorId, filter.personId),
    filter.actorKind === undefined ? undefined : isNull(auditEntry.actorId),
    filter.verb === undefined ? undefined : eq(auditEntry.verb, filter.verb),
    filter.subjectType === undefined ? undefined : eq(auditEntry.subjectType, filter.subjectType),
    filter.subjectId === undefined ? undefined : eq(auditEntry.subjectId, filter.subjectId),
    filter.fromAt === undefined ? undefined : gte(auditEntry.at, filter.fromAt),
    filter.toAt === undefined ? undefined : lt(auditEntry.at, filter.toAt),
  );
}

const momentOf = (entryId: number): SQL => sql`(select at from audit_entry where id = ${entryId})`;

const olderThan = (entryId: number): SQL =>
  sql`(${auditEntry.at}, ${auditEntry.id}) < (${momentOf(entryId)}, ${entryId})`;
const newerThan = (entryId: number): SQL =>
  sql`(${auditEntry.at}, ${auditEntry.id}) > (${momentOf(entryId)}, ${entryId})`;

/** What lists and files show of an entry. */
const listed = {
  id: auditEntry.id,
  at: auditEntry.at,
  verb: auditEntry.verb,
  actorKind: auditEntry.actorKind,
  actorId: auditEntry.actorId,
  subjectType: auditEntry.subjectType,
  subjectId: auditEntry.subjectId,
  reason: auditEntry.reason,
  changeCount: auditEntry.changeCount,
  hash: auditEntry.hash,
};

/**
 * Entries of the history, newest first; the next page begins where the last one ended (keyset), so that page 9,000 is as
 * quick as the first. `before` and `after` are entry numbers.
 */
export const listEntries = defineQuery({
  name: "listEntries",
  permission: auditMay.readHistory,
  input: historyFilter.extend({
    before: id.optional(),
    after: id.optional(),
    limit: z.coerce.number().int().min(1).max(1000).default(50),
  }),
  run(ctx, { before, after, limit, ...filter }): { entries: ListedEntry[]; hasMore: boolean } {
    const upwards = after !== undefined;
    const order = upwards ? asc : desc;
    const rows = ctx.db
      .select(listed)
      .from(auditEntry)
      .where(
        and(
          filterCondition(filter),
          before === undefined ? undefined : olderThan(before),
          after === undefined ? undefined : newerThan(after),
        ),
      )
      .orderBy(order(auditEntry.at), order(auditEntry.id))
      .limit(limit + 1)
      .all();
    const entries = rows.slice(0, limit);
    if (upwards) entries.reverse();
    return { entries, hasMore: rows.length > limit };
  },
});

/** Each value of an indexed column once, by hopping through its index from one value to the next. */
function valuesOf(db: Orm, column: SQL): string[] {
  const rows = db.all<{ value: string | null }>(sql`
    with recursive hop(value) as (
      select min(${column}) from audit_entry
      union all
      select (select min(${column}) from audit_entry where ${column} > hop.value) from hop where hop.value is not null
    )
    select value from hop where value is not null`);
  return rows.map((row) => String(row.value));
}

/** The verbs that occur in the history, for the search. */
export const listVerbs = defineQuery({
  name: "listVerbs",
  permission: auditMay.readHistory,
  input: z.strictObject({}),
  run: (ctx): string[] => valuesOf(ctx.db, sql.raw("verb")),
});

/** The kinds of subjects that occur in the history, for the search. */
export const listSubjectTypes = defineQuery({
  name: "listSubjectTypes",
  permission: auditMay.readHistory,
  input: z.strictObject({}),
  run: (ctx): string[] => valuesOf(ctx.db, sql.raw("subject_type")),
});
