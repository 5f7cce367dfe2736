import "server-only";

export { auditMay } from "./abilities";
export { backUpDatabase, backUpTask, copyDatabase, fileSha256 } from "./backup";
export { capturedTables, installCapture, schemaHash } from "./capture";
export { askForBackup } from "./commands/ask-for-backup";
export { askForVerification } from "./commands/ask-for-verification";
export { retryJob } from "./commands/retry-job";
export { headOfFile, mergeWriteAheadLog, verifyFile } from "./database-files";
export {
  type Command,
  type CommandContext,
  type CommandOutcome,
  defineCommand,
  type QueuedWork,
} from "./define-command";
export { ask, defineQuery, type Query, type QueryContext } from "./define-query";
export { auditEvents } from "./events";
export { insertJob, type Reaction, type ReactionTable, scheduleOnce, useReactions } from "./jobs/queue";
export { defineTask, JobRunner, type Task, type WorkTable } from "./jobs/runner";
export { migrateDatabase, sealOutsideCommand } from "./migrate";
export { mustBeAllowed } from "./must-be-allowed";
export { parseInput } from "./parse-input";
export { type EntryWithChanges, getEntry } from "./queries/get-entry";
export { getHealth, type Health } from "./queries/get-health";
export {
  getRecordAt,
  getRecordHistory,
  type RecordAt,
  type RecordHistory,
} from "./queries/get-record-history";
export { getVerification, type VerificationState } from "./queries/get-verification";
export { type Backups, listBackups } from "./queries/list-backups";
export {
  filterCondition,
  type HistoryFilter,
  historyFilter,
  listEntries,
  listSubjectTypes,
  listVerbs,
} from "./queries/list-entries";
export { listTroubledJobs } from "./queries/list-troubled-jobs";
export { nameRecords } from "./queries/name-records";
export { type RecordGate, type RecordGates, useRecordGates } from "./record-gates";
export { type Answer, type RunOptions, runCommand } from "./run-command";
export { chainHead } from "./seal";
export { upkeep } from "./upkeep";
export { type Finding, type Verification, verifyHistory } from "./verify";
export { verifyCopyTask } from "./verify-copy";
