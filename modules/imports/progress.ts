import { and, eq, gt, inArray } from "drizzle-orm";
import type { Database, Orm } from "@/db/database";
import { upkeep } from "@/modules/audit";
import { NO_STATUS_COUNTS } from "./model";
import { importProgress, stagedRow } from "./schema";

export type ProgressRecord = typeof importProgress.$inferSelect;

/** Staged rows thrown away in one slice. */
const CLEAR_ROWS = 1000;

export const breathe = (): Promise<void> => new Promise((resolve) => setImmediate(resolve));

export function findProgress(db: Orm, importId: number): ProgressRecord | null {
  return db.select().from(importProgress).where(eq(importProgress.importId, importId)).get() ?? null;
}

const nothingYet = (importId: number, checkRun: number, at: number): ProgressRecord => ({
  importId,
  checkRun,
  lastLine: 0,
  share: 0,
  rowsRead: 0,
  accepted: 0,
  duplicate: 0,
  refused: 0,
  statusCounts: NO_STATUS_COUNTS,
  committedId: 0,
  committed: 0,
  updatedAt: at,
});

/** Writes how far the work is; inside `upkeep`. */
export function saveProgress(db: Orm, progress: ProgressRecord): void {
  const { importId: _key, ...values } = progress;
  db.insert(importProgress)
    .values(progress)
    .onConflictDoUpdate({ target: importProgress.importId, set: values })
    .run();
}

/** Shows how much of a file has been looked through. */
export function showShare(db: Database, importId: number, share: number, rowsRead: number, at: number): void {
  upkeep(db, (orm) => {
    const known = findProgress(orm, importId) ?? nothingYet(importId, 0, at);
    saveProgress(orm, { ...known, share, rowsRead, updatedAt: at });
  });
}

/**
 * Where the check of an import goes on: behind the last line that was staged whole. What was staged of an earlier check,
 * or of a line that was interrupted, is thrown away first, slice by slice.
 */
export async function resumeCheck(
  db: Database,
  importId: number,
  checkRun: number,
  at: number,
): Promise<ProgressRecord> {
  const known = findProgress(db.reader.orm, importId);
  const progress = known?.checkRun === checkRun ? known : nothingYet(importId, checkRun, at);
  const beyond = and(eq(stagedRow.importId, importId), gt(stagedRow.line, progress.lastLine));
  for (;;) {
    const removed = upkeep(db, (orm) => {
      const ids = orm.select({ id: stagedRow.id }).from(stagedRow).where(beyond).limit(CLEAR_ROWS).all();
      if (ids.length === 0) return 0;
      const wanted = ids.map((row) => row.id);
      return orm.delete(stagedRow).where(inArray(stagedRow.id, wanted)).run().changes;
    });
    if (removed === 0) break;
    await breathe();
  }
  upkeep(db, (orm) => saveProgress(orm, progress));
  return progress;
}
