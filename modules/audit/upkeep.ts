import type { Database, Orm } from "@/db/database";

/**
 * Writes to tables that are exempt from the history (sessions, throttle, jobs, staging, mail in transit).
 * No entry is open, so a write to any other table fails by its trigger.
 */
export function upkeep<R>(db: Database, work: (orm: Orm) => R): R {
  const { sqlite, orm } = db.writer;
  sqlite.exec("begin immediate");
  try {
    const result = work(orm);
    sqlite.exec("commit");
    return result;
  } catch (cause) {
    if (sqlite.inTransaction) sqlite.exec("rollback");
    throw cause;
  }
}
