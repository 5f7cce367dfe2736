import { and, eq, inArray } from "drizzle-orm";
import { Problem } from "@/lib/problem";
import { ROLE_LABELS } from "@/modules/access";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { grantRoleInput } from "../input";
import { getPerson } from "../people";
import { roleGrant } from "../schema";

/** Gives a person a role at once; a role that an administrator gives to themselves waits for a second administrator. */
export const grantRole = defineCommand({
  verb: "grantRole",
  permission: identityMay.grantRoles,
  input: grantRoleInput,
  run(ctx, { personId, role }) {
    getPerson(ctx.db, personId);
    const open = ctx.db
      .select()
      .from(roleGrant)
      .where(
        and(
          eq(roleGrant.personId, personId),
          eq(roleGrant.role, role),
          inArray(roleGrant.state, ["waiting", "active"]),
        ),
      )
      .get();
    if (open)
      throw new Problem(
        "conflict",
        `This person has the role ${ROLE_LABELS[role]} already, or it waits for approval.`,
      );
    const state = personId === ctx.actor.personId ? "waiting" : "active";
    const grant = ctx.db
      .insert(roleGrant)
      .values({ personId, role, state, grantedBy: ctx.actor.personId, grantedAt: ctx.at })
      .returning()
      .get();
    return {
      result: { grantId: grant.id, state },
      event: {
        kind: identityEvents.roleGranted,
        subject: { type: "person", id: personId },
        payload: { role, state },
      },
    };
  },
});
