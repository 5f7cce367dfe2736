import { and, asc, eq, gt, inArray, isNull, lte, or } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { notFound } from "@/lib/problem";
import type { PointRow } from "./model";
import { area, equipment, join, operatingLevel, point, site, system, volumeDetermination } from "./schema";

/*
 * Rows by their key, for commands that load and check state inside their transaction. They see every area: the command
 * that asks has settled who may.
 */

/** @throws Problem `not-found` */
export function getSite(db: Orm, siteId: number) {
  return db.select().from(site).where(eq(site.id, siteId)).get() ?? absent("such site");
}

/** @throws Problem `not-found` */
export function getArea(db: Orm, areaId: number) {
  return db.select().from(area).where(eq(area.id, areaId)).get() ?? absent("such area");
}

/** @throws Problem `not-found` */
export function getSystemById(db: Orm, systemId: number) {
  return db.select().from(system).where(eq(system.id, systemId)).get() ?? absent("such system");
}

/** @throws Problem `not-found` */
export function getEquipment(db: Orm, equipmentId: number) {
  return db.select().from(equipment).where(eq(equipment.id, equipmentId)).get() ?? absent("such equipment");
}

/** @throws Problem `not-found` */
export function getDetermination(db: Orm, determinationId: number) {
  const found = db
    .select()
    .from(volumeDetermination)
    .where(eq(volumeDetermination.id, determinationId))
    .get();
  return found ?? absent("such volume");
}

/** A system's determinations, the oldest first. */
export function determinationsOf(db: Orm, systemId: number) {
  const ofSystem = eq(volumeDetermination.systemId, systemId);
  return db.select().from(volumeDetermination).where(ofSystem).orderBy(asc(volumeDetermination.id)).all();
}

/** All statements of a system's level, the oldest first. */
export function levelsOf(db: Orm, systemId: number) {
  const ofSystem = eq(operatingLevel.systemId, systemId);
  return db.select().from(operatingLevel).where(ofSystem).orderBy(asc(operatingLevel.id)).all();
}

/** Joins that stood at a moment. */
export function joinsAt(db: Orm, at: number) {
  return db
    .select()
    .from(join)
    .where(and(lte(join.joinedAt, at), or(isNull(join.endedAt), gt(join.endedAt, at))))
    .all();
}

/** Joins of one system that stand now, in either direction. */
export function openJoinsOf(db: Orm, systemId: number) {
  const either = or(eq(join.oneSystemId, systemId), eq(join.otherSystemId, systemId));
  return db
    .select()
    .from(join)
    .where(and(isNull(join.endedAt), either))
    .all();
}

/** The columns of a PointRow, with the system and area the point belongs to. */
export const POINT_COLUMNS = {
  id: point.id,
  code: point.code,
  name: point.name,
  kind: point.kind,
  isDefault: point.isDefault,
  isInUse: point.isInUse,
  systemId: system.id,
  systemCode: system.code,
  systemName: system.name,
  systemState: system.state,
  areaId: area.id,
  areaCode: area.code,
} as const;

/** Points with their system and area, by id; ids that do not exist are left out. In no particular order. */
export function pointsById(db: Orm, pointIds: readonly number[]): PointRow[] {
  if (pointIds.length === 0) return [];
  return db
    .select(POINT_COLUMNS)
    .from(point)
    .innerJoin(system, eq(system.id, point.systemId))
    .innerJoin(area, eq(area.id, system.areaId))
    .where(inArray(point.id, [...pointIds]))
    .all();
}

/** A point with its system and area. @throws Problem `not-found` */
export function getPoint(db: Orm, pointId: number): PointRow {
  return pointsById(db, [pointId])[0] ?? absent("such point");
}

function absent(what: string): never {
  throw notFound(what);
}
