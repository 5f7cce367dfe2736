import { and, asc, eq, inArray, isNull } from "drizzle-orm";
import { z } from "zod";
import type { Orm } from "@/db/database";
import { defineQuery } from "@/modules/audit";
import { identityMay } from "../abilities";
import type { PersonRow } from "../model";
import { getPerson } from "../people";
import { areaBinding, deputy, person, roleGrant } from "../schema";

function toRow(db: Orm, row: typeof person.$inferSelect): PersonRow {
  const grants = db
    .select()
    .from(roleGrant)
    .where(and(eq(roleGrant.personId, row.id), inArray(roleGrant.state, ["active", "waiting"])))
    .all();
  const areas = db
    .select()
    .from(areaBinding)
    .where(and(eq(areaBinding.personId, row.id), isNull(areaBinding.endedAt)))
    .all();
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    state: row.state,
    suspendedReason: row.suspendedReason,
    roles: grants.filter((grant) => grant.state === "active").map((grant) => grant.role),
    waitingRoles: grants
      .filter((grant) => grant.state === "waiting")
      .map((grant) => ({ grantId: grant.id, role: grant.role, grantedBy: grant.grantedBy })),
    areaIds: areas.map((binding) => binding.areaId),
  };
}

/** Everybody with roles and areas, by name. */
export const listPeople = defineQuery({
  name: "listPeople",
  permission: identityMay.readPeople,
  input: z.strictObject({}),
  run(ctx): PersonRow[] {
    const rows = ctx.db.select().from(person).orderBy(asc(person.name)).all();
    return rows.map((row) => toRow(ctx.db, row));
  },
});

/** One person with roles and areas. @throws Problem `not-found` */
export const getPersonRow = defineQuery({
  name: "getPersonRow",
  permission: identityMay.readPeople,
  input: z.strictObject({ personId: z.coerce.number().int().positive() }),
  run(ctx, { personId }): PersonRow {
    return toRow(ctx.db, getPerson(ctx.db, personId));
  },
});

/** Names by id, for the records that name people by id. */
export const listPersonNames = defineQuery({
  name: "listPersonNames",
  permission: identityMay.listPeople,
  input: z.strictObject({}),
  run(ctx): { id: number; name: string; state: string }[] {
    return ctx.db
      .select({ id: person.id, name: person.name, state: person.state })
      .from(person)
      .orderBy(asc(person.name))
      .all();
  },
});

/** Deputyships that have not ended. */
export const listDeputies = defineQuery({
  name: "listDeputies",
  permission: identityMay.readPeople,
  input: z.strictObject({}),
  run(ctx) {
    return ctx.db.select().from(deputy).where(isNull(deputy.endedAt)).orderBy(asc(deputy.fromOn)).all();
  },
});

/** A person's own account. */
export const getOwnAccount = defineQuery({
  name: "getOwnAccount",
  permission: identityMay.ownAccount,
  input: z.strictObject({}),
  run(ctx): { name: string; email: string; preferredUnits: Record<string, string> } | null {
    if (ctx.actor.personId === null) return null;
    const row = ctx.db.select().from(person).where(eq(person.id, ctx.actor.personId)).get();
    if (!row) return null;
    return {
      name: row.name,
      email: row.email,
      preferredUnits: JSON.parse(row.preferredUnits) as Record<string, string>,
    };
  },
});
