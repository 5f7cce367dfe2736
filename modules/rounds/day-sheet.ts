import { and, asc, desc, eq, gt, gte, inArray, isNull, lt, lte, or, sql } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { DAY_MS } from "@/lib/clock";
import { settings } from "@/lib/env";
import { dayBounds } from "@/lib/zone";
import { explanation, readingInForce, watchItem } from "@/modules/measurements";
import { parameterDirectory } from "@/modules/methods";
import { contentHash } from "@/modules/signoff";
import { pointDirectory } from "@/modules/systems";
import type { SheetGap, SheetLine } from "./model";
import { dayReview } from "./schema";

export type DaySheet = {
  areaId: number;
  onDay: string;
  fromAt: number;
  toAt: number;
  lines: SheetLine[];
  gaps: SheetGap[];
  /** Hash of exactly what is signed: the lines. (Gaps follow from the plan as it stands now, and are shown beside.) */
  contentHash: string;
};

/** The moments between which an operational day lies. */
export function dayLimits(onDay: string): { fromAt: number; toAt: number } {
  const { STILLWELL_ZONE, dayCutMinutes } = settings();
  return dayBounds(onDay, STILLWELL_ZONE, dayCutMinutes);
}

function linesOf(db: Orm, areaId: number, fromAt: number, toAt: number): SheetLine[] {
  const rows = db
    .select()
    .from(readingInForce)
    .innerJoin(pointDirectory, eq(pointDirectory.pointId, readingInForce.pointId))
    .innerJoin(parameterDirectory, eq(parameterDirectory.parameterId, readingInForce.parameterId))
    .where(
      and(eq(pointDirectory.areaId, areaId), gte(readingInForce.takenAt, fromAt), lt(readingInForce.takenAt, toAt)),
    )
    .orderBy(
      asc(pointDirectory.systemOrder),
      asc(pointDirectory.systemCode),
      asc(pointDirectory.pointCode),
      asc(parameterDirectory.parameterCode),
      asc(readingInForce.takenAt),
      asc(readingInForce.id),
    )
    .all();
  const ids = rows.map((row) => row.measurements_reading_in_force.id);
  const said = explanationsOf(db, ids);
  return rows.map((row) => {
    const { measurements_reading_in_force: reading, systems_point_directory: place } = row;
    return {
      readingId: reading.id,
      pointId: reading.pointId,
      parameterId: reading.parameterId,
      systemCode: place.systemCode,
      pointCode: place.pointCode,
      parameterCode: row.methods_parameter_directory.parameterCode,
      typedText: reading.typedText,
      typedUnit: reading.typedUnit,
      value: reading.value,
      qualifier: reading.qualifier,
      answer: reading.answer,
      takenAt: reading.takenAt,
      enteredAt: reading.enteredAt,
      takenBy: reading.takenBy,
      enteredBy: reading.enteredBy,
      methodId: reading.methodId,
      instrumentId: reading.instrumentId,
      note: reading.note,
      supersedesId: reading.supersedesId,
      correctionReason: reading.correctionReason,
      isConfirmed: reading.confirmedAt !== null,
      status: reading.status,
      side: reading.side,
      sentence: reading.sentence,
      explanations: said.get(reading.id) ?? [],
    };
  });
}

function explanationsOf(db: Orm, readingIds: number[]): Map<number, SheetLine["explanations"][number][]> {
  const byReading = new Map<number, SheetLine["explanations"][number][]>();
  for (let start = 0; start < readingIds.length; start += 500) {
    const rows = db
      .select()
      .from(explanation)
      .where(inArray(explanation.readingId, readingIds.slice(start, start + 500)))
      .orderBy(asc(explanation.id))
      .all();
    for (const row of rows) {
      const list = byReading.get(row.readingId) ?? [];
      list.push({ text: row.text, by: row.explainedBy, at: row.explainedAt });
      byReading.set(row.readingId, list);
    }
  }
  return byReading;
}

/** What was due on the day by the plan of watch items and has no reading: the last one lies further back than allowed. */
function gapsOf(db: Orm, areaId: number, fromAt: number, toAt: number): SheetGap[] {
  const due = db
    .select()
    .from(watchItem)
    .innerJoin(pointDirectory, eq(pointDirectory.pointId, watchItem.pointId))
    .innerJoin(parameterDirectory, eq(parameterDirectory.parameterId, watchItem.parameterId))
    .where(
      and(
        eq(pointDirectory.areaId, areaId),
        eq(pointDirectory.systemState, "in-service"),
        lte(watchItem.since, fromAt),
        or(isNull(watchItem.endedAt), gt(watchItem.endedAt, toAt)),
      ),
    )
    .orderBy(asc(pointDirectory.systemOrder), asc(pointDirectory.systemCode), asc(watchItem.position))
    .all();
  return due.flatMap(({ measurements_watch_item: item, systems_point_directory: place, methods_parameter_directory: parameter }) => {
    if (item.everyDays === null) return [];
    const last = db
      .select({ at: sql<number | null>`max(${readingInForce.takenAt})` })
      .from(readingInForce)
      .where(
        and(
          eq(readingInForce.pointId, item.pointId),
          eq(readingInForce.parameterId, item.parameterId),
          lt(readingInForce.takenAt, toAt),
        ),
      )
      .get();
    const lastAt = last?.at ?? null;
    if (lastAt !== null && lastAt >= fromAt - (item.everyDays - 1) * DAY_MS) return [];
    return [
      {
        systemCode: place.systemCode,
        pointCode: place.pointCode,
        parameterCode: parameter.parameterCode,
        parameterName: parameter.parameterName,
        lastAt,
      },
    ];
  });
}

/** A line as it is signed: by ids, so that a system's new code changes nothing that was signed. */
function signedLine({ systemCode: _system, pointCode: _point, parameterCode: _parameter, ...line }: SheetLine) {
  return line;
}

/** What an area read on an operational day, what is missing, and the hash of what was read. */
export function daySheet(db: Orm, areaId: number, onDay: string): DaySheet {
  const { fromAt, toAt } = dayLimits(onDay);
  const lines = linesOf(db, areaId, fromAt, toAt);
  const gaps = gapsOf(db, areaId, fromAt, toAt);
  return { areaId, onDay, fromAt, toAt, lines, gaps, contentHash: contentHash({ areaId, onDay, lines: lines.map(signedLine) }) };
}

/** The newest review of a sheet. */
export function newestReview(db: Orm, areaId: number, onDay: string) {
  return (
    db
      .select()
      .from(dayReview)
      .where(and(eq(dayReview.areaId, areaId), eq(dayReview.onDay, onDay)))
      .orderBy(desc(dayReview.id))
      .limit(1)
      .get() ?? null
  );
}
