import { and, desc, eq, sql } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { auditChange } from "./schema";

/** Nothing is overwritten: a corrected record is a new one that names the one it supersedes in this column. */
const SUPERSEDES = "supersedes_id";
const MOST_VERSIONS = 200;

const isSuperseding = (db: Orm, table: string): boolean =>
  db.get(sql`select 1 as n from pragma_table_info(${table}) where name = ${SUPERSEDES}`) !== undefined;

/** A row as its newest change left it (or as it was before it went), as JSON; null where it never was. */
export function newestRow(db: Orm, table: string, key: string): string | null {
  const change = db
    .select({ before: auditChange.before, after: auditChange.after })
    .from(auditChange)
    .where(and(eq(auditChange.tableName, table), eq(auditChange.rowKey, key)))
    .orderBy(desc(auditChange.id))
    .limit(1)
    .get();
  return change?.after ?? change?.before ?? null;
}

/** The key of the record that a row supersedes. */
function supersededKey(row: string | null): string | null {
  if (row === null) return null;
  const key = (JSON.parse(row) as Record<string, unknown>)[SUPERSEDES];
  return typeof key === "number" ? String(key) : null;
}

/** The record that a row supersedes, as it was left; null where it supersedes none. */
export function supersededBy(
  db: Orm,
  table: string,
  row: string | null,
): { key: string; row: string } | null {
  const key = supersededKey(row);
  const found = key === null ? null : newestRow(db, table, key);
  return key === null || found === null ? null : { key, row: found };
}

/** A record's keys through its corrections, the oldest first; itself alone where its table knows none. */
export function versionsOf(db: Orm, table: string, key: string): string[] {
  if (!isSuperseding(db, table)) return [key];
  const versions = [key];
  for (let at: string | null = key; at !== null && versions.length < MOST_VERSIONS; ) {
    at = supersededKey(newestRow(db, table, at));
    if (at !== null) versions.unshift(at);
  }
  const later = sql`select id from ${sql.identifier(table)} where ${sql.identifier(SUPERSEDES)} = `;
  for (let at: string | undefined = key; at !== undefined && versions.length < MOST_VERSIONS; ) {
    const next: { id: number } | undefined = db.get(sql`${later}${Number(at)}`);
    at = next === undefined ? undefined : String(next.id);
    if (at !== undefined) versions.push(at);
  }
  return versions;
}
