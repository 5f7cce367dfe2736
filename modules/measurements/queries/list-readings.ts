import { and, asc, desc, eq, gte, inArray, lt, or } from "drizzle-orm";
import { z } from "zod";
import { notFound } from "@/lib/problem";
import { defineQuery } from "@/modules/audit";
import { getParameter } from "@/modules/methods";
import { pointDirectory } from "@/modules/systems";
import { measurementsMay } from "../abilities";
import { explanation, judgement, reading, readingInForce } from "../schema";

const id = z.coerce.number().int().positive();
const moment = z.coerce.number().int();

/** Readings in force, newest first, for lists; keyset paging by the moment taken and the id. */
export const listReadings = defineQuery({
  name: "listReadings",
  permission: measurementsMay.read,
  input: z.strictObject({
    systemId: id.optional(),
    areaId: id.optional(),
    fromAt: moment.optional(),
    toAt: moment.optional(),
    status: z
      .string()
      .transform((text) => text.split(","))
      .pipe(z.array(z.enum(["within", "watch", "out", "implausible", "unjudged", "none"])))
      .optional(),
    beforeAt: moment.optional(),
    beforeId: id.optional(),
    limit: z.coerce.number().int().min(1).max(500).default(100),
  }),
  run(ctx, input) {
    const { beforeAt, beforeId } = input;
    return ctx.db
      .select()
      .from(readingInForce)
      .innerJoin(pointDirectory, eq(pointDirectory.pointId, readingInForce.pointId))
      .where(
        and(
          ctx.inMyAreas(pointDirectory.areaId),
          input.systemId === undefined ? undefined : eq(pointDirectory.systemId, input.systemId),
          input.areaId === undefined ? undefined : eq(pointDirectory.areaId, input.areaId),
          input.fromAt === undefined ? undefined : gte(readingInForce.takenAt, input.fromAt),
          input.toAt === undefined ? undefined : lt(readingInForce.takenAt, input.toAt),
          input.status === undefined ? undefined : inArray(readingInForce.status, input.status),
          beforeAt === undefined || beforeId === undefined
            ? undefined
            : or(
                lt(readingInForce.takenAt, beforeAt),
                and(eq(readingInForce.takenAt, beforeAt), lt(readingInForce.id, beforeId)),
              ),
        ),
      )
      .orderBy(desc(readingInForce.takenAt), desc(readingInForce.id))
      .limit(input.limit)
      .all()
      .map((row) => ({ ...row.measurements_reading_in_force, place: row.systems_point_directory }));
  },
});

/** One reading with everything said about it: its judgements, what it corrected and what corrected it, explanations. */
export const getReading = defineQuery({
  name: "getReading",
  permission: measurementsMay.read,
  input: z.strictObject({ readingId: id }),
  run(ctx, { readingId }) {
    const row = ctx.db.select().from(reading).where(eq(reading.id, readingId)).get();
    const place =
      row && ctx.db.select().from(pointDirectory).where(eq(pointDirectory.pointId, row.pointId)).get();
    if (!row || !place || (ctx.areaIds !== null && !ctx.areaIds.includes(place.areaId)))
      throw notFound("such reading");
    const chain = [row];
    for (let older = row.supersedesId; older !== null; older = chain[0]?.supersedesId ?? null) {
      const found = ctx.db.select().from(reading).where(eq(reading.id, older)).get();
      if (!found) break;
      chain.unshift(found);
    }
    for (let newest: number | undefined = row.id; newest !== undefined; ) {
      const later = ctx.db.select().from(reading).where(eq(reading.supersedesId, newest)).get();
      if (later) chain.push(later);
      newest = later?.id;
    }
    const ids = chain.map((each) => each.id);
    const counts = ctx.db
      .select({ id: readingInForce.id })
      .from(readingInForce)
      .where(eq(readingInForce.id, row.id))
      .get();
    return {
      reading: row,
      place,
      parameter: getParameter(ctx.db, row.parameterId),
      /** False once it has been corrected, struck out or withdrawn. */
      isInForce: counts !== undefined,
      versions: chain,
      judgements: ctx.db
        .select()
        .from(judgement)
        .where(inArray(judgement.readingId, ids))
        .orderBy(asc(judgement.id))
        .all(),
      explanations: ctx.db
        .select()
        .from(explanation)
        .where(inArray(explanation.readingId, ids))
        .orderBy(asc(explanation.id))
        .all(),
    };
  },
});
