import { and, eq, inArray } from "drizzle-orm";
import { notFound, Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { endRoleInput } from "../input";
import { person, roleGrant } from "../schema";

/** Ends a role; it works no more on the very next request. The last administrator keeps theirs. */
export const endRole = defineCommand({
  verb: "endRole",
  permission: identityMay.grantRoles,
  input: endRoleInput,
  run(ctx, { personId, role, reason }) {
    const grant = ctx.db
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
    if (!grant) throw notFound("such role");
    if (role === "admin" && grant.state === "active") mustLeaveAnAdministrator(ctx.db, personId);
    ctx.db
      .update(roleGrant)
      .set({ state: "ended", endedBy: ctx.actor.personId, endedAt: ctx.at })
      .where(eq(roleGrant.id, grant.id))
      .run();
    return {
      result: { personId, role },
      event: {
        kind: identityEvents.roleEnded,
        subject: { type: "person", id: personId },
        payload: { role },
        reason,
      },
    };
  },
});

/** @throws Problem `conflict` where nobody would be left to manage people. */
export function mustLeaveAnAdministrator(db: Parameters<typeof endRole.run>[0]["db"], leaving: number): void {
  const admins = db
    .select({ id: person.id })
    .from(person)
    .innerJoin(roleGrant, eq(roleGrant.personId, person.id))
    .where(and(eq(person.state, "active"), eq(roleGrant.role, "admin"), eq(roleGrant.state, "active")))
    .all();
  if (admins.every((admin) => admin.id === leaving)) {
    throw new Problem(
      "conflict",
      "This is the last active administrator; give the role to another person first.",
    );
  }
}
