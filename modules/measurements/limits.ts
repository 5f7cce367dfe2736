import type { Orm } from "@/db/database";
import { settings } from "@/lib/env";
import type { LimitsInForce, LimitVersion } from "./model";
import { limitsAt } from "./rules/limits-at";
import type { limitVersion } from "./schema";
import { askingStatements } from "./statements";

type Row = typeof limitVersion.$inferSelect;

const toVersion = (row: Row): LimitVersion => ({
  id: row.id,
  version: row.version,
  effectiveFromAt: row.effectiveFromAt,
  effectiveToAt: row.effectiveToAt,
  shape: row.shape,
  suspended: row.suspendedReason === null ? null : { reason: row.suspendedReason },
});

/** The approved versions of the limits of a point and parameter, oldest first. */
export function approvedVersions(db: Orm, pointId: number, parameterId: number): LimitVersion[] {
  return askingStatements(db).versions.all({ pointId, parameterId }).map(toVersion);
}

/** The limits in force at a moment. */
export function limitsInForce(db: Orm, pointId: number, parameterId: number, at: number): LimitsInForce {
  return limitsAt(approvedVersions(db, pointId, parameterId), at, settings().STILLWELL_ZONE);
}
