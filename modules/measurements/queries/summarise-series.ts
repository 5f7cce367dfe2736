import { and, asc, eq, gte, lte } from "drizzle-orm";
import { z } from "zod";
import { defineQuery } from "@/modules/audit";
import { pointDirectory } from "@/modules/systems";
import { measurementsMay } from "../abilities";
import { type TimedStatus, timeWithin } from "../rules/time-within";
import { readingInForce } from "../schema";
import type { SeriesSummary } from "../series-model";

const DAY_MS = 86_400_000;
/** A reading speaks for two days at most; after that it is not known how things stand. */
const HOLD_MS = 2 * DAY_MS;

/** How every series of the areas a person may see did over the last days: share of time within tolerance, readings out. */
export const summariseSeries = defineQuery({
  name: "summariseSeries",
  permission: measurementsMay.read,
  input: z.strictObject({
    days: z.coerce.number().int().min(1).max(366).default(30),
    systemId: z.coerce.number().int().positive().optional(),
  }),
  run(ctx, { days, systemId }): SeriesSummary[] {
    const rows = ctx.db
      .select({
        pointId: readingInForce.pointId,
        parameterId: readingInForce.parameterId,
        takenAt: readingInForce.takenAt,
        status: readingInForce.status,
      })
      .from(readingInForce)
      .innerJoin(pointDirectory, eq(pointDirectory.pointId, readingInForce.pointId))
      .where(
        and(
          gte(readingInForce.takenAt, ctx.at - days * DAY_MS),
          lte(readingInForce.takenAt, ctx.at),
          ctx.inMyAreas(pointDirectory.areaId),
          systemId === undefined ? undefined : eq(pointDirectory.systemId, systemId),
        ),
      )
      .orderBy(asc(readingInForce.takenAt))
      .all();
    const bySeries = new Map<string, { pointId: number; parameterId: number; readings: TimedStatus[] }>();
    for (const { pointId, parameterId, takenAt, status } of rows) {
      const key = `${pointId} ${parameterId}`;
      const found = bySeries.get(key) ?? { pointId, parameterId, readings: [] };
      found.readings.push({ takenAt, status });
      bySeries.set(key, found);
    }
    return [...bySeries.values()].map(({ pointId, parameterId, readings }) => ({
      pointId,
      parameterId,
      within: timeWithin(readings, ctx.at, HOLD_MS).share,
      out: readings.filter((each) => each.status === "out").length,
      readings: readings.length,
    }));
  },
});
