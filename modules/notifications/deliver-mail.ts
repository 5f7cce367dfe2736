import { eq } from "drizzle-orm";
import { z } from "zod";
import { defineTask, upkeep } from "@/modules/audit";
import { mail } from "./schema";
import { sendLetter } from "./send-letter";

/**
 * Sends one letter of the outbox. A letter that was sent is not sent again; one whose sending fails stays queued and is
 * tried again by the runner. (Between the mail server's yes and our note of it lies the one moment in which a stop of the
 * machine could double a letter; the Message-ID is the same then, so that mail programs can tell.)
 */
export const deliverMail = defineTask({
  verb: "deliverMail",
  lane: "mail",
  input: z.object({ mailId: z.number().int() }),
  async perform({ db, clock }, { mailId }) {
    const row = db.reader.orm.select().from(mail).where(eq(mail.id, mailId)).get();
    if (!row || row.state === "sent") return;
    try {
      const { fileName } = await sendLetter({ ...row, to: row.toAddress });
      upkeep(db, (orm) =>
        orm
          .update(mail)
          .set({ state: "sent", sentAt: clock.now(), attempts: row.attempts + 1, error: null, fileName })
          .where(eq(mail.id, mailId))
          .run(),
      );
    } catch (cause) {
      const error = cause instanceof Error ? cause.message : String(cause);
      upkeep(db, (orm) =>
        orm
          .update(mail)
          .set({ state: "failed", attempts: row.attempts + 1, error })
          .where(eq(mail.id, mailId))
          .run(),
      );
      throw cause;
    }
  },
});
