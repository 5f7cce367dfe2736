import { and, asc, desc, eq, gte, inArray, isNotNull, isNull, lt } from "drizzle-orm";
import { z } from "zod";
import type { Orm } from "@/db/database";
import { DAY_MS } from "@/lib/clock";
import { notFound } from "@/lib/problem";
import { defineQuery } from "@/modules/audit";
import { limitsInForce, reading, watchItem } from "@/modules/measurements";
import type { Bounds } from "@/modules/measurements/model";
import { allParameters } from "@/modules/methods";
import { signaturesUnder } from "@/modules/signoff";
import { listAreas, pointDirectory } from "@/modules/systems";
import { roundsMay } from "../abilities";
import { type DaySheet, daySheet, daySheets, newestReview, newestReviews } from "../day-sheet";
import { sheetKey } from "../input";
import type { OldValue, StruckOut } from "../model";
import { countSheet, reviewHindrances, sheetState } from "../rules/sheet-state";

/** The limits that held for each line when it was taken, by reading: what a well strip is drawn from. */
function boundsOf(db: Orm, { lines }: DaySheet): Record<number, Bounds> {
  const bounds: Record<number, Bounds> = {};
  for (const line of lines) {
    const limits = limitsInForce(db, line.pointId, line.parameterId, line.takenAt);
    if (limits.state === "in-force") bounds[line.readingId] = limits.bounds;
  }
  return bounds;
}

/** Where each line stands in the round as it is planned now, by reading; what is in no plan has no place and comes last. */
function placesOf(db: Orm, { areaId, lines }: DaySheet): Record<number, number> {
  const plan = db
    .select({ pointId: watchItem.pointId, parameterId: watchItem.parameterId })
    .from(watchItem)
    .innerJoin(pointDirectory, eq(pointDirectory.pointId, watchItem.pointId))
    .where(and(eq(pointDirectory.areaId, areaId), isNull(watchItem.endedAt)))
    .orderBy(
      asc(pointDirectory.systemOrder),
      asc(pointDirectory.systemCode),
      desc(pointDirectory.isDefaultPoint),
      asc(pointDirectory.pointCode),
      asc(watchItem.position),
    )
    .all();
  const placeOf = new Map(plan.map((item, place) => [`${item.pointId}:${item.parameterId}`, place]));
  return Object.fromEntries(
    lines.flatMap(({ readingId, pointId, parameterId }) => {
      const place = placeOf.get(`${pointId}:${parameterId}`);
      return place === undefined ? [] : [[readingId, place]];
    }),
  );
}

/** What corrected lines said before, by the reading that was corrected. */
function oldValuesOf(db: Orm, { lines }: DaySheet): Record<number, OldValue> {
  const ids = lines.flatMap((line) => (line.supersedesId === null ? [] : [line.supersedesId]));
  const rows = db.select().from(reading).where(inArray(reading.id, ids)).all();
  return Object.fromEntries(
    rows.map(({ id, typedText, typedUnit, value, qualifier, answer, takenAt, enteredBy, enteredAt }) => [
      id,
      { typedText, typedUnit, value, qualifier, answer, takenAt, enteredBy, enteredAt },
    ]),
  );
}

/** Readings of the day that were struck out: they count no more, and a reviewer sees that they were there. */
function struckOutOf(db: Orm, { areaId, fromAt, toAt }: DaySheet): StruckOut[] {
  return db
    .select()
    .from(reading)
    .innerJoin(pointDirectory, eq(pointDirectory.pointId, reading.pointId))
    .where(
      and(
        eq(pointDirectory.areaId, areaId),
        isNotNull(reading.voidedAt),
        gte(reading.takenAt, fromAt),
        lt(reading.takenAt, toAt),
      ),
    )
    .orderBy(asc(reading.takenAt))
    .all()
    .map(({ measurements_reading: row, systems_point_directory: place }) => ({
      readingId: row.id,
      systemCode: place.systemCode,
      parameterId: row.parameterId,
      typedText: row.typedText,
      typedUnit: row.typedUnit,
      voidedBy: row.voidedBy,
      voidedAt: row.voidedAt,
      reason: row.voidReason ?? "",
    }));
}

/** One area's day as a lead reviews it: lines, gaps, counts, state, signatures, and what hinders a review by this person. */
export const getDaySheet = defineQuery({
  name: "getDaySheet",
  permission: roundsMay.read,
  input: sheetKey,
  run(ctx, { areaId, onDay }) {
    const area = listAreas.run(ctx, {}).find((each) => each.id === areaId);
    if (!area) throw notFound("such area");
    const sheet = daySheet(ctx.db, areaId, onDay);
    const newest = newestReview(ctx.db, areaId, onDay);
    return {
      sheet,
      area: { id: area.id, code: area.code, name: area.name },
      isOver: ctx.at >= sheet.toAt,
      counts: countSheet(sheet.lines, sheet.gaps),
      state: sheetState(newest, sheet.contentHash),
      newest,
      signatures: signaturesUnder(ctx.db, { type: "day-sheet", id: `${areaId}/${onDay}` }, sheet.contentHash),
      hindrances: ctx.actor.personId === null ? [] : reviewHindrances(sheet.lines, ctx.actor.personId),
      bounds: boundsOf(ctx.db, sheet),
      places: placesOf(ctx.db, sheet),
      oldValues: oldValuesOf(ctx.db, sheet),
      struckOut: struckOutOf(ctx.db, sheet),
      parameters: allParameters(ctx.db),
    };
  },
});

export type DaySheetShown = ReturnType<(typeof getDaySheet)["run"]>;

/** Days that lie further apart than this are asked for one after the other. */
const WIDEST_DAYS = 62;

const nearDays = z
  .string()
  .transform((text) => text.split(","))
  .pipe(z.array(z.iso.date("Write days such as 2026-03-01,2026-03-02.")).min(1).max(31))
  .refine((days) => {
    const moments = days.map((day) => Date.parse(day));
    return Math.max(...moments) - Math.min(...moments) <= WIDEST_DAYS * DAY_MS;
  }, `Ask for days that lie within ${WIDEST_DAYS} days.`);

/** The sheets of some operational days, in the order asked, without their lines. */
export const listDaySheets = defineQuery({
  name: "listDaySheets",
  permission: roundsMay.read,
  input: z.strictObject({ days: nearDays }),
  run(ctx, { days }) {
    const areas = new Map(listAreas.run(ctx, {}).map((area) => [area.id, area]));
    const newestOf = newestReviews(ctx.db, days);
    return daySheets(ctx.db, [...areas.keys()], days).map((sheet) => {
      const { areaId, onDay, contentHash, lines, gaps, toAt } = sheet;
      const newest = newestOf(areaId, onDay);
      return {
        areaId,
        areaCode: areas.get(areaId)?.code ?? "",
        areaName: areas.get(areaId)?.name ?? "",
        onDay,
        isOver: ctx.at >= toAt,
        contentHash,
        counts: countSheet(lines, gaps),
        state: sheetState(newest, contentHash),
        reviewedAt: newest?.reviewedAt ?? null,
        reviewedBy: newest?.reviewedBy ?? null,
        comment: newest?.comment ?? null,
        /** Who took or entered something on it. */
        people: [...new Set(lines.flatMap((line) => [line.takenBy, line.enteredBy]))],
        hindrances: ctx.actor.personId === null ? [] : reviewHindrances(lines, ctx.actor.personId),
      };
    });
  },
});

export type DaySheetRow = ReturnType<(typeof listDaySheets)["run"]>[number];
