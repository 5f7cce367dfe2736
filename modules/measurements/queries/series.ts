import { and, asc, eq, gt, gte, lt, min, or } from "drizzle-orm";
import { z } from "zod";
import { settings } from "@/lib/env";
import { notFound } from "@/lib/problem";
import { defineQuery, type QueryContext } from "@/modules/audit";
import { getParameter } from "@/modules/methods";
import { pointDirectory } from "@/modules/systems";
import { measurementsMay } from "../abilities";
import { approvedVersions } from "../limits";
import type { PointPlace } from "../points";
import { limitCourse } from "../rules/limit-course";
import { readingInForce } from "../schema";
import type { SeriesFrame, SeriesSlice } from "../series-model";

const id = z.coerce.number().int().positive();
const moment = z.coerce.number().int().min(0);
const LATEST = 8.64e15;

/** So many readings are handed out at once: small enough that nobody else waits, large enough for few requests. */
export const SLICE = 8_000;

/** Where a point is, for those who may see its area. @throws Problem `not-found` */
export function visiblePoint(ctx: QueryContext, pointId: number): PointPlace {
  const place = ctx.db.select().from(pointDirectory).where(eq(pointDirectory.pointId, pointId)).get();
  if (!place || (ctx.areaIds !== null && !ctx.areaIds.includes(place.areaId))) throw notFound("such point");
  return place;
}

/**
 * What stands around a series: where, of what, since when it is read, and how its limits ran from `fromAt` (its first
 * reading, unless told) to `toAt` (now, unless told). @throws Problem `not-found`
 */
export const getSeriesFrame = defineQuery({
  name: "getSeriesFrame",
  permission: measurementsMay.read,
  input: z.strictObject({ pointId: id, parameterId: id, fromAt: moment.optional(), toAt: moment.optional() }),
  run(ctx, { pointId, parameterId, fromAt, toAt = ctx.at }): SeriesFrame {
    const place = visiblePoint(ctx, pointId);
    const parameter = getParameter(ctx.db, parameterId);
    const firstAt =
      ctx.db
        .select({ at: min(readingInForce.takenAt) })
        .from(readingInForce)
        .where(and(eq(readingInForce.pointId, pointId), eq(readingInForce.parameterId, parameterId)))
        .get()?.at ?? null;
    const from = Math.min(fromAt ?? firstAt ?? toAt, toAt);
    const versions = approvedVersions(ctx.db, pointId, parameterId);
    return {
      pointId,
      pointName: place.pointName,
      isDefaultPoint: Boolean(place.isDefaultPoint),
      systemCode: place.systemCode,
      parameter,
      firstAt,
      fromAt: from,
      toAt,
      course: limitCourse(versions, from, toAt, settings().STILLWELL_ZONE),
    };
  },
});

/** One slice of a series, oldest first: column by column, so that ten years travel as a few hundred kilobytes. */
export const listSeriesSlice = defineQuery({
  name: "listSeriesSlice",
  permission: measurementsMay.read,
  input: z.strictObject({
    pointId: id,
    parameterId: id,
    fromAt: moment.default(0),
    toAt: moment.default(LATEST),
    afterAt: moment.optional(),
    afterId: id.optional(),
  }),
  run(ctx, input): SeriesSlice {
    const rows = sliceRows(ctx, input);
    const last = rows.length < SLICE ? undefined : rows.at(-1);
    const slice: SeriesSlice = {
      ids: rows.map((row) => row.id),
      at: rows.map((row) => row.takenAt),
      values: rows.map((row) => row.value),
      statuses: rows.map((row) => row.status),
      takenBy: rows.map((row) => row.takenBy),
      methodIds: rows.map((row) => row.methodId),
      instrumentIds: rows.map((row) => row.instrumentId),
      more: {},
      next: last ? { afterAt: last.takenAt, afterId: last.id } : null,
    };
    rows.forEach((row, index) => {
      const more = {
        ...(row.side === null ? {} : { side: row.side }),
        ...(row.qualifier === "" ? {} : { qualifier: row.qualifier }),
        ...(row.supersedesId === null ? {} : { isCorrected: true }),
        ...(row.answer === null ? {} : { answer: row.answer }),
        ...(row.value === null ? { typedText: row.typedText } : {}),
        ...(row.note === null || row.note === "" ? {} : { note: row.note }),
      };
      if (Object.keys(more).length > 0) slice.more[index] = more;
    });
    return slice;
  },
});

type SliceInput = z.output<(typeof listSeriesSlice)["input"]>;

/** The rows of one slice with everything that a file of them tells. @throws Problem `not-found` for another's area */
export function sliceRows(ctx: QueryContext, input: SliceInput) {
  const { pointId, parameterId, fromAt, toAt, afterAt, afterId } = input;
  visiblePoint(ctx, pointId);
  const isAfter =
    afterAt === undefined || afterId === undefined
      ? undefined
      : and(
          gte(readingInForce.takenAt, afterAt),
          or(gt(readingInForce.takenAt, afterAt), gt(readingInForce.id, afterId)),
        );
  return ctx.db
    .select({
      id: readingInForce.id,
      takenAt: readingInForce.takenAt,
      enteredAt: readingInForce.enteredAt,
      takenBy: readingInForce.takenBy,
      value: readingInForce.value,
      qualifier: readingInForce.qualifier,
      answer: readingInForce.answer,
      typedText: readingInForce.typedText,
      typedUnit: readingInForce.typedUnit,
      status: readingInForce.status,
      side: readingInForce.side,
      sentence: readingInForce.sentence,
      methodId: readingInForce.methodId,
      instrumentId: readingInForce.instrumentId,
      note: readingInForce.note,
      supersedesId: readingInForce.supersedesId,
      correctionReason: readingInForce.correctionReason,
    })
    .from(readingInForce)
    .where(
      and(
        eq(readingInForce.pointId, pointId),
        eq(readingInForce.parameterId, parameterId),
        gte(readingInForce.takenAt, fromAt),
        lt(readingInForce.takenAt, toAt),
        isAfter,
      ),
    )
    .orderBy(asc(readingInForce.takenAt), asc(readingInForce.id))
    .limit(SLICE)
    .all();
}
