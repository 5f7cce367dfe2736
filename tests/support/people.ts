import { z } from "zod";
import type { Database } from "@/db/database";
import type { Clock } from "@/lib/clock";
import { invariant } from "@/lib/invariant";
import { type Actor, definePermissions, ROLES, type Role, SYSTEM_ACTOR } from "@/modules/access";
import { defineCommand, runCommand } from "@/modules/audit";
import { actorOf } from "@/modules/identity";
import { areaBinding, person, roleGrant } from "@/modules/identity/schema";

const testMay = definePermissions("test", {
  addPerson: { says: "add a person for a test", roles: "system" },
});

/** Adds a person who is active at once, without mail and without a password hash (which takes time). */
const addPerson = defineCommand({
  verb: "addPersonForTest",
  permission: testMay.addPerson,
  input: z.strictObject({
    name: z.string(),
    roles: z.array(z.enum(ROLES)),
    areaIds: z.array(z.number().int()),
  }),
  run(ctx, { name, roles, areaIds }) {
    const email = `${name.toLowerCase().replaceAll(/[^a-z]+/g, ".")}@corran.example`;
    const added = ctx.db
      .insert(person)
      .values({ name, email, state: "active", createdAt: ctx.at })
      .returning()
      .get();
    for (const role of roles) {
      ctx.db.insert(roleGrant).values({ personId: added.id, role, state: "active", grantedAt: ctx.at }).run();
    }
    for (const areaId of areaIds)
      ctx.db.insert(areaBinding).values({ personId: added.id, areaId, boundAt: ctx.at }).run();
    return {
      result: added.id,
      event: {
        kind: { verb: "person.added-for-test", version: 1, says: "added a person" },
        subject: { type: "person", id: added.id },
      },
    };
  },
});

export function addPersonForTest(
  db: Database,
  clock: Clock,
  name: string,
  roles: Role[],
  areaIds: number[],
): Actor {
  const { result: id } = runCommand(db, SYSTEM_ACTOR, addPerson, { name, roles, areaIds }, { clock });
  const actor = actorOf(db.writer.orm, id, clock.now());
  invariant(actor, "the person is active");
  return actor;
}
