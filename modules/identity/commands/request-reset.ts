import { eq } from "drizzle-orm";
import { z } from "zod";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { sendOneTimeLink } from "../links";
import { person } from "../schema";

/** Sends a one-time link for a new password. Run by the product for whoever asked; only for an active person. */
export const requestReset = defineCommand({
  verb: "requestReset",
  permission: identityMay.enterByLink,
  input: z.strictObject({ personId: z.number().int() }),
  run(ctx, { personId }) {
    const found = ctx.db.select().from(person).where(eq(person.id, personId)).get();
    if (found?.state === "active") sendOneTimeLink(ctx, found, "reset");
    return {
      result: {},
      event: { kind: identityEvents.resetRequested, subject: { type: "person", id: personId } },
    };
  },
});
