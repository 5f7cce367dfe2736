import { and, eq, inArray, isNull } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { notFound, Problem } from "@/lib/problem";
import type { Role } from "@/modules/access";
import { areaBinding, deputy, person, roleGrant } from "./schema";

export type Person = typeof person.$inferSelect;

/** @throws Problem `not-found` */
export function getPerson(db: Orm, personId: number): Person {
  const row = db.select().from(person).where(eq(person.id, personId)).get();
  if (!row) throw notFound("such person");
  return row;
}

/** Roles of a person's own that are in force. */
export function ownRoles(db: Orm, personId: number): Role[] {
  return db
    .select({ role: roleGrant.role })
    .from(roleGrant)
    .where(and(eq(roleGrant.personId, personId), eq(roleGrant.state, "active")))
    .all()
    .map((row) => row.role);
}

/** Roles a person holds as somebody's deputy on a calendar day; only while the other still holds the role. */
export function deputyRoles(db: Orm, personId: number, on: string): Role[] {
  const rows = db
    .select()
    .from(deputy)
    .where(and(eq(deputy.deputyId, personId), isNull(deputy.endedAt)))
    .all();
  return rows
    .filter((row) => row.fromOn <= on && on <= row.toOn && ownRoles(db, row.personId).includes(row.role))
    .map((row) => row.role);
}

/** Areas a person is bound to; null where bound to none. */
export function boundAreas(db: Orm, personId: number): number[] | null {
  const rows = db
    .select({ areaId: areaBinding.areaId })
    .from(areaBinding)
    .where(and(eq(areaBinding.personId, personId), isNull(areaBinding.endedAt)))
    .all();
  return rows.length === 0 ? null : rows.map((row) => row.areaId);
}

/** E-mail addresses of the active people who hold a role. */
export function addressesOf(db: Orm, roles: Role[]): string[] {
  const rows = db
    .selectDistinct({ email: person.email })
    .from(person)
    .innerJoin(roleGrant, eq(roleGrant.personId, person.id))
    .where(and(eq(person.state, "active"), eq(roleGrant.state, "active"), inArray(roleGrant.role, roles)))
    .all();
  return rows.map((row) => row.email);
}

/** @throws Problem `own-work` where somebody would decide on what they made themselves. */
export function mustBeAnother(actorId: number | null, madeBy: number | null, what: string): void {
  if (actorId !== null && actorId === madeBy) {
    throw new Problem("own-work", `You made this ${what} yourself; another person must decide on it.`);
  }
}

/** An active person by id, or null. */
export function findActivePerson(db: Orm, personId: number): Person | null {
  return (
    db
      .select()
      .from(person)
      .where(and(eq(person.id, personId), eq(person.state, "active")))
      .get() ?? null
  );
}
