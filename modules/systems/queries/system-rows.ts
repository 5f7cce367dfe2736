import { and, asc, eq, inArray, lte, type SQL } from "drizzle-orm";
import type { Orm } from "@/db/database";
import type { SystemRow } from "../model";
import { recordAt } from "../rules/record-at";
import { area, system, volumeDetermination } from "../schema";

/** Systems that meet a condition, in walking order, each with its volume of record at a moment. */
export function systemRows(db: Orm, where: SQL | undefined, at: number): SystemRow[] {
  const rows = db
    .select({
      id: system.id,
      code: system.code,
      name: system.name,
      kind: system.kind,
      waterType: system.waterType,
      state: system.state,
      walkingOrder: system.walkingOrder,
      areaId: area.id,
      areaCode: area.code,
      areaName: area.name,
      biosecurityLevel: area.biosecurityLevel,
      notes: system.notes,
    })
    .from(system)
    .innerJoin(area, eq(area.id, system.areaId))
    .where(where)
    .orderBy(asc(area.walkingOrder), asc(area.code), asc(system.walkingOrder), asc(system.code))
    .all();
  const volumes = recordVolumes(
    db,
    rows.map((row) => row.id),
    at,
  );
  return rows.map((row) => ({ ...row, volumeL: volumes.get(row.id) ?? null }));
}

function recordVolumes(db: Orm, systemIds: readonly number[], at: number): Map<number, number> {
  if (systemIds.length === 0) return new Map();
  const inForce = and(
    inArray(volumeDetermination.systemId, [...systemIds]),
    eq(volumeDetermination.status, "approved"),
    lte(volumeDetermination.effectiveFromAt, at),
  );
  const bySystem = new Map<number, (typeof volumeDetermination.$inferSelect)[]>();
  for (const row of db.select().from(volumeDetermination).where(inForce).all()) {
    bySystem.set(row.systemId, [...(bySystem.get(row.systemId) ?? []), row]);
  }
  const records = [...bySystem].map(([systemId, rows]) => [systemId, recordAt(rows, at)?.volumeL] as const);
  return new Map(records.filter((pair): pair is readonly [number, number] => pair[1] !== undefined));
}
