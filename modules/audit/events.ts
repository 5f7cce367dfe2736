import { defineEvents } from "./model";

export const auditEvents = defineEvents({
  migrated: ["database.migrated", 1, "brought the database to a new schema"],
  restored: ["database.restored", 1, "restored the database from a backup"],
  checkpointMade: ["history.checkpoint-made", 1, "sent a checkpoint of the history out of the machine"],
});
