import BetterSqlite3 from "better-sqlite3";
import type { Sqlite } from "@/db/database";
import type { Checkpoint } from "./model";
import { chainHead } from "./seal";
import { type Verification, verifyHistory } from "./verify";

function reading<R>(file: string, work: (sqlite: Sqlite) => R): R {
  const sqlite = new BetterSqlite3(file, { readonly: true });
  try {
    return work(sqlite);
  } finally {
    sqlite.close();
  }
}

/** Checks the history in a database file that nobody else needs to serve. */
export function verifyFile(file: string, checkpoints: readonly Checkpoint[] = []): Verification {
  return reading(file, (sqlite) => verifyHistory(sqlite, checkpoints));
}

/** The newest entry in a database file. */
export function headOfFile(file: string): { id: number; hash: string } {
  return reading(file, chainHead);
}

/** Whether SQLite finds the file sound ("ok"), or what it finds. */
export function quickCheck(file: string): string {
  return reading(file, (sqlite) => String(sqlite.pragma("quick_check", { simple: true })));
}

/** Brings what lies in the write-ahead log into the file itself, so that the file alone is the database. */
export function mergeWriteAheadLog(file: string): void {
  const sqlite = new BetterSqlite3(file);
  sqlite.pragma("wal_checkpoint(TRUNCATE)");
  sqlite.close();
}
