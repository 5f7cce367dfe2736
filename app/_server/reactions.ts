import "server-only";
import { backUpTask, type ReactionTable, verifyCopyTask, type WorkTable } from "@/modules/audit";
import { checkImport, commitImport } from "@/modules/imports";
import { judgeSeriesAgain } from "@/modules/measurements";
import { deliverMail } from "@/modules/notifications";
import { dailyCheckpoint } from "@/modules/signoff";

/** Event → the work that follows it after COMMIT. The only way in which something goes up the floors. */
export const REACTIONS: ReactionTable = {};

/** Everything that the job runner can carry out by name. */
export const WORK: WorkTable = [
  deliverMail,
  dailyCheckpoint,
  backUpTask,
  verifyCopyTask,
  judgeSeriesAgain,
  checkImport,
  commitImport,
];
