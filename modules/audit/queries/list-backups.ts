import { and, asc, desc, eq, isNull } from "drizzle-orm";
import { z } from "zod";
import { auditMay } from "../abilities";
import { backUpTask } from "../backup";
import { defineQuery } from "../define-query";
import { auditEvents } from "../events";
import { auditEntry, auditJob } from "../schema";

const payload = z.object({
  fileName: z.string(),
  sha256: z.string(),
  bytes: z.number(),
  headEntryId: z.number(),
});

/** The backups that were made, as the history tells of them, newest first; and those that are asked for and not yet made. */
export const listBackups = defineQuery({
  name: "listBackups",
  permission: auditMay.readHealth,
  input: z.strictObject({ limit: z.coerce.number().int().min(1).max(200).default(20) }),
  run(ctx, { limit }) {
    const made = ctx.db
      .select({ entryId: auditEntry.id, at: auditEntry.at, payload: auditEntry.payload })
      .from(auditEntry)
      .where(eq(auditEntry.verb, auditEvents.backedUp.verb))
      .orderBy(desc(auditEntry.at), desc(auditEntry.id))
      .limit(limit)
      .all();
    const waiting = ctx.db
      .select({ id: auditJob.id, askedAt: auditJob.createdAt, error: auditJob.error })
      .from(auditJob)
      .where(and(eq(auditJob.kind, backUpTask.verb), isNull(auditJob.doneAt), isNull(auditJob.failedAt)))
      .orderBy(asc(auditJob.id))
      .all();
    return {
      made: made.map(({ payload: text, ...entry }) => ({ ...entry, ...payload.parse(JSON.parse(text)) })),
      waiting,
    };
  },
});

export type Backups = ReturnType<typeof listBackups.run>;
