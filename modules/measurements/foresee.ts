import { and, eq, sql } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { nearlyEqual } from "@/lib/nearly";
import type { IntakeCache } from "./intake-cache";
import { type Judged, precedingValues, verdictOn } from "./judge";
import type { ReadingValue, StatusVerdict } from "./model";
import type { TimedValue } from "./rules/change-24h";
import { readingInForce } from "./schema";

/** A value that is not stored: where, what, when. Canonical unit. */
export type OfferedReading = {
  pointId: number;
  parameterId: number;
  value: number | null;
  qualifier: ReadingValue["qualifier"];
  answer: string | null;
  takenAt: number;
};

const NOT_STORED = -1;

/**
 * Which status would this reading get if it were stored now? Writes nothing. `findAlongside` gives values of the same
 * point and parameter that would be stored with it; it is asked only where a change in 24 h is limited.
 */
export function foreseeVerdict(
  db: Orm,
  offered: OfferedReading,
  cache: IntakeCache,
  findAlongside: () => readonly TimedValue[] = () => [],
): StatusVerdict {
  const of: Judged = { ...offered, id: NOT_STORED, deliveryId: null };
  const versions = cache.versions(of.pointId, of.parameterId);
  const findPreceding = () => [...precedingValues(db, of), ...findAlongside()];
  return verdictOn(of, cache.parameter(of.parameterId), versions, findPreceding).verdict;
}

export type EqualReading = { id: number; sourceRef: string | null };

const isSameNumber = (a: number | null, b: number | null): boolean =>
  a === null || b === null ? a === b : nearlyEqual(a, b);

/**
 * Finds the reading in force that says exactly this: same point, parameter, moment, value and qualifier; null where there
 * is none. Prepared once for many questions.
 */
export function equalFinder(db: Orm): (offered: OfferedReading) => EqualReading | null {
  const atMoment = db
    .select({
      id: readingInForce.id,
      value: readingInForce.value,
      qualifier: readingInForce.qualifier,
      answer: readingInForce.answer,
      sourceRef: readingInForce.sourceRef,
    })
    .from(readingInForce)
    .where(
      and(
        eq(readingInForce.pointId, sql.placeholder("pointId")),
        eq(readingInForce.parameterId, sql.placeholder("parameterId")),
        eq(readingInForce.takenAt, sql.placeholder("takenAt")),
      ),
    )
    .prepare();
  return ({ pointId, parameterId, takenAt, value, qualifier, answer }) => {
    const rows = atMoment.all({ pointId, parameterId, takenAt });
    const same = rows.find(
      (row) => row.qualifier === qualifier && row.answer === answer && isSameNumber(row.value, value),
    );
    return same ? { id: same.id, sourceRef: same.sourceRef } : null;
  };
}
