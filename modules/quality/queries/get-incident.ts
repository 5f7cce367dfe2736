import { and, asc, desc, eq, gt } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import type { Orm } from "@/db/database";
import { notFound } from "@/lib/problem";
import { defineQuery } from "@/modules/audit";
import { reading, readingInForce } from "@/modules/measurements";
import { allParameters } from "@/modules/methods";
import { pointDirectory } from "@/modules/systems";
import { qualityMay } from "../abilities";
import { incidentKey } from "../input";
import { type IncidentReading, isOff } from "../model";
import { getIncidentRow, newestReading, peopleWhoActed } from "../records";
import { incident, incidentNote, incidentReading } from "../schema";
import { incidentRows } from "./list-incidents";

function joinedReadings(db: Orm, incidentId: number): IncidentReading[] {
  const later = alias(reading, "later");
  const rows = db
    .select()
    .from(incidentReading)
    .innerJoin(reading, eq(reading.id, incidentReading.readingId))
    .innerJoin(pointDirectory, eq(pointDirectory.pointId, reading.pointId))
    .leftJoin(readingInForce, eq(readingInForce.id, reading.id))
    .leftJoin(later, eq(later.supersedesId, reading.id))
    .where(eq(incidentReading.incidentId, incidentId))
    .orderBy(asc(reading.takenAt), asc(reading.id))
    .all();
  return rows.map((row) => {
    const { measurements_reading: taken, measurements_reading_in_force: now } = row;
    return {
      readingId: taken.id,
      joinedBy: row.quality_incident_reading.joinedBy,
      joinedAt: row.quality_incident_reading.joinedAt,
      pointName: row.systems_point_directory.pointName,
      parameterId: taken.parameterId,
      typedText: taken.typedText,
      typedUnit: taken.typedUnit,
      value: taken.value,
      qualifier: taken.qualifier,
      answer: taken.answer,
      takenAt: taken.takenAt,
      takenBy: taken.takenBy,
      status: now?.status ?? "none",
      side: now?.side ?? null,
      sentence: now?.sentence ?? "",
      standing: now !== null ? "in force" : row.later !== null ? "corrected" : "struck out",
    };
  });
}

/** Readings that could be the recheck: of the same trouble, taken after it began, newest first. */
function recheckCandidates(db: Orm, of: typeof incident.$inferSelect) {
  return db
    .select()
    .from(readingInForce)
    .innerJoin(pointDirectory, eq(pointDirectory.pointId, readingInForce.pointId))
    .where(
      and(
        gt(readingInForce.takenAt, of.beganAt),
        of.pointId === null
          ? eq(pointDirectory.systemId, of.systemId)
          : eq(readingInForce.pointId, of.pointId),
        of.parameterId === null ? undefined : eq(readingInForce.parameterId, of.parameterId),
      ),
    )
    .orderBy(desc(readingInForce.takenAt), desc(readingInForce.id))
    .limit(10)
    .all()
    .map((row) => ({
      ...row.measurements_reading_in_force,
      pointName: row.systems_point_directory.pointName,
    }));
}

/** One incident: where, its readings as they stand, notes, what could be its recheck, and what stands against closing it. */
export const getIncident = defineQuery({
  name: "getIncident",
  permission: qualityMay.read,
  input: incidentKey,
  run(ctx, { incidentId }) {
    const row = incidentRows(ctx, eq(incident.id, incidentId), 1)[0];
    if (!row) throw notFound("such incident");
    const of = getIncidentRow(ctx.db, incidentId);
    const candidates = of.state === "closed" ? [] : recheckCandidates(ctx.db, of);
    const newest =
      of.pointId === null || of.parameterId === null
        ? null
        : newestReading(ctx.db, of.pointId, of.parameterId);
    const acted = peopleWhoActed(ctx.db, of);
    const recheck =
      of.recheckReadingId === null
        ? null
        : (ctx.db.select().from(readingInForce).where(eq(readingInForce.id, of.recheckReadingId)).get() ??
          null);
    const parameterIds = new Set([of.parameterId, ...candidates.map((each) => each.parameterId)]);
    const readings = joinedReadings(ctx.db, incidentId);
    for (const each of readings) parameterIds.add(each.parameterId);
    return {
      incident: row,
      closure:
        of.closedAt === null
          ? null
          : {
              at: of.closedAt,
              by: of.closedBy,
              text: of.closureText ?? "",
              stillOffReason: of.stillOffReason,
            },
      readings,
      notes: ctx.db
        .select()
        .from(incidentNote)
        .where(eq(incidentNote.incidentId, incidentId))
        .orderBy(asc(incidentNote.id))
        .all(),
      recheck,
      candidates,
      isStillOff: newest !== null && isOff(newest.status),
      onlyYouActed: ctx.actor.personId !== null && [...acted].every((id) => id === ctx.actor.personId),
      parameters: allParameters(ctx.db).filter((each) => parameterIds.has(each.id)),
    };
  },
});

export type IncidentShown = ReturnType<(typeof getIncident)["run"]>;
