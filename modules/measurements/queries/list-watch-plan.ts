import { and, asc, eq, isNull } from "drizzle-orm";
import { z } from "zod";
import { defineQuery } from "@/modules/audit";
import { pointDirectory } from "@/modules/systems";
import { measurementsMay } from "../abilities";
import type { WatchPlanRow } from "../model";
import { watchItem } from "../schema";

/** What is read where, as it is planned: without readings and limits, in the order of each point's list. */
export const listWatchPlan = defineQuery({
  name: "listWatchPlan",
  permission: measurementsMay.read,
  input: z.strictObject({}),
  run: ({ db, inMyAreas }): WatchPlanRow[] =>
    db
      .select({
        pointId: watchItem.pointId,
        parameterId: watchItem.parameterId,
        everyDays: watchItem.everyDays,
        unit: watchItem.unit,
        methodId: watchItem.methodId,
        instrumentId: watchItem.instrumentId,
      })
      .from(watchItem)
      .innerJoin(pointDirectory, eq(pointDirectory.pointId, watchItem.pointId))
      .where(and(isNull(watchItem.endedAt), inMyAreas(pointDirectory.areaId)))
      .orderBy(asc(watchItem.pointId), asc(watchItem.position))
      .all(),
});
