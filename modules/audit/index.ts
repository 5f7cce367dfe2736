import "server-only";

export { auditMay } from "./abilities";
export { backUpDatabase, backUpTask, fileSha256 } from "./backup";
export { capturedTables, installCapture, schemaHash } from "./capture";
export { headOfFile, mergeWriteAheadLog, verifyFile } from "./database-files";
export { type Command, type CommandContext, type CommandOutcome, defineCommand } from "./define-command";
export { ask, defineQuery, type Query, type QueryContext } from "./define-query";
export { auditEvents } from "./events";
export { type Reaction, type ReactionTable, useReactions } from "./jobs/queue";
export { insertJob } from "./jobs/queue";
export { defineTask, JobRunner, type Task, type WorkTable } from "./jobs/runner";
export { migrateDatabase, sealOutsideCommand } from "./migrate";
export { parseInput } from "./parse-input";
export { filterCondition, getEntry, getRecordHistory, historyFilter, listEntries, listVerbs } from "./queries/list-entries";
export { type Answer, runCommand, type RunOptions } from "./run-command";
export { chainHead } from "./seal";
export { upkeep } from "./upkeep";
export { type Finding, type Verification, verifyHistory } from "./verify";
