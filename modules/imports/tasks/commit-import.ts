import { performance } from "node:perf_hooks";
import { and, asc, eq, gt } from "drizzle-orm";
import { z } from "zod";
import type { Database, Orm } from "@/db/database";
import { invariant } from "@/lib/invariant";
import { Problem } from "@/lib/problem";
import { type Actor, SYSTEM_ACTOR } from "@/modules/access";
import { defineTask, runCommand, upkeep } from "@/modules/audit";
import { actorOf } from "@/modules/identity";
import { equalFinder, growDelivery, type OfferedReading } from "@/modules/measurements";
import type { Qualifier } from "@/modules/measurements/model";
import { failImport } from "../commands/check-import";
import { finishCommit } from "../commands/commit-import";
import type { StatusCounts } from "../model";
import { breathe, findProgress, type ProgressRecord, saveProgress } from "../progress";
import { getImportRecord, type ImportRecord } from "../records";
import { Pace } from "../rules/pace";
import { stagedRow } from "../schema";
import { COMMIT_IMPORT } from "../work";
import type { TaskDeps } from "./check-import";

const LEAST_ROWS = 32;
const MOST_ROWS = 400;
/** How often it is written down how far the commit is; what was brought in since is recognised by its UUIDs. */
const NOTE_MS = 500;

type Staged = typeof stagedRow.$inferSelect;

/** The next accepted readings that are not brought in yet, in the order of the file. */
function nextRows(db: Orm, importId: number, afterId: number, limit: number): Staged[] {
  return db
    .select()
    .from(stagedRow)
    .where(
      and(eq(stagedRow.importId, importId), eq(stagedRow.outcome, "accepted"), gt(stagedRow.id, afterId)),
    )
    .orderBy(asc(stagedRow.id))
    .limit(limit)
    .all();
}

function offeredBy({ pointId, parameterId, takenAt, value, qualifier, answer }: Staged): OfferedReading {
  invariant(pointId !== null && parameterId !== null && takenAt !== null, "an accepted row is resolved");
  return { pointId, parameterId, takenAt, value, qualifier: (qualifier ?? "") as Qualifier, answer };
}

/** A reading as it is delivered. Whoever commits has seen what is off and confirms it. */
function deliveredBy({ readingUuid, candidate }: Staged) {
  invariant(readingUuid !== null && candidate.reading !== null, "an accepted row is resolved");
  return { uuid: readingUuid, ...candidate.reading, confirmed: true };
}

/** Counts a slice as brought in, and as duplicates what somebody else has brought in since the check. */
function counted(
  progress: ProgressRecord,
  slice: readonly Staged[],
  known: readonly Staged[],
  at: number,
): ProgressRecord {
  const statusCounts = { ...progress.statusCounts };
  for (const row of known) statusCounts[row.expectedStatus as keyof StatusCounts] -= 1;
  return {
    ...progress,
    committedId: slice.at(-1)?.id ?? progress.committedId,
    committed: progress.committed + slice.length - known.length,
    accepted: progress.accepted - known.length,
    duplicate: progress.duplicate + known.length,
    statusCounts,
    updatedAt: at,
  };
}

/** Writes down how far the commit is. */
function note(db: Database, progress: ProgressRecord, known: readonly Staged[]): void {
  upkeep(db, (orm) => {
    for (const row of known) {
      orm
        .update(stagedRow)
        .set({ outcome: "duplicate", problems: [SINCE_CHECK] })
        .where(eq(stagedRow.id, row.id))
        .run();
    }
    saveProgress(orm, progress);
  });
}

const SINCE_CHECK = {
  columnName: null,
  code: "already-in-force" as const,
  reason: "This very reading has been stored by somebody else since the file was checked.",
  mend: "Nothing needs to be done: it is left out.",
  text: null,
};

async function bringIn(deps: TaskDeps, row: ImportRecord, actor: Actor, signal?: AbortSignal): Promise<void> {
  const { db, clock } = deps;
  const { deliveryId } = row;
  invariant(deliveryId !== null, "an import that is being committed has a delivery");
  const known = findProgress(db.reader.orm, row.id);
  invariant(known, "an import that is being committed has been checked");
  let progress = known;
  const findEqual = equalFinder(db.reader.orm);
  const pace = new Pace(LEAST_ROWS, MOST_ROWS);
  let notedAt = performance.now();
  const run = { clock, requestId: `import:${row.code}` };
  for (;;) {
    if (signal?.aborted) throw signal.reason;
    const slice = nextRows(db.reader.orm, row.id, progress.committedId, pace.size);
    if (slice.length === 0) break;
    const duplicates = slice.filter((each) => findEqual(offeredBy(each)) !== null);
    const fresh = slice.filter((each) => !duplicates.includes(each));
    const started = performance.now();
    if (fresh.length > 0)
      runCommand(db, actor, growDelivery, { deliveryId, readings: fresh.map(deliveredBy) }, run);
    pace.took(performance.now() - started, slice.length);
    await breathe();
    progress = counted(progress, slice, duplicates, clock.now());
    if (duplicates.length > 0 || performance.now() - notedAt > NOTE_MS) {
      note(db, progress, duplicates);
      notedAt = performance.now();
      await breathe();
    }
  }
  note(db, progress, []);
  runCommand(db, actor, finishCommit, { importId: row.id }, run);
}

/**
 * Brings in what a check accepted, slice by slice, and makes it visible at one moment. Begun again after an interruption it
 * goes on where it was; a slice that had been brought in without being counted adds nothing twice, by its UUIDs.
 */
export async function commitReadings(
  deps: TaskDeps,
  { importId }: { importId: number },
  options: { signal?: AbortSignal } = {},
): Promise<void> {
  const { db, clock } = deps;
  const row = getImportRecord(db.reader.orm, importId);
  if (row.state !== "committing" || row.committedBy === null) return;
  const actor = actorOf(db.reader.orm, row.committedBy, clock.now());
  try {
    if (!actor) throw new Problem("not-allowed", "Whoever committed the import may not import any more.");
    await bringIn(deps, row, actor, options.signal);
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    const problem = `${error.message} Nothing of this import is visible. Check it again, then commit it once more.`;
    const input = { importId, problem };
    runCommand(db, SYSTEM_ACTOR, failImport, input, { clock, requestId: `import:${row.code}` });
  }
}

export const commitImport = defineTask({
  verb: COMMIT_IMPORT.verb,
  lane: "files",
  input: z.strictObject({ importId: z.number().int() }),
  perform: (deps, input) => commitReadings(deps, input),
});
