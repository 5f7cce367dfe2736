import { existsSync, statfsSync, statSync } from "node:fs";
import { and, count, desc, eq, isNotNull, isNull, lte, min } from "drizzle-orm";
import { z } from "zod";
import { settings } from "@/lib/env";
import { auditMay } from "../abilities";
import { defineQuery } from "../define-query";
import { auditEvents } from "../events";
import { auditEntry, auditJob } from "../schema";

const sizeOf = (file: string): number => (existsSync(file) ? statSync(file).size : 0);

/**
 * How the installation is: room on the disk of the data folder and size of the database (with its log), in bytes; the newest
 * backup; work that is due and was not taken yet (the oldest moment it was due), and work that failed for good.
 */
export const getHealth = defineQuery({
  name: "getHealth",
  permission: auditMay.readHealth,
  input: z.strictObject({}),
  run(ctx) {
    const { dataFolder, databaseFile } = settings();
    const disk = statfsSync(dataFolder);
    const backup = ctx.db
      .select({ at: auditEntry.at, entryId: auditEntry.id })
      .from(auditEntry)
      .where(eq(auditEntry.verb, auditEvents.backedUp.verb))
      .orderBy(desc(auditEntry.id))
      .limit(1)
      .get();
    const due = ctx.db
      .select({ jobs: count(), oldestAt: min(auditJob.runAt) })
      .from(auditJob)
      .where(and(isNull(auditJob.doneAt), isNull(auditJob.failedAt), lte(auditJob.runAt, ctx.at)))
      .get();
    const failed = ctx.db.select({ jobs: count() }).from(auditJob).where(isNotNull(auditJob.failedAt)).get();
    return {
      diskFreeBytes: disk.bavail * disk.bsize,
      diskTotalBytes: disk.blocks * disk.bsize,
      databaseBytes: sizeOf(databaseFile) + sizeOf(`${databaseFile}-wal`),
      lastBackupAt: backup?.at ?? null,
      jobsDue: due?.jobs ?? 0,
      oldestDueAt: due?.oldestAt ?? null,
      jobsFailed: failed?.jobs ?? 0,
    };
  },
});

export type Health = ReturnType<(typeof getHealth)["run"]>;
