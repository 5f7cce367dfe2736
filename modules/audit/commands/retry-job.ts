import { eq } from "drizzle-orm";
import { z } from "zod";
import { notFound, Problem } from "@/lib/problem";
import { auditMay } from "../abilities";
import { defineCommand } from "../define-command";
import { auditEvents } from "../events";
import { auditJob } from "../schema";

/** Gives work that has failed for good another row of tries, beginning now. */
export const retryJob = defineCommand({
  verb: "retryJob",
  permission: auditMay.retryJobs,
  input: z.strictObject({ jobId: z.coerce.number().int().positive() }),
  run(ctx, { jobId }) {
    const job = ctx.db.select().from(auditJob).where(eq(auditJob.id, jobId)).get();
    if (!job) throw notFound("such work");
    if (job.doneAt !== null) throw new Problem("conflict", "This work has been done meanwhile.");
    if (job.failedAt === null) {
      throw new Problem("conflict", "This work has not been given up: it will be tried again by itself.");
    }
    ctx.db
      .update(auditJob)
      .set({ failedAt: null, attempts: 0, runAt: ctx.at })
      .where(eq(auditJob.id, jobId))
      .run();
    return {
      result: { jobId },
      event: {
        kind: auditEvents.jobRetried,
        subject: { type: "job", id: jobId },
        payload: { kind: job.kind, error: job.error },
      },
    };
  },
});
