import { defineEvents } from "./model";

export const auditEvents = defineEvents({
  migrated: ["database.migrated", 1, "brought the database to a new schema"],
  restored: ["database.restored", 1, "restored the database from a backup"],
  backedUp: ["database.backed-up", 1, "made a backup of the database"],
  backupAsked: ["database.backup-asked", 1, "asked for a backup"],
  jobRetried: ["job.retried", 1, "had failed work tried again"],
  verificationAsked: ["history.verification-asked", 1, "asked for a check of the whole history"],
  verified: ["history.verified", 1, "checked the whole history"],
  checkpointMade: ["history.checkpoint-made", 1, "sent a checkpoint of the history out of the machine"],
});
