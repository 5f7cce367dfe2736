import { and, asc, count, desc, eq, inArray, ne, type SQL, sql } from "drizzle-orm";
import type { z } from "zod";
import { defineQuery, type QueryContext } from "@/modules/audit";
import { parameterDirectory } from "@/modules/methods";
import { listSystems, pointDirectory } from "@/modules/systems";
import { qualityMay } from "../abilities";
import { listIncidentsInput, troubleKey } from "../input";
import type { IncidentRow } from "../model";
import { incident, incidentReading } from "../schema";

function ofState(state: z.output<typeof listIncidentsInput>["state"]): SQL | undefined {
  if (state === "all") return undefined;
  return state === "unclosed" ? ne(incident.state, "closed") : eq(incident.state, state);
}

/** How many readings were joined to each incident. */
function readingCounts(ctx: QueryContext): Map<number, number> {
  const rows = ctx.db
    .select({ incidentId: incidentReading.incidentId, readings: count() })
    .from(incidentReading)
    .groupBy(incidentReading.incidentId)
    .all();
  return new Map(rows.map((row) => [row.incidentId, row.readings]));
}

/** Incidents that this person may see, with where they are; in the given order. */
export function incidentRows(ctx: QueryContext, where: SQL | undefined, limit: number): IncidentRow[] {
  const systems = new Map(listSystems.run(ctx, { includeRetired: true }).map((each) => [each.id, each]));
  const rows = ctx.db
    .select()
    .from(incident)
    .leftJoin(pointDirectory, eq(pointDirectory.pointId, incident.pointId))
    .leftJoin(parameterDirectory, eq(parameterDirectory.parameterId, incident.parameterId))
    .where(and(where, inArray(incident.systemId, [...systems.keys()])))
    // what is open comes first; of that, the recheck that is due longest
    .orderBy(
      sql`${incident.state} = 'closed'`,
      sql`${incident.recheckDueAt} is null`,
      asc(incident.recheckDueAt),
      desc(incident.openedAt),
    )
    .limit(limit)
    .all();
  const counts = readingCounts(ctx);
  return rows.flatMap(({ quality_incident: row, systems_point_directory: place, ...rest }) => {
    const at = systems.get(row.systemId);
    if (!at) return [];
    return [
      {
        id: row.id,
        code: row.code,
        title: row.title,
        state: row.state,
        areaId: at.areaId,
        areaName: at.areaName,
        systemId: at.id,
        systemCode: at.code,
        systemName: at.name,
        pointId: row.pointId,
        pointName: place?.pointName ?? null,
        parameterId: row.parameterId,
        parameterName: rest.methods_parameter_directory?.parameterName ?? null,
        ownerId: row.ownerId,
        beganAt: row.beganAt,
        openedAt: row.openedAt,
        openedBy: row.openedBy,
        recheckDueAt: row.recheckDueAt,
        closedAt: row.closedAt,
        readings: counts.get(row.id) ?? 0,
      },
    ];
  });
}

/** Incidents by state: those that are not closed unless asked otherwise; the recheck that is due longest first. */
export const listIncidents = defineQuery({
  name: "listIncidents",
  permission: qualityMay.read,
  input: listIncidentsInput,
  run(ctx, { state, systemId, limit }): IncidentRow[] {
    const ofSystem = systemId === undefined ? undefined : eq(incident.systemId, systemId);
    return incidentRows(ctx, and(ofState(state), ofSystem), limit);
  },
});

/** The incident about a point and parameter that is not closed, or null: a new reading that is off may join it. */
export const findOpenIncident = defineQuery({
  name: "findOpenIncident",
  permission: qualityMay.read,
  input: troubleKey,
  run(ctx, { pointId, parameterId }): IncidentRow | null {
    const where = and(
      ne(incident.state, "closed"),
      eq(incident.pointId, pointId),
      eq(incident.parameterId, parameterId),
    );
    return incidentRows(ctx, where, 1)[0] ?? null;
  },
});
