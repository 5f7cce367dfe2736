import { desc, eq } from "drizzle-orm";
import { z } from "zod";
import { auditMay } from "../abilities";
import { defineQuery } from "../define-query";
import { auditEvents } from "../events";
import { auditEntry, auditVerification } from "../schema";

const CHECKS_SHOWN = 20;

/** A checkpoint as its entry in the history names it. */
const checkpointPayload = z.object({ entryId: z.number(), hash: z.string(), schemaHash: z.string() });

/** Where the chain stands: its newest entry, the checkpoint that left the machine last, and the checks made so far. */
export const getVerification = defineQuery({
  name: "getVerification",
  permission: auditMay.verify,
  input: z.strictObject({}),
  run(ctx) {
    const head = ctx.db
      .select({ id: auditEntry.id, at: auditEntry.at, hash: auditEntry.hash })
      .from(auditEntry)
      .orderBy(desc(auditEntry.id))
      .limit(1)
      .get();
    const sent = ctx.db
      .select({ at: auditEntry.at, payload: auditEntry.payload })
      .from(auditEntry)
      .where(eq(auditEntry.verb, auditEvents.checkpointMade.verb))
      .orderBy(desc(auditEntry.at), desc(auditEntry.id))
      .limit(1)
      .get();
    const checks = ctx.db
      .select()
      .from(auditVerification)
      .orderBy(desc(auditVerification.id))
      .limit(CHECKS_SHOWN)
      .all();
    const checkpoint = sent ? { at: sent.at, ...checkpointPayload.parse(JSON.parse(sent.payload)) } : null;
    return { head: head ?? null, checkpoint, checks };
  },
});

export type VerificationState = ReturnType<typeof getVerification.run>;
