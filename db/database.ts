import { mkdirSync } from "node:fs";
import path from "node:path";
import BetterSqlite3 from "better-sqlite3";
import { type BetterSQLite3Database, drizzle } from "drizzle-orm/better-sqlite3";
import { settings } from "@/lib/env";
import { invariant } from "@/lib/invariant";
import { processSingleton } from "@/lib/process-singleton";

/** Drizzle over a connection; the same type for the writer and a reader, so that a query can be asked inside a command. */
export type Orm = BetterSQLite3Database<Record<string, never>>;
export type Sqlite = BetterSqlite3.Database;

const SYNCHRONOUS_FULL = 2;
const CACHE_KIB = 64 * 1024;
const BUSY_MS = 15_000;

/** One SQLite file: one connection that writes, one that only reads. */
export type Database = {
  readonly file: string;
  /** The writing connection. Only modules/audit uses it (the floors see to that). */
  readonly writer: { readonly sqlite: Sqlite; readonly orm: Orm; openEntry: number | null };
  /** The reading connection; SQLite itself refuses writes on it. */
  readonly reader: { readonly sqlite: Sqlite; readonly orm: Orm };
  close(): void;
};

function setPragmas(sqlite: Sqlite): void {
  sqlite.pragma(`busy_timeout = ${BUSY_MS}`);
  sqlite.pragma("foreign_keys = ON");
  sqlite.pragma("recursive_triggers = ON");
  sqlite.pragma("synchronous = FULL");
  sqlite.pragma(`cache_size = -${CACHE_KIB}`);
  sqlite.pragma("temp_store = MEMORY");
}

/**
 * Opens (or creates) the database file.
 * The function `current_entry()` exists on the writing connection alone and raises when no command is open, so that the
 * capture triggers refuse a write outside a command, and any write by another tool.
 */
export function openDatabase(file: string): Database {
  mkdirSync(path.dirname(file), { recursive: true });
  const sqlite = new BetterSqlite3(file);
  sqlite.pragma("journal_mode = WAL");
  setPragmas(sqlite);
  const writer = { sqlite, orm: drizzle({ client: sqlite }), openEntry: null as number | null };
  sqlite.function("current_entry", { deterministic: false }, () => {
    if (writer.openEntry === null) throw new Error("a write outside a command: no history entry is open");
    return writer.openEntry;
  });
  let reading: { sqlite: Sqlite; orm: Orm } | undefined;
  return {
    file,
    writer,
    get reader() {
      reading ??= openReader(file);
      return reading;
    },
    close() {
      reading?.sqlite.close();
      sqlite.close();
    },
  };
}

function openReader(file: string): { sqlite: Sqlite; orm: Orm } {
  const sqlite = new BetterSqlite3(file, { readonly: true });
  setPragmas(sqlite);
  sqlite.pragma("query_only = ON");
  return { sqlite, orm: drizzle({ client: sqlite }) };
}

/** SQLite answers `synchronous` rightly only after a first commit (it may fall to NORMAL then): read it back and insist. */
export function assertDurable(sqlite: Sqlite): void {
  const level = Number(sqlite.pragma("synchronous", { simple: true }));
  invariant(level === SYNCHRONOUS_FULL, `synchronous is ${level}, not FULL: a power cut could lose commits`);
  invariant(Number(sqlite.pragma("foreign_keys", { simple: true })) === 1, "foreign keys are off");
  invariant(
    Number(sqlite.pragma("recursive_triggers", { simple: true })) === 1,
    "recursive triggers are off",
  );
}

/** The database of this process, opened at the first use (a build loads route files without one). */
export function database(): Database {
  return processSingleton("database", () => openDatabase(settings().databaseFile));
}
