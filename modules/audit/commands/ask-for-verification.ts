import { isNull } from "drizzle-orm";
import { z } from "zod";
import { Problem } from "@/lib/problem";
import { auditMay } from "../abilities";
import { defineCommand } from "../define-command";
import { auditEvents } from "../events";
import { auditVerification } from "../schema";
import { verifyCopyTask } from "../verify-copy";

/** Asks for a check of the whole history; it is made on a fresh copy, beside the work of everybody else. */
export const askForVerification = defineCommand({
  verb: "askForVerification",
  permission: auditMay.verify,
  input: z.strictObject({}),
  run(ctx) {
    const waiting = ctx.db.select().from(auditVerification).where(isNull(auditVerification.finishedAt)).get();
    if (waiting) throw new Problem("conflict", "A check is under way already; its result will stand here.");
    const { id } = ctx.db
      .insert(auditVerification)
      .values({ askedBy: ctx.actor.personId, askedAt: ctx.at })
      .returning({ id: auditVerification.id })
      .get();
    ctx.enqueue(verifyCopyTask, { verificationId: id });
    return {
      result: { verificationId: id },
      event: { kind: auditEvents.verificationAsked, subject: { type: "verification", id } },
    };
  },
});
