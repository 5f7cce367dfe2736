import { and, eq, isNull } from "drizzle-orm";
import { z } from "zod";
import { invariant } from "@/lib/invariant";
import { Problem } from "@/lib/problem";
import type { CommandContext } from "@/modules/audit";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { findOpenLink } from "../links";
import { credential, oneTimeLink, person, session } from "../schema";

function store(ctx: CommandContext, personId: number, passwordHash: string): void {
  const values = { passwordHash, changedAt: ctx.at };
  ctx.db
    .insert(credential)
    .values({ personId, ...values })
    .onConflictDoUpdate({ target: credential.personId, set: values })
    .run();
}

function endOtherSessions(ctx: CommandContext, personId: number): void {
  const open = ctx.db
    .select({ id: session.id })
    .from(session)
    .where(and(eq(session.personId, personId), isNull(session.endedAt)))
    .all();
  for (const { id } of open.filter((row) => row.id !== ctx.actor.sessionId)) {
    ctx.db.update(session).set({ endedAt: ctx.at }).where(eq(session.id, id)).run();
  }
}

/** Sets a password by a one-time link; the link is used up, an invited person becomes active, other sessions end. */
export const setPassword = defineCommand({
  verb: "setPassword",
  permission: identityMay.enterByLink,
  input: z.strictObject({ token: z.string(), passwordHash: z.string().startsWith("$argon2id$") }),
  run(ctx, { token, passwordHash }) {
    const link = findOpenLink(ctx.db, token, ctx.at);
    if (!link) throw new Problem("not-found", "This link has been used or is too old. Ask for a new one.");
    const found = ctx.db.select().from(person).where(eq(person.id, link.personId)).get();
    if (!found || found.state === "suspended") {
      throw new Problem("not-found", "This link has been used or is too old. Ask for a new one.");
    }
    ctx.db.update(oneTimeLink).set({ usedAt: ctx.at }).where(eq(oneTimeLink.tokenHash, link.tokenHash)).run();
    if (found.state === "invited")
      ctx.db.update(person).set({ state: "active" }).where(eq(person.id, found.id)).run();
    store(ctx, found.id, passwordHash);
    endOtherSessions(ctx, found.id);
    return {
      result: { personId: found.id, email: found.email },
      event: {
        kind: identityEvents.passwordSet,
        subject: { type: "person", id: found.id },
        payload: { purpose: link.purpose },
      },
    };
  },
});

/** Changes one's own password; the other sessions end. The old one has been checked by the caller. */
export const changePassword = defineCommand({
  verb: "changePassword",
  permission: identityMay.ownAccount,
  input: z.strictObject({ passwordHash: z.string().startsWith("$argon2id$") }),
  run(ctx, { passwordHash }) {
    invariant(ctx.actor.personId !== null, "a person changes their own password");
    store(ctx, ctx.actor.personId, passwordHash);
    endOtherSessions(ctx, ctx.actor.personId);
    return {
      result: {},
      event: { kind: identityEvents.passwordChanged, subject: { type: "person", id: ctx.actor.personId } },
    };
  },
});
