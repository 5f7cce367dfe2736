import { and, asc, desc, eq, isNull } from "drizzle-orm";
import { z } from "zod";
import type { Orm } from "@/db/database";
import { defineQuery } from "@/modules/audit";
import { allParameters } from "@/modules/methods";
import { pointDirectory } from "@/modules/systems";
import { measurementsMay } from "../abilities";
import { limitsInForce } from "../limits";
import type { RecentReading, WatchRow } from "../model";
import { readingInForce, watchItem } from "../schema";

const RECENT = 20;

/** The newest readings of a point and parameter up to a moment, newest first. */
export function recentReadings(
  db: Orm,
  pointId: number,
  parameterId: number,
  limit = RECENT,
): RecentReading[] {
  return db
    .select({
      id: readingInForce.id,
      takenAt: readingInForce.takenAt,
      takenBy: readingInForce.takenBy,
      value: readingInForce.value,
      qualifier: readingInForce.qualifier,
      answer: readingInForce.answer,
      typedText: readingInForce.typedText,
      status: readingInForce.status,
      side: readingInForce.side,
      sentence: readingInForce.sentence,
    })
    .from(readingInForce)
    .where(and(eq(readingInForce.pointId, pointId), eq(readingInForce.parameterId, parameterId)))
    .orderBy(desc(readingInForce.takenAt), desc(readingInForce.id))
    .limit(limit)
    .all();
}

/**
 * What is read where, in walking order, each with its newest readings and the limits in force now: one row of an entry
 * sheet, a system's page or Today.
 */
export const listWatch = defineQuery({
  name: "listWatch",
  permission: measurementsMay.read,
  input: z.strictObject({
    areaId: z.coerce.number().int().positive().optional(),
    systemId: z.coerce.number().int().positive().optional(),
    recent: z.coerce.number().int().min(1).max(RECENT).default(2),
  }),
  run(ctx, { areaId, systemId, recent }): WatchRow[] {
    const parameters = new Map(allParameters(ctx.db).map((each) => [each.id, each]));
    const rows = ctx.db
      .select()
      .from(watchItem)
      .innerJoin(pointDirectory, eq(pointDirectory.pointId, watchItem.pointId))
      .where(
        and(
          isNull(watchItem.endedAt),
          areaId === undefined ? undefined : eq(pointDirectory.areaId, areaId),
          systemId === undefined ? undefined : eq(pointDirectory.systemId, systemId),
          ctx.inMyAreas(pointDirectory.areaId),
        ),
      )
      .orderBy(
        asc(pointDirectory.areaOrder),
        asc(pointDirectory.systemOrder),
        asc(pointDirectory.systemCode),
        asc(watchItem.position),
      )
      .all();
    return rows.flatMap(({ measurements_watch_item: item, systems_point_directory: place }) => {
      const parameter = parameters.get(item.parameterId);
      if (!parameter || parameter.isRetired || place.systemState === "retired") return [];
      return [
        {
          pointId: place.pointId,
          pointName: place.pointName,
          isDefaultPoint: Boolean(place.isDefaultPoint),
          systemId: place.systemId,
          systemCode: place.systemCode,
          systemName: place.systemName,
          systemState: place.systemState,
          areaId: place.areaId,
          areaName: place.areaName,
          parameter,
          unit: item.unit ?? parameter.unit,
          everyDays: item.everyDays,
          methodId: item.methodId,
          instrumentId: item.instrumentId,
          limits: limitsInForce(ctx.db, place.pointId, parameter.id, ctx.at),
          recent: recentReadings(ctx.db, place.pointId, parameter.id, recent),
        },
      ];
    });
  },
});
