import { and, desc, gt, isNotNull, isNull, or } from "drizzle-orm";
import { z } from "zod";
import { auditMay } from "../abilities";
import { defineQuery } from "../define-query";
import type { TroubledJob } from "../model";
import { auditJob } from "../schema";

/** Work that was given up, and work that failed and is tried again by itself; newest first. */
export const listTroubledJobs = defineQuery({
  name: "listTroubledJobs",
  permission: auditMay.readHealth,
  input: z.strictObject({ limit: z.coerce.number().int().min(1).max(200).default(50) }),
  run(ctx, { limit }): TroubledJob[] {
    return ctx.db
      .select({
        id: auditJob.id,
        kind: auditJob.kind,
        createdAt: auditJob.createdAt,
        runAt: auditJob.runAt,
        attempts: auditJob.attempts,
        failedAt: auditJob.failedAt,
        error: auditJob.error,
      })
      .from(auditJob)
      .where(and(isNull(auditJob.doneAt), or(isNotNull(auditJob.failedAt), gt(auditJob.attempts, 0))))
      .orderBy(desc(auditJob.id))
      .limit(limit)
      .all();
  },
});
