import { and, eq, isNull } from "drizzle-orm";
import { z } from "zod";
import { invariant } from "@/lib/invariant";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { session } from "../schema";

/** Begins a session of the person who has just proven who they are. */
export const startSession = defineCommand({
  verb: "startSession",
  permission: identityMay.ownAccount,
  input: z.strictObject({ sessionId: z.string().length(64), address: z.string().max(100) }),
  run(ctx, { sessionId, address }) {
    invariant(ctx.actor.personId !== null, "a session belongs to a person");
    ctx.db
      .insert(session)
      .values({ id: sessionId, personId: ctx.actor.personId, startedAt: ctx.at, seenAt: ctx.at, address })
      .run();
    return {
      result: {},
      event: { kind: identityEvents.sessionStarted, subject: { type: "person", id: ctx.actor.personId } },
    };
  },
});

/** Ends the session that the request came with. */
export const endSession = defineCommand({
  verb: "endSession",
  permission: identityMay.ownAccount,
  input: z.strictObject({}),
  run(ctx) {
    invariant(
      ctx.actor.personId !== null && ctx.actor.sessionId !== null,
      "a person with a session signs out",
    );
    ctx.db
      .update(session)
      .set({ endedAt: ctx.at })
      .where(and(eq(session.id, ctx.actor.sessionId), isNull(session.endedAt)))
      .run();
    return {
      result: {},
      event: { kind: identityEvents.sessionEnded, subject: { type: "person", id: ctx.actor.personId } },
    };
  },
});
