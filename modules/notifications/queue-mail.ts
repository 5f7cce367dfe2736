import type { CommandContext } from "@/modules/audit";
import { deliverMail } from "./deliver-mail";
import type { Letter } from "./model";
import { mail } from "./schema";

/** Puts a letter into the outbox inside a command's transaction; it leaves after COMMIT, or not at all where that fails. */
export function queueMail(ctx: CommandContext, letter: Letter): void {
  const row = ctx.db
    .insert(mail)
    .values({
      toAddress: letter.to,
      subject: letter.subject,
      body: letter.body,
      kind: letter.kind,
      state: "queued",
      causeEntryId: ctx.entryId,
      queuedAt: ctx.at,
    })
    .returning({ id: mail.id })
    .get();
  ctx.enqueue(deliverMail, { mailId: row.id });
}
