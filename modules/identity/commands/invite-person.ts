import { sql } from "drizzle-orm";
import { invalidField } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { invitePersonInput } from "../input";
import { sendOneTimeLink } from "../links";
import { areaBinding, person, roleGrant } from "../schema";

/** Gives a person a place: name, address, roles, areas; the invitation goes out by mail. */
export const invitePerson = defineCommand({
  verb: "invitePerson",
  permission: identityMay.managePeople,
  input: invitePersonInput,
  run(ctx, input) {
    const taken = ctx.db
      .select({ id: person.id })
      .from(person)
      .where(sql`lower(${person.email}) = lower(${input.email})`)
      .get();
    if (taken) throw invalidField("/email", "taken", "Somebody with this e-mail address is here already.");
    const added = ctx.db
      .insert(person)
      .values({ name: input.name, email: input.email, state: "invited", createdAt: ctx.at })
      .returning()
      .get();
    for (const role of new Set(input.roles)) {
      ctx.db
        .insert(roleGrant)
        .values({
          personId: added.id,
          role,
          state: "active",
          grantedBy: ctx.actor.personId,
          grantedAt: ctx.at,
        })
        .run();
    }
    for (const areaId of new Set(input.areaIds)) {
      ctx.db.insert(areaBinding).values({ personId: added.id, areaId, boundAt: ctx.at }).run();
    }
    sendOneTimeLink(ctx, added, "invitation");
    return {
      result: { personId: added.id },
      event: {
        kind: identityEvents.invited,
        subject: { type: "person", id: added.id },
        payload: { roles: input.roles, areaIds: input.areaIds },
      },
    };
  },
});
