import { eq, sql } from "drizzle-orm";
import { z } from "zod";
import type { Orm } from "@/db/database";
import { DAY_MS } from "@/lib/clock";
import { invariant } from "@/lib/invariant";
import { notFound, Problem } from "@/lib/problem";
import { type CommandContext, defineCommand } from "@/modules/audit";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { deliveredReadingInput } from "../input";
import { takeReading } from "../intake";
import { IntakeCache } from "../intake-cache";
import type { JudgementCause } from "../model";
import { delivery } from "../schema";
import { judgeSeriesAgain } from "./judge-series-again";

function getDelivery(db: Orm, deliveryId: number) {
  const row = db.select().from(delivery).where(eq(delivery.id, deliveryId)).get();
  if (!row) throw notFound("such delivery of readings");
  return row;
}

/** Begins a bulk of readings that nobody sees until it is published. */
export const openDelivery = defineCommand({
  verb: "openDelivery",
  permission: measurementsMay.deliver,
  input: z.strictObject({ sourceRef: z.string().min(1).max(80) }),
  run(ctx, { sourceRef }) {
    const row = ctx.db
      .insert(delivery)
      .values({ source: "import", sourceRef, openedAt: ctx.at })
      .returning({ id: delivery.id })
      .get();
    return {
      result: { deliveryId: row.id },
      event: {
        kind: measurementsEvents.deliveryOpened,
        subject: { type: "delivery", id: row.id },
        payload: { sourceRef },
      },
    };
  },
});

/** Adds a slice of readings to a bulk that is not published yet. Sent again, it adds nothing twice (UUIDs). */
export const growDelivery = defineCommand({
  verb: "growDelivery",
  permission: measurementsMay.deliver,
  input: z.strictObject({
    deliveryId: z.number().int(),
    readings: z.array(deliveredReadingInput).min(1).max(500),
  }),
  run(ctx, { deliveryId, readings }) {
    invariant(ctx.actor.personId !== null, "a person brings in readings");
    const row = getDelivery(ctx.db, deliveryId);
    if (row.publishedAt !== null)
      throw new Problem("conflict", "These readings have been published; nothing can be added.");
    const intake = {
      db: ctx.db,
      at: ctx.at,
      enteredBy: ctx.actor.personId,
      source: row.source,
      sourceRef: row.sourceRef,
      deliveryId,
      cache: new IntakeCache(ctx.db),
    };
    const added = readings.filter((each, index) => !takeReading(intake, each, `/readings/${index}`).isRepeat);
    return {
      result: { added: added.length },
      event: {
        kind: measurementsEvents.deliveryGrown,
        subject: { type: "delivery", id: deliveryId },
        payload: { added: added.length },
      },
    };
  },
});

type Series = { pointId: number; parameterId: number; fromAt: number; toAt: number };

/** The series a delivery touches, found by steps through its index: as quick for a million readings as for ten. */
function touchedSeries(db: Orm, deliveryId: number): Series[] {
  const found: Series[] = [];
  let last = { pointId: -1, parameterId: -1 };
  for (;;) {
    const next = db.get<Series | undefined>(sql`
      select point_id as "pointId", parameter_id as "parameterId", taken_at as "fromAt",
        (select max(taken_at) from measurements_reading s where s.delivery_id = r.delivery_id
          and s.point_id = r.point_id and s.parameter_id = r.parameter_id) as "toAt"
      from measurements_reading r
      where delivery_id = ${deliveryId} and (point_id, parameter_id) > (${last.pointId}, ${last.parameterId})
      order by point_id, parameter_id, taken_at limit 1`);
    if (!next) return found;
    found.push(next);
    last = next;
  }
}

/** Asks that every series a delivery touches be judged again, a day beyond its last reading included. */
function judgeTouchedSeries(ctx: CommandContext, deliveryId: number, cause: JudgementCause): void {
  for (const each of touchedSeries(ctx.db, deliveryId)) {
    ctx.enqueue(judgeSeriesAgain, { ...each, toAt: each.toAt + DAY_MS, cause, after: null });
  }
}

/** Makes a bulk of readings visible, all at one moment. */
export const publishDelivery = defineCommand({
  verb: "publishDelivery",
  permission: measurementsMay.deliver,
  input: z.strictObject({ deliveryId: z.number().int() }),
  run(ctx, { deliveryId }) {
    if (getDelivery(ctx.db, deliveryId).publishedAt !== null)
      throw new Problem("conflict", "These readings are visible already.");
    ctx.db.update(delivery).set({ publishedAt: ctx.at }).where(eq(delivery.id, deliveryId)).run();
    judgeTouchedSeries(ctx, deliveryId, "delivery");
    return {
      result: { deliveryId },
      event: { kind: measurementsEvents.deliveryPublished, subject: { type: "delivery", id: deliveryId } },
    };
  },
});

/** Withdraws a bulk of readings whole; none of them counts any more, all stay readable. */
export const withdrawDelivery = defineCommand({
  verb: "withdrawDelivery",
  permission: measurementsMay.withdrawDelivery,
  input: z.strictObject({
    deliveryId: z.number().int(),
    reason: z.string().trim().min(3, "Say why.").max(500),
  }),
  run(ctx, { deliveryId, reason }) {
    const row = getDelivery(ctx.db, deliveryId);
    if (row.withdrawnAt !== null)
      throw new Problem("conflict", "These readings have been withdrawn already.");
    ctx.db
      .update(delivery)
      .set({ withdrawnAt: ctx.at, withdrawnBy: ctx.actor.personId, withdrawnReason: reason })
      .where(eq(delivery.id, deliveryId))
      .run();
    judgeTouchedSeries(ctx, deliveryId, "withdrawal");
    return {
      result: { deliveryId },
      event: {
        kind: measurementsEvents.deliveryWithdrawn,
        subject: { type: "delivery", id: deliveryId },
        reason,
      },
    };
  },
});
