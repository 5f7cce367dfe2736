import { desc, lt } from "drizzle-orm";
import { z } from "zod";
import { defineQuery } from "@/modules/audit";
import { notificationsMay } from "../abilities";
import { mail } from "../schema";

/** The outbox, newest first. */
export const listMail = defineQuery({
  name: "listMail",
  permission: notificationsMay.readOutbox,
  input: z.strictObject({
    before: z.coerce.number().int().positive().optional(),
    limit: z.coerce.number().int().min(1).max(200).default(50),
  }),
  run(ctx, { before, limit }) {
    const rows = ctx.db
      .select()
      .from(mail)
      .where(before === undefined ? undefined : lt(mail.id, before))
      .orderBy(desc(mail.id))
      .limit(limit)
      .all();
    // One-time links are secrets of the person written to, not of the administrator.
    return rows.map((row) => ({
      ...row,
      body: row.body.replace(/(\/(?:invitation|reset)\/)[\w-]+/g, "$1…"),
    }));
  },
});
