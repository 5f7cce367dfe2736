import "server-only";

export { importsMay } from "./abilities";
export {
  answerQuestions,
  discardImport,
  failImport,
  recordCheck,
  recordSurvey,
  startCheck,
} from "./commands/check-import";
export { finishCommit, startCommit, withdrawImport } from "./commands/commit-import";
export { registerUpload } from "./commands/register-upload";
export { importsEvents } from "./events";
export { getImport, getOriginal } from "./queries/get-import";
export { listImports } from "./queries/list-imports";
export { listStagedRows } from "./queries/list-staged-rows";
export { receiveUpload } from "./receive-upload";
export { rejectLine, rejectsHead, templateCsv } from "./rules/rejects-csv";
export { checkFile, checkImport } from "./tasks/check-import";
export { commitImport, commitReadings } from "./tasks/commit-import";
