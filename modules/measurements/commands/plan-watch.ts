import { and, eq, isNull } from "drizzle-orm";
import type { z } from "zod";
import type { Orm } from "@/db/database";
import { invalidField } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { getInstrumentById, getMethod, getParameter } from "@/modules/methods";
import type { FacilityParameter } from "@/modules/methods/model";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { planWatchInput } from "../input";
import { getPoint } from "../points";
import { watchItem } from "../schema";

type Item = z.output<typeof planWatchInput>["items"][number];

/** Unit, method and instrument must fit the parameter; a retired parameter stays where it is and is put nowhere new. */
function mustFit(db: Orm, item: Item, parameter: FacilityParameter, pointer: string, isThere: boolean): void {
  if (parameter.isRetired && !isThere) {
    throw invalidField(`${pointer}/parameterId`, "retired", `${parameter.name} is retired: choose another.`);
  }
  if (item.unit && !parameter.acceptedUnits.includes(item.unit)) {
    const detail = `${parameter.name} is not typed in ${item.unit}. Use one of: ${parameter.acceptedUnits.join(", ")}.`;
    throw invalidField(`${pointer}/unit`, "unknown-unit", detail);
  }
  if (item.methodId) {
    const method = getMethod(db, item.methodId);
    if (method.parameterId !== parameter.id) {
      const detail = `Method ${method.code} does not measure ${parameter.name}: choose one that does.`;
      throw invalidField(`${pointer}/methodId`, "other-parameter", detail);
    }
  }
  if (item.instrumentId && getInstrumentById(db, item.instrumentId).state === "retired") {
    throw invalidField(`${pointer}/instrumentId`, "retired", "This instrument is retired: choose another.");
  }
}

/** Says what is read at a point, in which order, how often, and with what by default. */
export const planWatch = defineCommand({
  verb: "planWatch",
  permission: measurementsMay.planWatch,
  input: planWatchInput,
  run(ctx, { pointId, items }) {
    getPoint(ctx.db, pointId);
    const open = ctx.db
      .select()
      .from(watchItem)
      .where(and(eq(watchItem.pointId, pointId), isNull(watchItem.endedAt)))
      .all();
    for (const item of open.filter((row) => !items.some((each) => each.parameterId === row.parameterId))) {
      ctx.db.update(watchItem).set({ endedAt: ctx.at }).where(eq(watchItem.id, item.id)).run();
    }
    items.forEach((item, position) => {
      const parameter = getParameter(ctx.db, item.parameterId);
      if (items.findIndex((each) => each.parameterId === item.parameterId) !== position) {
        throw invalidField(
          `/items/${position}/parameterId`,
          "twice",
          `${parameter.name} stands in the list twice.`,
        );
      }
      const known = open.find((row) => row.parameterId === item.parameterId);
      mustFit(ctx.db, item, parameter, `/items/${position}`, known !== undefined);
      const values = {
        position,
        everyDays: item.everyDays ?? null,
        unit: item.unit ?? null,
        methodId: item.methodId ?? null,
        instrumentId: item.instrumentId ?? null,
      };
      if (known) ctx.db.update(watchItem).set(values).where(eq(watchItem.id, known.id)).run();
      else
        ctx.db
          .insert(watchItem)
          .values({ pointId, parameterId: item.parameterId, since: ctx.at, ...values })
          .run();
    });
    return {
      result: { pointId, items: items.length },
      event: { kind: measurementsEvents.watchPlanned, subject: { type: "point", id: pointId } },
    };
  },
});
