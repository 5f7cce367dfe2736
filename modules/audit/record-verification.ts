import { and, eq, isNull } from "drizzle-orm";
import { z } from "zod";
import { auditMay } from "./abilities";
import { defineCommand } from "./define-command";
import { auditEvents } from "./events";
import { auditVerification } from "./schema";

const finding = z.strictObject({
  kind: z.enum(["chain", "rows", "schema", "checkpoint"]),
  entryId: z.number().int().nullable(),
  sentence: z.string(),
});

/** How many findings are kept; the first altered record comes first, and the number of all is kept too. */
export const FINDINGS_KEPT = 50;

/** What a check of a copy answered, or why it could not be made. */
export const verificationResult = z.strictObject({
  entries: z.number().int().nullable(),
  head: z.strictObject({ entryId: z.number().int(), hash: z.string() }).nullable(),
  findingCount: z.number().int().nullable(),
  findings: z.array(finding).max(FINDINGS_KEPT),
  trouble: z.string().nullable(),
});

export type VerificationResult = z.output<typeof verificationResult>;

/** Keeps what a check found beside who asked for it. */
export const recordVerification = defineCommand({
  verb: "recordVerification",
  permission: auditMay.recordVerification,
  input: verificationResult.extend({ verificationId: z.number().int() }),
  run(ctx, { verificationId, head, ...result }) {
    ctx.db
      .update(auditVerification)
      .set({ ...result, headEntryId: head?.entryId, headHash: head?.hash, finishedAt: ctx.at })
      .where(and(eq(auditVerification.id, verificationId), isNull(auditVerification.finishedAt)))
      .run();
    return {
      result: null,
      event: {
        kind: auditEvents.verified,
        subject: { type: "verification", id: verificationId },
        payload: { entries: result.entries, findingCount: result.findingCount, trouble: result.trouble },
      },
    };
  },
});
