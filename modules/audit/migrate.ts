import path from "node:path";
import { readMigrationFiles } from "drizzle-orm/migrator";
import type { Database, Sqlite } from "@/db/database";
import type { Clock } from "@/lib/clock";
import { invariant } from "@/lib/invariant";
import { SYSTEM_ACTOR } from "@/modules/access";
import { capturedTables, installCapture, removeCapture, rowJsonSql, rowKeySql, schemaHash } from "./capture";
import { auditEvents } from "./events";
import { chainHead, sealEntry } from "./seal";

const FOLDER = path.resolve("db/migrations");
const REMEMBERED = "__drizzle_migrations";

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

type Pending = ReturnType<typeof readMigrationFiles>;

/** The migrations that this file has not seen; the table that remembers them is the one drizzle-kit's migrator keeps. */
function pendingMigrations(sqlite: Sqlite, folder: string): Pending {
  const all = readMigrationFiles({ migrationsFolder: folder });
  if (!hasTable(sqlite, REMEMBERED)) return all;
  const row = sqlite.prepare(`select max(created_at) as newest from ${REMEMBERED}`).get();
  const newest = Number((row as { newest: number | null }).newest ?? 0);
  return all.filter((migration) => migration.folderMillis > newest);
}

function apply(sqlite: Sqlite, migrations: Pending): void {
  sqlite.exec(
    `create table if not exists ${REMEMBERED} (id SERIAL PRIMARY KEY, hash text NOT NULL, created_at numeric)`,
  );
  const remember = sqlite.prepare(`insert into ${REMEMBERED} (hash, created_at) values (?, ?)`);
  for (const { sql: statements, hash, folderMillis } of migrations) {
    for (const statement of statements) sqlite.exec(statement);
    remember.run(hash, folderMillis);
  }
}

/**
 * Brings the file to the newest schema, puts the capture triggers back, and seals what changed as an entry of its own with
 * the schema's hash before and after. All of it is one transaction: a migration that fails, or that loses a row or leaves
 * one pointing to nothing, leaves the file as it was. Foreign keys are off meanwhile (a rebuilt table would take its child
 * rows along) and checked before COMMIT. Does nothing, and writes nothing, where schema and triggers are as they should be.
 * @throws Error naming what went wrong; nothing has changed then
 */
export function migrateDatabase(db: Database, clock: Clock, folder = FOLDER): { migrated: boolean } {
  const { sqlite } = db.writer;
  const pending = pendingMigrations(sqlite, folder);
  sqlite.pragma("foreign_keys = OFF");
  // A table that views speak of can be rebuilt only so.
  sqlite.pragma("legacy_alter_table = ON");
  sqlite.exec("drop table if exists temp.row_before");
  sqlite.exec("begin immediate");
  try {
    const migrated = bringUpToDate(db, clock.now(), pending);
    sqlite.exec("commit");
    return { migrated };
  } catch (cause) {
    if (sqlite.inTransaction) sqlite.exec("rollback");
    throw cause;
  } finally {
    sqlite.pragma("legacy_alter_table = OFF");
    sqlite.pragma("foreign_keys = ON");
    sqlite.exec("drop table if exists temp.row_before");
  }
}

/** Inside the transaction: the migrations, the triggers, the checks, and the entry that tells of them. */
function bringUpToDate(db: Database, at: number, pending: Pending): boolean {
  const { sqlite } = db.writer;
  const before = schemaHash(sqlite);
  const isNew = !hasTable(sqlite, "audit_entry");
  const comparesRows = !isNew && pending.length > 0;
  const counts = comparesRows ? countRows(sqlite) : new Map<string, number>();
  if (comparesRows) keepRows(sqlite);
  removeCapture(sqlite);
  apply(sqlite, pending);
  mustKeepChildren(sqlite, counts);
  installCapture(sqlite);
  const after = schemaHash(sqlite);
  if (before === after) return false;
  const payload = { schemaBefore: isNew ? null : before, schemaAfter: after };
  sealOpenly(db, at, auditEvents.migrated.verb, payload, () => {
    if (comparesRows) captureDifferences(sqlite);
  });
  return true;
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
    sealOpenly(db, at, verb, payload, write);
    sqlite.exec("commit");
  } catch (cause) {
    if (sqlite.inTransaction) sqlite.exec("rollback");
    throw cause;
  }
}

/** The same inside a transaction that is open. */
function sealOpenly(
  db: Database,
  at: number,
  verb: string,
  payload: Record<string, unknown>,
  write: () => void,
): void {
  const { sqlite } = db.writer;
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
  } finally {
    db.writer.openEntry = null;
  }
}
