import { and, eq, gt, isNull } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { DAY_MS, HOUR_MS } from "@/lib/clock";
import { settings } from "@/lib/env";
import type { CommandContext } from "@/modules/audit";
import { queueMail } from "@/modules/notifications";
import type { LinkPurpose } from "./model";
import { newSecret, secretHash } from "./rules/secret";
import { oneTimeLink } from "./schema";

const LASTS: Record<LinkPurpose, number> = { invitation: 7 * DAY_MS, reset: HOUR_MS };

const LETTERS: Record<LinkPurpose, (name: string, address: string) => { subject: string; body: string }> = {
  invitation: (name, address) => ({
    subject: `Your sign-in for ${settings().STILLWELL_FACILITY}`,
    body:
      `Dear ${name},\n\nyou have been given a place in the water records of ${settings().STILLWELL_FACILITY}.\n` +
      `Choose a password within seven days:\n\n${address}\n\nThe link works once. If you did not expect it, tell your administrator.\n`,
  }),
  reset: (name, address) => ({
    subject: "Choose a new password",
    body:
      `Dear ${name},\n\nsomebody, most likely you, asked for a new password.\nChoose one within the hour:\n\n${address}\n\n` +
      "The link works once. If it was not you, nothing has changed and there is nothing to do.\n",
  }),
};

/** Makes a link that works once and puts it into the outbox. Older links of the same purpose stop working. */
export function sendOneTimeLink(
  ctx: CommandContext,
  to: { id: number; name: string; email: string },
  purpose: LinkPurpose,
): void {
  const secret = newSecret();
  ctx.db
    .update(oneTimeLink)
    .set({ usedAt: ctx.at })
    .where(and(eq(oneTimeLink.personId, to.id), eq(oneTimeLink.purpose, purpose), isNull(oneTimeLink.usedAt)))
    .run();
  ctx.db
    .insert(oneTimeLink)
    .values({
      tokenHash: secretHash(secret),
      personId: to.id,
      purpose,
      createdAt: ctx.at,
      expiresAt: ctx.at + LASTS[purpose],
    })
    .run();
  const address = `${settings().STILLWELL_URL}/${purpose}/${secret}`;
  queueMail(ctx, { to: to.email, kind: purpose, ...LETTERS[purpose](to.name, address) });
}

/** The link that belongs to a secret, where it is still good. */
export function findOpenLink(db: Orm, token: string, at: number) {
  return db
    .select()
    .from(oneTimeLink)
    .where(
      and(
        eq(oneTimeLink.tokenHash, secretHash(token)),
        isNull(oneTimeLink.usedAt),
        gt(oneTimeLink.expiresAt, at),
      ),
    )
    .get();
}
