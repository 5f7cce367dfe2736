import { and, asc, eq, gte, lte, ne } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { settings } from "@/lib/env";
import { invariant } from "@/lib/invariant";
import { unitLabel } from "@/lib/units/factors";
import { getParameter } from "@/modules/methods";
import type { FacilityParameter } from "@/modules/methods/model";
import { approvedVersions } from "./limits";
import type { JudgementCause, LimitVersion, ReadingValue, StatusVerdict } from "./model";
import { STATUS_RULE_VERSION } from "./model";
import {
  CHANGE_WINDOW_MS,
  type Change24h,
  dependentWindow,
  greatestChange24h,
  type TimedValue,
} from "./rules/change-24h";
import { limitsAt } from "./rules/limits-at";
import { judgeReading } from "./rules/status";
import { readingInForce } from "./schema";
import { askingStatements, writingStatements } from "./statements";

/** What of a stored reading a judgement rests on. */
export type Judged = {
  id: number;
  pointId: number;
  parameterId: number;
  value: number | null;
  qualifier: ReadingValue["qualifier"];
  answer: string | null;
  takenAt: number;
  deliveryId: number | null;
};

/**
 * Plain values of the same point and parameter in the 24 h up to a moment that may stand for a change: those that count,
 * and those that come in the same delivery.
 */
export function precedingValues(db: Orm, of: Judged): TimedValue[] {
  const { id, pointId, parameterId, takenAt, deliveryId } = of;
  const window = { fromAt: takenAt - CHANGE_WINDOW_MS, toAt: takenAt };
  return askingStatements(db).preceding.all({ id, pointId, parameterId, deliveryId, ...window });
}

/**
 * Judges one reading by the limits in force when it was taken; writes nothing. What was read in the 24 h before is asked
 * for only where a change is limited: without such a limit no verdict rests on it.
 */
export function verdictOn(
  of: Judged,
  parameter: FacilityParameter,
  versions: readonly LimitVersion[],
  findPreceding: () => readonly TimedValue[],
): { verdict: StatusVerdict; limitVersionId: number | null } {
  const limits = limitsAt(versions, of.takenAt, settings().STILLWELL_ZONE);
  const isChangeLimited = limits.state === "in-force" && limits.bounds.greatestChange24h !== undefined;
  const isPlain = of.value !== null && of.qualifier === "";
  const preceding = isChangeLimited && isPlain ? findPreceding() : [];
  const change: Change24h | null = greatestChange24h(of, preceding);
  const means = parameter.choices.find((choice) => choice.code === of.answer)?.means;
  const verdict = judgeReading({
    kind: parameter.kind,
    plausible: parameter.plausible,
    mayBeNegative: parameter.mayBeNegative,
    reading: { value: of.value, qualifier: of.qualifier, text: of.answer ?? "" },
    limits,
    change,
    decimals: parameter.decimals,
    unit: unitLabel(parameter.unit),
    ...(means ? { answerMeans: means } : {}),
  });
  return { verdict, limitVersionId: limits.state === "none" ? null : limits.versionId };
}

type Known = {
  parameter?: FacilityParameter;
  versions?: readonly LimitVersion[];
  /** The reading has just been stored, so there is no earlier judgement. */
  isFirst?: boolean;
};

/** Judges a reading and appends the judgement, where it is the first or says something new. Answers the verdict. */
export function judgeAndStore(
  db: Orm,
  of: Judged,
  at: number,
  cause: JudgementCause,
  known: Known = {},
): StatusVerdict {
  const {
    parameter = getParameter(db, of.parameterId),
    versions = approvedVersions(db, of.pointId, of.parameterId),
    isFirst = false,
  } = known;
  const { verdict, limitVersionId } = verdictOn(of, parameter, versions, () => precedingValues(db, of));
  const before = isFirst ? undefined : askingStatements(db).latestJudgement.get({ readingId: of.id });
  const isSame =
    before !== undefined &&
    before.status === verdict.status &&
    before.sentence === verdict.sentence &&
    before.limitVersionId === limitVersionId;
  if (!isSame) {
    writingStatements(db).judge.run({
      readingId: of.id,
      status: verdict.status,
      side: verdict.side,
      sentence: verdict.sentence,
      reasons: [...verdict.reasons],
      limitVersionId,
      ruleVersion: STATUS_RULE_VERSION,
      cause,
      judgedAt: at,
    });
  }
  return verdict;
}

/** Readings in force whose judgement may rest on what was taken at `takenAt`: those of the 24 h after it. */
export function judgeDependents(db: Orm, around: Judged, at: number, cause: JudgementCause): number {
  const { fromAt, toAt } = dependentWindow(around.takenAt);
  const dependents = db
    .select()
    .from(readingInForce)
    .where(
      and(
        eq(readingInForce.pointId, around.pointId),
        eq(readingInForce.parameterId, around.parameterId),
        gte(readingInForce.takenAt, fromAt),
        lte(readingInForce.takenAt, toAt),
        ne(readingInForce.id, around.id),
      ),
    )
    .orderBy(asc(readingInForce.takenAt))
    .all();
  invariant(dependents.length < 100_000, "a day of readings of one point");
  if (dependents.length === 0) return 0;
  const parameter = getParameter(db, around.parameterId);
  const versions = approvedVersions(db, around.pointId, around.parameterId);
  for (const dependent of dependents) judgeAndStore(db, dependent, at, cause, { parameter, versions });
  return dependents.length;
}
