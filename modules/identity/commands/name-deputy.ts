import { eq } from "drizzle-orm";
import { notFound, Problem } from "@/lib/problem";
import { ROLE_LABELS } from "@/modules/access";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { endDeputyInput, nameDeputyInput } from "../input";
import { getPerson, mustBeAnother, ownRoles } from "../people";
import { deputy } from "../schema";

/** Somebody stands in for somebody in one role for some days. A person can't make themselves a deputy. */
export const nameDeputy = defineCommand({
  verb: "nameDeputy",
  permission: identityMay.nameDeputies,
  input: nameDeputyInput,
  run(ctx, input) {
    getPerson(ctx.db, input.deputyId);
    mustBeAnother(ctx.actor.personId, input.deputyId, "deputyship");
    const mayNameForOthers = ctx.actor.roles.includes("admin");
    if (!mayNameForOthers && input.personId !== ctx.actor.personId) {
      throw new Problem("not-allowed", "You may name a deputy for yourself alone.");
    }
    if (!ownRoles(ctx.db, input.personId).includes(input.role)) {
      throw new Problem("conflict", `That person does not hold the role ${ROLE_LABELS[input.role]}.`);
    }
    const named = ctx.db
      .insert(deputy)
      .values({ ...input, namedBy: ctx.actor.personId ?? input.personId })
      .returning()
      .get();
    return {
      result: { deputyshipId: named.id },
      event: {
        kind: identityEvents.deputyNamed,
        subject: { type: "person", id: input.personId },
        payload: { ...input },
      },
    };
  },
});

/** Ends a deputyship before its last day. */
export const endDeputy = defineCommand({
  verb: "endDeputy",
  permission: identityMay.nameDeputies,
  input: endDeputyInput,
  run(ctx, { deputyshipId }) {
    const found = ctx.db.select().from(deputy).where(eq(deputy.id, deputyshipId)).get();
    if (!found) throw notFound("such deputyship");
    if (!ctx.actor.roles.includes("admin") && found.personId !== ctx.actor.personId) {
      throw new Problem("not-allowed", "You may end your own deputies alone.");
    }
    if (found.endedAt !== null) throw new Problem("conflict", "This deputyship has ended already.");
    ctx.db.update(deputy).set({ endedAt: ctx.at }).where(eq(deputy.id, deputyshipId)).run();
    return {
      result: { deputyshipId },
      event: { kind: identityEvents.deputyEnded, subject: { type: "person", id: found.personId } },
    };
  },
});
