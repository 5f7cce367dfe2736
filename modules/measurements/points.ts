import { eq, inArray } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { notFound } from "@/lib/problem";
import { pointDirectory } from "@/modules/systems";
import { reading } from "./schema";
import { askingStatements } from "./statements";

export type PointPlace = typeof pointDirectory.$inferSelect;

/** Where a point is. @throws Problem `not-found` */
export function getPoint(db: Orm, pointId: number): PointPlace {
  const row = askingStatements(db).place.get({ pointId });
  if (!row) throw notFound("such point");
  return row;
}

/** The areas in which points lie; a point that does not exist is left out (the command itself refuses it). */
export function areasOfPoints(db: Orm, pointIds: readonly number[]): number[] {
  const rows = db
    .selectDistinct({ areaId: pointDirectory.areaId })
    .from(pointDirectory)
    .where(inArray(pointDirectory.pointId, [...new Set(pointIds)]))
    .all();
  return rows.map((row) => row.areaId);
}

/** The area in which a reading was taken, as a list for a command's `areas`; none where there is no such reading. */
export function areaOfReading(ctx: { db: Orm }, { readingId }: { readingId: number }): number[] {
  const row = ctx.db
    .select({ pointId: reading.pointId })
    .from(reading)
    .where(eq(reading.id, readingId))
    .get();
  return row ? areasOfPoints(ctx.db, [row.pointId]) : [];
}
