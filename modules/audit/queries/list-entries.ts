import { and, asc, desc, eq, gte, inArray, lt, type SQL } from "drizzle-orm";
import { z } from "zod";
import { notFound } from "@/lib/problem";
import { auditMay } from "../abilities";
import { defineQuery } from "../define-query";
import { auditChange, auditEntry } from "../schema";

const id = z.coerce.number().int().positive();
const moment = z.coerce.number().int();

/** What the history is searched by. Empty search boxes count as not given. */
export const historyFilter = z.strictObject({
  personId: id.optional(),
  verb: z.string().max(80).optional(),
  subjectType: z.string().max(40).optional(),
  subjectId: z.string().max(80).optional(),
  fromAt: moment.optional(),
  toAt: moment.optional(),
});

type Filter = z.output<typeof historyFilter>;

/** The condition of a search; every part of it has an index that also orders by id. */
export function filterCondition(filter: Filter): SQL | undefined {
  return and(
    filter.personId === undefined ? undefined : eq(auditEntry.actorId, filter.personId),
    filter.verb === undefined ? undefined : eq(auditEntry.verb, filter.verb),
    filter.subjectType === undefined ? undefined : eq(auditEntry.subjectType, filter.subjectType),
    filter.subjectId === undefined ? undefined : eq(auditEntry.subjectId, filter.subjectId),
    filter.fromAt === undefined ? undefined : gte(auditEntry.at, filter.fromAt),
    filter.toAt === undefined ? undefined : lt(auditEntry.at, filter.toAt),
  );
}

/** Entries of the history, newest first; keyset paging by entry number, so that page 9,000 is as quick as the first. */
export const listEntries = defineQuery({
  name: "listEntries",
  permission: auditMay.readHistory,
  input: historyFilter.extend({
    before: id.optional(),
    after: id.optional(),
    limit: z.coerce.number().int().min(1).max(200).default(50),
  }),
  run(ctx, { before, after, limit, ...filter }) {
    const rows = ctx.db
      .select()
      .from(auditEntry)
      .where(
        and(
          filterCondition(filter),
          before === undefined ? undefined : lt(auditEntry.id, before),
          after === undefined ? undefined : gte(auditEntry.id, after + 1),
        ),
      )
      .orderBy(after === undefined ? desc(auditEntry.id) : asc(auditEntry.id))
      .limit(limit + 1)
      .all();
    const page = rows.slice(0, limit);
    if (after !== undefined) page.reverse();
    return { entries: page, hasMore: rows.length > limit };
  },
});

/** The verbs that occur in the history, for the search. */
export const listVerbs = defineQuery({
  name: "listVerbs",
  permission: auditMay.readHistory,
  input: z.strictObject({}),
  run(ctx): string[] {
    return ctx.db.selectDistinct({ verb: auditEntry.verb }).from(auditEntry).orderBy(asc(auditEntry.verb)).all().map((row) => row.verb);
  },
});

/** How many changes of an entry are shown at once; an entry may have thousands. */
const CHANGES_SHOWN = 200;

/** One entry with its changes, before and after. */
export const getEntry = defineQuery({
  name: "getEntry",
  permission: auditMay.readHistory,
  input: z.strictObject({ entryId: id, afterChange: z.coerce.number().int().min(0).default(0) }),
  run(ctx, { entryId, afterChange }) {
    const entry = ctx.db.select().from(auditEntry).where(eq(auditEntry.id, entryId)).get();
    if (!entry) throw notFound("such entry");
    const changes = ctx.db
      .select()
      .from(auditChange)
      .where(and(eq(auditChange.entryId, entryId), gte(auditChange.id, afterChange + 1)))
      .orderBy(asc(auditChange.id))
      .limit(CHANGES_SHOWN + 1)
      .all();
    return { entry, changes: changes.slice(0, CHANGES_SHOWN), hasMore: changes.length > CHANGES_SHOWN };
  },
});

/** Tables whose records only those who may read the whole history see, since they tell of people. */
const PERSONAL_TABLES = /^identity_/;

/** The history of one record: each change with its entry, oldest first. */
export const getRecordHistory = defineQuery({
  name: "getRecordHistory",
  permission: auditMay.readRecord,
  input: z.strictObject({ table: z.string().regex(/^[a-z_]+$/), key: z.string().max(120) }),
  run(ctx, { table, key }) {
    const mayReadPeople = ctx.actor.roles.some((role) => auditMay.readHistory.roles[role] !== undefined);
    if (PERSONAL_TABLES.test(table) && !mayReadPeople) throw notFound("such record");
    const changes = ctx.db
      .select()
      .from(auditChange)
      .where(and(eq(auditChange.tableName, table), eq(auditChange.rowKey, key)))
      .orderBy(asc(auditChange.id))
      .limit(1000)
      .all();
    if (changes.length === 0) throw notFound("such record");
    const ids = [...new Set(changes.map((change) => change.entryId))];
    const entries = ctx.db.select().from(auditEntry).where(inArray(auditEntry.id, ids)).all();
    return { table, key, changes, entries };
  },
});
