import path from "node:path";
import { setTimeout as wait } from "node:timers/promises";
import { openDatabase } from "@/db/database";
import { servingProcess } from "@/db/server-mark";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { backUpDatabase, backUpTask, insertJob, upkeep } from "@/modules/audit";

/** `npm run backup -- FILE`: a copy of the database while it is in use. */
async function main(): Promise<void> {
  const [given] = process.argv.slice(2);
  if (!given) throw new Error("Say where to: npm run backup -- FILE");
  const target = path.resolve(given);
  const { dataFolder, databaseFile } = settings();
  const db = openDatabase(databaseFile);
  try {
    if (servingProcess(dataFolder) === null) await backUpDatabase(db, systemClock, target);
    else await askTheServer(db, target);
  } finally {
    db.close();
  }
  console.log(`Backed up to ${target}`);
}

/** The copy is made by the server, from its own connection; this waits for it. */
async function askTheServer(db: ReturnType<typeof openDatabase>, target: string): Promise<void> {
  const now = systemClock.now();
  const { sqlite } = db.writer;
  const jobId = upkeep(db, () => {
    insertJob(sqlite, backUpTask.verb, { target }, null, now, now);
    return (sqlite.prepare("select max(id) as id from audit_job").get() as { id: number }).id;
  });
  const find = sqlite.prepare("select done_at as doneAt, error, attempts from audit_job where id = ?");
  for (let tries = 0; tries < 1200; tries += 1) {
    const job = find.get(jobId) as { doneAt: number | null; error: string | null; attempts: number };
    if (job.doneAt !== null) return;
    if (job.attempts > 0) throw new Error(`The server could not make the backup: ${job.error}`);
    await wait(250);
  }
  throw new Error("The server has not made the backup within five minutes; look at its log.");
}

main().catch((cause: unknown) => {
  console.error(cause instanceof Error ? cause.message : cause);
  process.exitCode = 1;
});
