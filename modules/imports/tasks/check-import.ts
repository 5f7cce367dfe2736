import { performance } from "node:perf_hooks";
import { z } from "zod";
import type { Database } from "@/db/database";
import type { Clock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { diskStore } from "@/lib/storage";
import { SYSTEM_ACTOR } from "@/modules/access";
import { defineTask, runCommand } from "@/modules/audit";
import { actorOf } from "@/modules/identity";
import { failImport, recordCheck, recordSurvey } from "../commands/check-import";
import { knownParameters, readDirectory } from "../directory";
import { breathe, type ProgressRecord, resumeCheck, showShare } from "../progress";
import type { ReaderBatch, ReaderRequest } from "../reader/messages";
import { openReader, type ReaderOptions, surveyFile } from "../reader/open-reader";
import { getFileRecord, getImportRecord, type ImportRecord } from "../records";
import { RowDrafter } from "../rules/draft-rows";
import { settledAnswers } from "../rules/file-questions";
import { Pace } from "../rules/pace";
import { RefusedFile } from "../rules/refused-file";
import { CHECK_IMPORT } from "../work";
import { Staging } from "./staging";

export type TaskDeps = { db: Database; clock: Clock };

const LEAST_ROWS = 64;
const MOST_ROWS = 500;

/** A refusal as it is shown: what is wrong and how to mend it. */
const sentenceOf = ({ refusal }: RefusedFile): string => `${refusal.reason} ${refusal.mend}`;

async function requestFor(db: Database, row: ImportRecord): Promise<Omit<ReaderRequest, "mode" | "answers">> {
  const { storedPath } = getFileRecord(db.reader.orm, row.fileId);
  return {
    path: await diskStore(settings().dataFolder).localPath(storedPath),
    name: row.fileName,
    zone: settings().STILLWELL_ZONE,
    parameters: knownParameters(db.reader.orm),
    defaults: row.defaults,
    ...(row.sheet === null ? {} : { sheet: row.sheet }),
  };
}

const stillStands = (db: Database, { id, state, checkRun }: ImportRecord): boolean => {
  const now = getImportRecord(db.reader.orm, id);
  return now.state === state && now.checkRun === checkRun;
};

/** Looks through the whole file for what must be asked. */
async function survey({ db, clock }: TaskDeps, row: ImportRecord, options: ReaderOptions): Promise<void> {
  const { header, report } = await surveyFile(await requestFor(db, row), {
    ...options,
    onProgress: (share, rows) => showShare(db, row.id, share, rows, clock.now()),
  });
  if (report.survey === null || !stillStands(db, row)) return;
  runCommand(
    db,
    SYSTEM_ACTOR,
    recordSurvey,
    { importId: row.id, header, survey: report.survey },
    { clock, requestId: `import:${row.code}` },
  );
}

/** Checks every row, from behind the last one that was staged whole. */
async function check(deps: TaskDeps, row: ImportRecord, options: ReaderOptions): Promise<void> {
  const { db, clock } = deps;
  const actor = actorOf(db.reader.orm, row.uploadedBy, clock.now());
  if (!actor)
    return fail(deps, row, "Whoever uploaded the file may not import any more. Upload it yourself.");
  let progress = await resumeCheck(db, row.id, row.checkRun, clock.now());
  const opened = await openReader(
    {
      ...(await requestFor(db, row)),
      mode: "map",
      answers: row.survey === null ? row.answers : settledAnswers(row.survey, row.answers),
      ...(progress.lastLine > 0 ? { afterLine: progress.lastLine } : {}),
    },
    options,
  );
  const { columnMap, serialEpoch } = opened.header;
  const directory = readDirectory(db.reader.orm, actor, clock.now());
  const { sha256 } = opened.header;
  const of = { importId: row.id, importCode: row.code, checkRun: row.checkRun, sha256 };
  const staging = new Staging(db, { ...of, columns: columnMap.columns, directory });
  const drafter = new RowDrafter(columnMap, serialEpoch);
  const pace = new Pace(LEAST_ROWS, MOST_ROWS);
  try {
    for await (const batch of opened.batches) {
      if (!stillStands(db, row)) return;
      progress = await stageBatch(staging, drafter, batch, progress, pace, clock);
      // An import that was stopped between two batches goes on behind the one that is staged.
      if (options.signal?.aborted) throw options.signal.reason;
    }
  } finally {
    await opened.close();
  }
  if (!stillStands(db, row)) return;
  const { accepted, duplicate, refused, statusCounts } = progress;
  const input = { importId: row.id, checkRun: row.checkRun, accepted, duplicate, refused, statusCounts };
  runCommand(db, SYSTEM_ACTOR, recordCheck, input, { clock, requestId: `import:${row.code}` });
}

/** Stages a batch in slices; the lines of the batch count as done with its last slice. */
async function stageBatch(
  staging: Staging,
  drafter: RowDrafter,
  batch: ReaderBatch,
  progress: ProgressRecord,
  pace: Pace,
  clock: Clock,
): Promise<ProgressRecord> {
  const drafts = drafter.draft(batch);
  const { share, lastLine } = batch;
  const rowsRead = progress.rowsRead + batch.rowsRead;
  let next = progress;
  let from = 0;
  do {
    const slice = drafts.slice(from, from + pace.size);
    from += slice.length;
    const isLast = from >= drafts.length;
    const started = performance.now();
    next = staging.stage(slice, isLast ? { ...next, share, lastLine, rowsRead } : next, clock.now());
    pace.took(performance.now() - started, slice.length);
    await breathe();
  } while (from < drafts.length);
  return next;
}

function fail({ db, clock }: TaskDeps, row: ImportRecord, problem: string): void {
  if (!stillStands(db, row)) return;
  const input = { importId: row.id, problem };
  runCommand(db, SYSTEM_ACTOR, failImport, input, { clock, requestId: `import:${row.code}` });
}

/**
 * Looks a file through and checks its rows; begun again after an interruption it goes on where it was. A file that cannot
 * be read ends the import with a sentence.
 */
export async function checkFile(
  deps: TaskDeps,
  { importId }: { importId: number },
  options: ReaderOptions = {},
): Promise<void> {
  const row = getImportRecord(deps.db.reader.orm, importId);
  try {
    if (row.state === "uploaded") await survey(deps, row, options);
    const surveyed = getImportRecord(deps.db.reader.orm, importId);
    if (surveyed.state === "checking") await check(deps, surveyed, options);
  } catch (error) {
    if (!(error instanceof RefusedFile) || error.refusal.code === "stopped") throw error;
    fail(deps, getImportRecord(deps.db.reader.orm, importId), sentenceOf(error));
  }
}

export const checkImport = defineTask({
  verb: CHECK_IMPORT.verb,
  lane: "files",
  input: z.strictObject({ importId: z.number().int() }),
  perform: (deps, input) => checkFile(deps, input),
});
