import "server-only";
import type { ReactionTable, WorkTable } from "@/modules/audit";
import { deliverMail } from "@/modules/notifications";

/** Event → the work that follows it after COMMIT. The only way in which something goes up the floors. */
export const REACTIONS: ReactionTable = {};

/** Everything that the job runner can carry out by name. */
export const WORK: WorkTable = [deliverMail];
