import { and, eq, isNull } from "drizzle-orm";
import type { Database, Orm } from "@/db/database";
import { HOUR_MS, MINUTE_MS } from "@/lib/clock";
import { settings } from "@/lib/env";
import { epochToLocal } from "@/lib/zone";
import type { Actor } from "@/modules/access";
import { upkeep } from "@/modules/audit";
import { boundAreas, deputyRoles, ownRoles } from "../people";
import { secretHash } from "../rules/secret";
import { person, session } from "../schema";

/** A person as actor at a moment: own roles and those held as a deputy on that day. Null where not active. */
export function actorOf(
  db: Orm,
  personId: number,
  at: number,
  sessionId: string | null = null,
): Actor | null {
  const found = db.select().from(person).where(eq(person.id, personId)).get();
  if (found?.state !== "active") return null;
  const on = epochToLocal(at, settings().STILLWELL_ZONE).on;
  const roles = new Set([...ownRoles(db, personId), ...deputyRoles(db, personId, on)]);
  return {
    kind: "person",
    personId,
    name: found.name,
    roles: [...roles].sort(),
    areaIds: boundAreas(db, personId),
    sessionId,
  };
}

export type SessionLookup = { kind: "actor"; actor: Actor; seenAt: number } | { kind: "none" | "ended" };

/**
 * Who a session's secret belongs to, looked up anew on every request. Ended, idle too long, too old, or of a person who is
 * not active: no actor.
 */
export function findSession(db: Orm, secret: string, at: number): SessionLookup {
  const id = secretHash(secret);
  const row = db
    .select()
    .from(session)
    .where(and(eq(session.id, id)))
    .get();
  if (!row) return { kind: "none" };
  const { SESSION_IDLE_MINUTES, SESSION_ABSOLUTE_HOURS } = settings();
  const isIdle = at - row.seenAt > SESSION_IDLE_MINUTES * MINUTE_MS;
  const isOld = at - row.startedAt > SESSION_ABSOLUTE_HOURS * HOUR_MS;
  if (row.endedAt !== null || isIdle || isOld) return { kind: "ended" };
  const actor = actorOf(db, row.personId, at, id);
  return actor ? { kind: "actor", actor, seenAt: row.seenAt } : { kind: "ended" };
}

/** Says that a session was used; at most once a minute. Only for `upkeep`. */
export function touchSession(orm: Orm, sessionId: string, seenAt: number, at: number): void {
  if (at - seenAt < MINUTE_MS) return;
  orm
    .update(session)
    .set({ seenAt: at })
    .where(and(eq(session.id, sessionId), isNull(session.endedAt)))
    .run();
}

/** Ends every session there is: after a restore, sessions that had ended since the backup must not come back. */
export function endEverySession(db: Database, at: number): void {
  upkeep(db, (orm) => orm.update(session).set({ endedAt: at }).where(isNull(session.endedAt)).run());
}
