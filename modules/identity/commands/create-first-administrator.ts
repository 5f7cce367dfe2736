import { and, eq } from "drizzle-orm";
import { z } from "zod";
import { Problem } from "@/lib/problem";
import { ROLES } from "@/modules/access/model";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { credential, person, roleGrant } from "../schema";

/**
 * The first person of an installation, made at the command line by whoever holds the machine. Refused once there is an
 * active administrator: further people are invited.
 */
export const createFirstAdministrator = defineCommand({
  verb: "createFirstAdministrator",
  permission: identityMay.enterByLink,
  input: z.strictObject({
    name: z.string().trim().min(2).max(80),
    email: z.email(),
    passwordHash: z.string().startsWith("$argon2id$"),
    roles: z.array(z.enum(ROLES)).default(["admin"]),
  }),
  run(ctx, { name, email, passwordHash, roles }) {
    const existing = ctx.db
      .select({ id: person.id })
      .from(person)
      .innerJoin(roleGrant, eq(roleGrant.personId, person.id))
      .where(and(eq(person.state, "active"), eq(roleGrant.role, "admin"), eq(roleGrant.state, "active")))
      .get();
    if (existing) throw new Problem("conflict", "There is an administrator already, who can invite others.");
    const added = ctx.db
      .insert(person)
      .values({ name, email, state: "active", createdAt: ctx.at })
      .returning()
      .get();
    ctx.db.insert(credential).values({ personId: added.id, passwordHash, changedAt: ctx.at }).run();
    for (const role of roles) {
      ctx.db.insert(roleGrant).values({ personId: added.id, role, state: "active", grantedAt: ctx.at }).run();
    }
    return {
      result: { personId: added.id },
      event: {
        kind: identityEvents.invited,
        subject: { type: "person", id: added.id },
        payload: { first: true, roles },
      },
    };
  },
});
