import type { QueuedWork } from "@/modules/audit";

/** The tasks of this module by name, for commands that ask for them. */
export const CHECK_IMPORT: QueuedWork<{ importId: number }> = { verb: "checkImport" };
export const COMMIT_IMPORT: QueuedWork<{ importId: number }> = { verb: "commitImport" };
