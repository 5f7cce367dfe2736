import { and, eq, isNull } from "drizzle-orm";
import { invalidField } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { getParameter } from "@/modules/methods";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { planWatchInput } from "../input";
import { getPoint } from "../points";
import { watchItem } from "../schema";

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
        throw invalidField(`/items/${position}/parameterId`, "twice", `${parameter.name} stands in the list twice.`);
      }
      const values = {
        position,
        everyDays: item.everyDays ?? null,
        unit: item.unit ?? null,
        methodId: item.methodId ?? null,
        instrumentId: item.instrumentId ?? null,
      };
      const known = open.find((row) => row.parameterId === item.parameterId);
      if (known) ctx.db.update(watchItem).set(values).where(eq(watchItem.id, known.id)).run();
      else ctx.db.insert(watchItem).values({ pointId, parameterId: item.parameterId, since: ctx.at, ...values }).run();
    });
    return {
      result: { pointId, items: items.length },
      event: { kind: measurementsEvents.watchPlanned, subject: { type: "point", id: pointId } },
    };
  },
});
