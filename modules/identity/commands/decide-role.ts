import { eq } from "drizzle-orm";
import { notFound, Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { decideRoleInput } from "../input";
import { mustBeAnother } from "../people";
import { roleGrant } from "../schema";

/** A second administrator approves or refuses a role that somebody granted to themselves. */
export const decideRole = defineCommand({
  verb: "decideRole",
  permission: identityMay.grantRoles,
  input: decideRoleInput,
  run(ctx, { grantId, decision }) {
    const grant = ctx.db.select().from(roleGrant).where(eq(roleGrant.id, grantId)).get();
    if (!grant) throw notFound("such role");
    if (grant.state !== "waiting") throw new Problem("conflict", "This has been decided already.");
    mustBeAnother(ctx.actor.personId, grant.personId, "grant");
    mustBeAnother(ctx.actor.personId, grant.grantedBy, "grant");
    const state = decision === "approve" ? "active" : "refused";
    ctx.db
      .update(roleGrant)
      .set({ state, decidedBy: ctx.actor.personId, decidedAt: ctx.at })
      .where(eq(roleGrant.id, grantId))
      .run();
    return {
      result: { grantId, state },
      event: {
        kind: identityEvents.roleDecided,
        subject: { type: "person", id: grant.personId },
        payload: { role: grant.role, decision },
      },
    };
  },
});
