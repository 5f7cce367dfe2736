import { and, asc, eq, gt, gte, inArray, isNotNull, isNull, lt, lte, or, sql } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { settings } from "@/lib/env";
import { dayBounds } from "@/lib/zone";
import { explanation, readingInForce, watchItem } from "@/modules/measurements";
import { parameterDirectory } from "@/modules/methods";
import { contentHash } from "@/modules/signoff";
import { pointDirectory } from "@/modules/systems";
import type { SheetGap, SheetLine } from "./model";
import { type DueItem, gapsOfDay } from "./rules/gaps";
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

type Span = { fromAt: number; toAt: number };
type Placed = { areaId: number; line: SheetLine };

/** The moments between which an operational day lies. */
export function dayLimits(onDay: string): Span {
  const { STILLWELL_ZONE, dayCutMinutes } = settings();
  return dayBounds(onDay, STILLWELL_ZONE, dayCutMinutes);
}

type LineRow = Omit<SheetLine, "isConfirmed" | "explanations"> & { confirmedAt: number | null };

const LINE_COLUMNS = {
  areaId: pointDirectory.areaId,
  readingId: readingInForce.id,
  pointId: readingInForce.pointId,
  parameterId: readingInForce.parameterId,
  systemCode: pointDirectory.systemCode,
  pointCode: pointDirectory.pointCode,
  parameterCode: parameterDirectory.parameterCode,
  typedText: readingInForce.typedText,
  typedUnit: readingInForce.typedUnit,
  value: readingInForce.value,
  qualifier: readingInForce.qualifier,
  answer: readingInForce.answer,
  takenAt: readingInForce.takenAt,
  enteredAt: readingInForce.enteredAt,
  takenBy: readingInForce.takenBy,
  enteredBy: readingInForce.enteredBy,
  methodId: readingInForce.methodId,
  instrumentId: readingInForce.instrumentId,
  note: readingInForce.note,
  supersedesId: readingInForce.supersedesId,
  correctionReason: readingInForce.correctionReason,
  confirmedAt: readingInForce.confirmedAt,
  status: readingInForce.status,
  side: readingInForce.side,
  sentence: readingInForce.sentence,
};

/** A row as the query gives it, field by field: copying by spread would cost more than the query. */
function toLine(row: LineRow, explanations: SheetLine["explanations"]): SheetLine {
  return {
    readingId: row.readingId,
    pointId: row.pointId,
    parameterId: row.parameterId,
    systemCode: row.systemCode,
    pointCode: row.pointCode,
    parameterCode: row.parameterCode,
    typedText: row.typedText,
    typedUnit: row.typedUnit,
    value: row.value,
    qualifier: row.qualifier,
    answer: row.answer,
    takenAt: row.takenAt,
    enteredAt: row.enteredAt,
    takenBy: row.takenBy,
    enteredBy: row.enteredBy,
    methodId: row.methodId,
    instrumentId: row.instrumentId,
    note: row.note,
    supersedesId: row.supersedesId,
    correctionReason: row.correctionReason,
    isConfirmed: row.confirmedAt !== null,
    status: row.status,
    side: row.side,
    sentence: row.sentence,
    explanations,
  };
}

/** The readings in force of some areas in a span, in walking order: one query, whatever the number of days. */
function linesOf(db: Orm, areaIds: readonly number[], { fromAt, toAt }: Span): Placed[] {
  const rows = db
    .select(LINE_COLUMNS)
    .from(readingInForce)
    .innerJoin(pointDirectory, eq(pointDirectory.pointId, readingInForce.pointId))
    .innerJoin(parameterDirectory, eq(parameterDirectory.parameterId, readingInForce.parameterId))
    .where(
      and(
        // the plus keeps SQLite from beginning with the areas: the span of days is what narrows
        inArray(sql`+${pointDirectory.areaId}`, [...areaIds]),
        gte(readingInForce.takenAt, fromAt),
        lt(readingInForce.takenAt, toAt),
      ),
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
  const said = explanationsOf(
    db,
    rows.map((row) => row.readingId),
  );
  return rows.map((row) => ({
    areaId: row.areaId,
    line: toLine(row, said.get(row.readingId) ?? []),
  }));
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

/** What is due by the plan of watch items within a span, each with its last reading before the span: one query. */
function dueItemsOf(
  db: Orm,
  areaIds: readonly number[],
  { fromAt, toAt }: Span,
): (DueItem & { areaId: number })[] {
  return db
    .select({
      areaId: pointDirectory.areaId,
      pointId: watchItem.pointId,
      parameterId: watchItem.parameterId,
      everyDays: sql<number>`${watchItem.everyDays}`,
      since: watchItem.since,
      endedAt: watchItem.endedAt,
      systemCode: pointDirectory.systemCode,
      pointCode: pointDirectory.pointCode,
      parameterCode: parameterDirectory.parameterCode,
      parameterName: parameterDirectory.parameterName,
      lastBeforeAt: sql<number | null>`(select ${readingInForce.takenAt} from ${readingInForce}
        where ${readingInForce.pointId} = ${watchItem.pointId}
          and ${readingInForce.parameterId} = ${watchItem.parameterId} and ${readingInForce.takenAt} < ${fromAt}
        order by ${readingInForce.takenAt} desc limit 1)`,
    })
    .from(watchItem)
    .innerJoin(pointDirectory, eq(pointDirectory.pointId, watchItem.pointId))
    .innerJoin(parameterDirectory, eq(parameterDirectory.parameterId, watchItem.parameterId))
    .where(
      and(
        inArray(pointDirectory.areaId, [...areaIds]),
        eq(pointDirectory.systemState, "in-service"),
        isNotNull(watchItem.everyDays),
        lte(watchItem.since, toAt),
        or(isNull(watchItem.endedAt), gt(watchItem.endedAt, fromAt)),
      ),
    )
    .orderBy(asc(pointDirectory.systemOrder), asc(pointDirectory.systemCode), asc(watchItem.position))
    .all();
}

/** What is signed of a line: ids and values, no codes, so that a system's new code changes nothing that was signed. */
const signedOf = (line: SheetLine) => ({
  readingId: line.readingId,
  pointId: line.pointId,
  parameterId: line.parameterId,
  typedText: line.typedText,
  typedUnit: line.typedUnit,
  value: line.value,
  qualifier: line.qualifier,
  answer: line.answer,
  takenAt: line.takenAt,
  enteredAt: line.enteredAt,
  takenBy: line.takenBy,
  enteredBy: line.enteredBy,
  methodId: line.methodId,
  instrumentId: line.instrumentId,
  note: line.note,
  supersedesId: line.supersedesId,
  correctionReason: line.correctionReason,
  isConfirmed: line.isConfirmed,
  status: line.status,
  side: line.side,
  sentence: line.sentence,
  explanations: line.explanations,
});

const sheetKeyOf = (areaId: number, onDay: string): string => `${areaId}/${onDay}`;

/**
 * What some areas read on some operational days, what is missing, and the hash of what was read; day by day, areas in the
 * order given. The span between the first and the last day is read as one: ask for days that lie near each other.
 */
export function daySheets(db: Orm, areaIds: readonly number[], days: readonly string[]): DaySheet[] {
  if (areaIds.length === 0 || days.length === 0) return [];
  const spans = days.map((onDay) => ({ onDay, ...dayLimits(onDay) }));
  const whole = {
    fromAt: Math.min(...spans.map((span) => span.fromAt)),
    toAt: Math.max(...spans.map((span) => span.toAt)),
  };
  const placed = linesOf(db, areaIds, whole);
  const due = dueItemsOf(db, areaIds, whole);
  const takenAt = new Map<string, number[]>();
  for (const { line } of placed) {
    const key = sheetKeyOf(line.pointId, String(line.parameterId));
    const moments = takenAt.get(key);
    if (moments) moments.push(line.takenAt);
    else takenAt.set(key, [line.takenAt]);
  }
  const momentsOf = (item: DueItem) => takenAt.get(sheetKeyOf(item.pointId, String(item.parameterId))) ?? [];
  return spans.flatMap(({ onDay, fromAt, toAt }) => {
    const ofDay = placed.filter(({ line }) => line.takenAt >= fromAt && line.takenAt < toAt);
    return areaIds.map((areaId) => {
      const lines = ofDay.flatMap((each) => (each.areaId === areaId ? [each.line] : []));
      const ofArea = due.filter((item) => item.areaId === areaId);
      return {
        areaId,
        onDay,
        fromAt,
        toAt,
        lines,
        gaps: gapsOfDay(ofArea, momentsOf, { fromAt, toAt }),
        contentHash: contentHash({ areaId, onDay, lines: lines.map(signedOf) }),
      };
    });
  });
}

/** What an area read on one operational day. */
export function daySheet(db: Orm, areaId: number, onDay: string): DaySheet {
  const [sheet] = daySheets(db, [areaId], [onDay]);
  if (!sheet) throw new RangeError("one area and one day make one sheet");
  return sheet;
}

export type Review = typeof dayReview.$inferSelect;

/** The newest review of each sheet of some days, by area and day. */
export function newestReviews(
  db: Orm,
  days: readonly string[],
): (areaId: number, onDay: string) => Review | null {
  const rows = db
    .select()
    .from(dayReview)
    .where(inArray(dayReview.onDay, [...days]))
    .orderBy(asc(dayReview.id))
    .all();
  const newest = new Map(rows.map((row) => [sheetKeyOf(row.areaId, row.onDay), row]));
  return (areaId, onDay) => newest.get(sheetKeyOf(areaId, onDay)) ?? null;
}

/** The newest review of a sheet. */
export function newestReview(db: Orm, areaId: number, onDay: string): Review | null {
  return newestReviews(db, [onDay])(areaId, onDay);
}
