import { and, desc, eq, inArray, like, ne } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { notFound, Problem } from "@/lib/problem";
import { reading, readingInForce } from "@/modules/measurements";
import { getSystemById } from "@/modules/systems";
import { incident, incidentNote, incidentReading } from "./schema";

export type Incident = typeof incident.$inferSelect;

/** @throws Problem `not-found` */
export function getIncidentRow(db: Orm, incidentId: number): Incident {
  const row = db.select().from(incident).where(eq(incident.id, incidentId)).get();
  if (!row) throw notFound("such incident");
  return row;
}

/** An incident on which work goes on. @throws Problem `not-found`, `conflict` where it is closed */
export function getUnclosed(db: Orm, incidentId: number): Incident {
  const row = getIncidentRow(db, incidentId);
  if (row.state === "closed") {
    throw new Problem("conflict", `Incident ${row.code} is closed. Open a new one if the trouble is back.`);
  }
  return row;
}

/** The area of an incident's system, for permissions that reach into own areas. */
export function areaOfIncident(ctx: { db: Orm }, { incidentId }: { incidentId: number }): number[] {
  const row = ctx.db
    .select({ systemId: incident.systemId })
    .from(incident)
    .where(eq(incident.id, incidentId))
    .get();
  return row ? [getSystemById(ctx.db, row.systemId).areaId] : [];
}

/** The incident about a point and parameter that is not closed, or null. */
export function unclosedAt(db: Orm, pointId: number, parameterId: number): Incident | null {
  return (
    db
      .select()
      .from(incident)
      .where(
        and(
          eq(incident.pointId, pointId),
          eq(incident.parameterId, parameterId),
          ne(incident.state, "closed"),
        ),
      )
      .get() ?? null
  );
}

/** The next number of a year: `26-0001`, `26-0002` … */
export function nextCode(db: Orm, year: number): string {
  const prefix = `${String(year % 100).padStart(2, "0")}-`;
  const newest = db
    .select({ code: incident.code })
    .from(incident)
    .where(like(incident.code, `${prefix}%`))
    .orderBy(desc(incident.id))
    .limit(1)
    .get();
  const count = newest ? Number(newest.code.slice(prefix.length)) : 0;
  return `${prefix}${String(count + 1).padStart(4, "0")}`;
}

/** The newest reading in force of a point and parameter, or null. */
export function newestReading(db: Orm, pointId: number, parameterId: number) {
  return (
    db
      .select()
      .from(readingInForce)
      .where(and(eq(readingInForce.pointId, pointId), eq(readingInForce.parameterId, parameterId)))
      .orderBy(desc(readingInForce.takenAt), desc(readingInForce.id))
      .limit(1)
      .get() ?? null
  );
}

/** Everybody who acted on an incident: opened it, joined, noted, took or entered a reading of it. */
export function peopleWhoActed(db: Orm, of: Incident): Set<number> {
  const joined = db.select().from(incidentReading).where(eq(incidentReading.incidentId, of.id)).all();
  const notes = db
    .select({ by: incidentNote.notedBy })
    .from(incidentNote)
    .where(eq(incidentNote.incidentId, of.id))
    .all();
  const readingIds = [
    ...joined.map((row) => row.readingId),
    ...(of.recheckReadingId ? [of.recheckReadingId] : []),
  ];
  const taken = db
    .select({ takenBy: reading.takenBy, enteredBy: reading.enteredBy })
    .from(reading)
    .where(inArray(reading.id, readingIds))
    .all();
  return new Set([
    of.openedBy,
    ...joined.map((row) => row.joinedBy),
    ...notes.map((note) => note.by),
    ...taken.flatMap((row) => [row.takenBy, row.enteredBy]),
  ]);
}
