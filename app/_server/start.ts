import "server-only";
import { database } from "@/db/database";
import { markServing } from "@/db/server-mark";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { log } from "@/lib/log";
import { processSingleton } from "@/lib/process-singleton";
import { clearArriving } from "@/lib/storage";
import { JobRunner, migrateDatabase } from "@/modules/audit";
import { scheduleCheckpoint } from "@/modules/signoff";
import { WORK } from "./reactions";
import { prepareRuntime } from "./runtime";

/** Start-up of the server: settings (refuses unsafe ones), the newest schema, the job runner. */
export function start(): void {
  const { databaseFile, dataFolder, STILLWELL_JOBS } = settings();
  const { migrated } = migrateDatabase(database(), systemClock);
  prepareRuntime();
  markServing(dataFolder);
  clearArriving(dataFolder).catch((err: unknown) =>
    log().warn({ err }, "what was arriving could not be cleared"),
  );
  if (STILLWELL_JOBS) {
    scheduleCheckpoint(database(), systemClock);
    processSingleton("jobs", () => {
      const runner = new JobRunner(database(), systemClock, WORK);
      runner.start();
      return runner;
    });
  }
  log().info({ databaseFile, migrated }, "started");
}
