import { count } from "drizzle-orm";
import { z } from "zod";
import { defineQuery } from "@/modules/audit";
import { notificationsMay } from "../abilities";
import type { MailState } from "../model";
import { mail } from "../schema";

/** How many letters wait, went out and failed. */
export const countMail = defineQuery({
  name: "countMail",
  permission: notificationsMay.readOutbox,
  input: z.strictObject({}),
  run(ctx): Record<MailState, number> {
    const rows = ctx.db.select({ state: mail.state, letters: count() }).from(mail).groupBy(mail.state).all();
    const of = (state: MailState): number => rows.find((row) => row.state === state)?.letters ?? 0;
    return { queued: of("queued"), sent: of("sent"), failed: of("failed") };
  },
});
