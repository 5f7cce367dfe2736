import "server-only";
import { database } from "@/db/database";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { log } from "@/lib/log";
import { processSingleton } from "@/lib/process-singleton";
import { JobRunner, migrateDatabase } from "@/modules/audit";
import { WORK } from "./reactions";
import { prepareRuntime } from "./runtime";

/** Start-up of the server: settings (refuses unsafe ones), the newest schema, the job runner. */
export function start(): void {
  const { databaseFile, STILLWELL_JOBS } = settings();
  const { migrated } = migrateDatabase(database(), systemClock);
  prepareRuntime();
  if (STILLWELL_JOBS) {
    processSingleton("jobs", () => {
      const runner = new JobRunner(database(), systemClock, WORK);
      runner.start();
      return runner;
    });
  }
  log().info({ databaseFile, migrated }, "started");
}
