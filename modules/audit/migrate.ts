import path from "node:path";
import { migrate } from "drizzle-orm/better-sqlite3/migrator";
import type { Database, Sqlite } from "@/db/database";
import type { Clock } from "@/lib/clock";
import { invariant } from "@/lib/invariant";
import { SYSTEM_ACTOR } from "@/modules/access";
import { capturedTables, installCapture, removeCapture, rowJsonSql, rowKeySql, schemaHash } from "./capture";
import { auditEvents } from "./events";
import { chainHead, sealEntry } from "./seal";

const FOLDER = path.resolve("db/migrations");

const hasTable = (sqlite: Sqlite, name: string): boolean =>
  sqlite.prepare("select 1 from sqlite_master where type = 'table' and name = ?").get(name) !== undefined;

function countRows(sqlite: Sqlite): Map<string, number> {
  const counts = new Map<string, number>();
  for (const table of capturedTables(sqlite)) {
    const row = sqlite.prepare(`select count(*) as n from "${table}"`).get() as { n: number };
    counts.set(table, row.n);
  }
  return counts;
}

/** Keeps each captured row as JSON, so that what a migration changed can be told apart afterwards. */
function keepRows(sqlite: Sqlite): void {
  sqlite.exec(
    "create temp table row_before (table_name text, row_key text, row text, primary key (table_name, row_key))",
  );
  for (const table of capturedTables(sqlite)) {
    const [key, row] = [rowKeySql(sqlite, table, "t"), rowJsonSql(sqlite, table, "t")];
    sqlite.exec(`insert into row_before select '${table}', ${key}, ${row} from "${table}" t`);
  }
}

/** Writes into the history what the migration changed in each row (a new column is a change of every row). */
function captureDifferences(sqlite: Sqlite): void {
  const into = "insert into audit_change (entry_id, table_name, row_key, operation, before, after)";
  for (const table of capturedTables(sqlite)) {
    const [key, row] = [rowKeySql(sqlite, table, "t"), rowJsonSql(sqlite, table, "t")];
    sqlite.exec(
      `${into} select current_entry(), '${table}', ${key}, 'migrate', b.row, ${row} from "${table}" t ` +
        `left join row_before b on b.table_name = '${table}' and b.row_key = ${key} where b.row is not ${row}`,
    );
    sqlite.exec(
      `${into} select current_entry(), '${table}', b.row_key, 'delete', b.row, null from row_before b ` +
        `where b.table_name = '${table}' and not exists (select 1 from "${table}" t where ${key} = b.row_key)`,
    );
  }
  sqlite.exec(
    `${into} select current_entry(), b.table_name, b.row_key, 'delete', b.row, null from row_before b ` +
      "where not exists (select 1 from sqlite_master m where m.type = 'table' and m.name = b.table_name)",
  );
}

function mustKeepChildren(sqlite: Sqlite, before: Map<string, number>): void {
  const broken = sqlite.pragma("foreign_key_check") as unknown[];
  invariant(broken.length === 0, `the migration left ${broken.length} rows that point to nothing`);
  for (const [table, count] of countRows(sqlite)) {
    const kept = before.get(table);
    invariant(kept === undefined || kept === count, `the migration changed the number of rows of ${table}`);
  }
}

/**
 * Brings the file to the newest schema, puts the capture triggers back, and seals what changed as an entry of its own with
 * the schema's hash before and after. Foreign keys are off meanwhile (a rebuilt table would take its child rows along) and
 * checked after. Does nothing, and writes nothing, where the schema is up to date.
 */
export function migrateDatabase(db: Database, clock: Clock, folder = FOLDER): { migrated: boolean } {
  const { sqlite, orm } = db.writer;
  const before = schemaHash(sqlite);
  const isNew = !hasTable(sqlite, "audit_entry");
  const counts = isNew ? new Map<string, number>() : countRows(sqlite);
  sqlite.pragma("foreign_keys = OFF");
  sqlite.exec("drop table if exists temp.row_before");
  if (isNew) sqlite.exec("create temp table row_before (table_name text, row_key text, row text)");
  else keepRows(sqlite);
  try {
    removeCapture(sqlite);
    migrate(orm, { migrationsFolder: folder });
    mustKeepChildren(sqlite, counts);
  } finally {
    installCaptureWhere(sqlite);
    sqlite.pragma("foreign_keys = ON");
  }
  const after = schemaHash(sqlite);
  const migrated = before !== after;
  if (migrated) sealMigration(db, clock.now(), { before: isNew ? null : before, after });
  sqlite.exec("drop table if exists temp.row_before");
  return { migrated };
}

function installCaptureWhere(sqlite: Sqlite): void {
  if (hasTable(sqlite, "audit_entry")) installCapture(sqlite);
}

function sealMigration(db: Database, at: number, hashes: { before: string | null; after: string }): void {
  sealOutsideCommand(
    db,
    at,
    auditEvents.migrated.verb,
    { schemaBefore: hashes.before, schemaAfter: hashes.after },
    () => captureDifferences(db.writer.sqlite),
  );
}

/** An entry that no person's command made: a migration or a restore. */
export function sealOutsideCommand(
  db: Database,
  at: number,
  verb: string,
  payload: Record<string, unknown>,
  write: () => void,
): void {
  const { sqlite } = db.writer;
  sqlite.exec("begin immediate");
  try {
    const head = chainHead(sqlite);
    db.writer.openEntry = head.id + 1;
    write();
    sealEntry(sqlite, {
      id: head.id + 1,
      at,
      verb,
      version: 1,
      actorKind: SYSTEM_ACTOR.kind,
      actorId: null,
      roles: "[]",
      subjectType: "database",
      subjectId: null,
      reason: null,
      payload: JSON.stringify(payload, Object.keys(payload).toSorted()),
      requestId: null,
      prevHash: head.hash,
    });
    sqlite.exec("commit");
  } catch (cause) {
    if (sqlite.inTransaction) sqlite.exec("rollback");
    throw cause;
  } finally {
    db.writer.openEntry = null;
  }
}
