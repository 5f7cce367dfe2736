import { and, asc, desc, eq, isNull } from "drizzle-orm";
import { z } from "zod";
import { settings } from "@/lib/env";
import type { QueryContext } from "@/modules/audit";
import { defineQuery } from "@/modules/audit";
import { pointDirectory } from "@/modules/systems";
import { measurementsMay } from "../abilities";
import type { LimitBoardRow, LimitVersionRow } from "../model";
import { limitsAt } from "../rules/limits-at";
import { limitVersion, limitWorkbook, watchItem } from "../schema";
import { recentReadings } from "./list-watch";

type Place = typeof pointDirectory.$inferSelect;
type Found = {
  version: typeof limitVersion.$inferSelect;
  book: typeof limitWorkbook.$inferSelect;
  place: Place;
};

const keyOf = (pointId: number, parameterId: number) => `${pointId} ${parameterId}`;

function toVersionRow({ version, book }: Found): LimitVersionRow {
  return {
    id: version.id,
    version: version.version,
    state: version.state,
    effectiveFromAt: version.effectiveFromAt,
    effectiveToAt: version.effectiveToAt,
    shape: version.shape,
    suspended: version.suspendedReason === null ? null : { reason: version.suspendedReason },
    workbookId: book.id,
    workbookTitle: book.title,
    reason: book.reason,
    proposedBy: book.proposedBy,
    proposedAt: book.proposedAt,
    decidedBy: book.decidedBy,
    decidedAt: book.decidedAt,
    decisionComment: book.decisionComment,
  };
}

/** Every version of the limits of the points asked about, newest first. */
function versionsOf({ db, inMyAreas }: QueryContext, systemId: number | undefined): Found[] {
  return db
    .select()
    .from(limitVersion)
    .innerJoin(limitWorkbook, eq(limitWorkbook.id, limitVersion.workbookId))
    .innerJoin(pointDirectory, eq(pointDirectory.pointId, limitVersion.pointId))
    .where(
      and(inMyAreas(pointDirectory.areaId), systemId ? eq(pointDirectory.systemId, systemId) : undefined),
    )
    .orderBy(desc(limitVersion.version))
    .all()
    .map((row) => ({
      version: row.measurements_limit_version,
      book: row.measurements_limit_workbook,
      place: row.systems_point_directory,
    }));
}

/** What is read at the points asked about, in walking order. */
function watched({ db, inMyAreas }: QueryContext, systemId: number | undefined) {
  return db
    .select()
    .from(watchItem)
    .innerJoin(pointDirectory, eq(pointDirectory.pointId, watchItem.pointId))
    .where(
      and(
        isNull(watchItem.endedAt),
        inMyAreas(pointDirectory.areaId),
        systemId ? eq(pointDirectory.systemId, systemId) : undefined,
      ),
    )
    .orderBy(
      asc(pointDirectory.areaOrder),
      asc(pointDirectory.systemOrder),
      asc(pointDirectory.systemCode),
      asc(watchItem.pointId),
      asc(watchItem.position),
    )
    .all()
    .map((row) => ({
      parameterId: row.measurements_watch_item.parameterId,
      place: row.systems_point_directory,
    }));
}

/**
 * The limits of a system, or of all: each point and parameter that is read there or ever had limits, with what is in
 * force now and every version behind it. The newest reading comes along for one system.
 */
export const listLimitBoard = defineQuery({
  name: "listLimitBoard",
  permission: measurementsMay.read,
  input: z.strictObject({ systemId: z.coerce.number().int().positive().optional() }),
  run(ctx, { systemId }): LimitBoardRow[] {
    const zone = settings().STILLWELL_ZONE;
    const found = versionsOf(ctx, systemId);
    const byPair = new Map<string, LimitVersionRow[]>();
    for (const each of found) {
      const key = keyOf(each.version.pointId, each.version.parameterId);
      byPair.set(key, [...(byPair.get(key) ?? []), toVersionRow(each)]);
    }
    const pairs = new Map(
      [
        ...watched(ctx, systemId),
        ...found.map(({ version, place }) => ({ parameterId: version.parameterId, place })),
      ].map((pair) => [keyOf(pair.place.pointId, pair.parameterId), pair]),
    );
    return [...pairs].map(([key, { parameterId, place }]) => {
      const versions = byPair.get(key) ?? [];
      const [newest] = systemId ? recentReadings(ctx.db, place.pointId, parameterId, 1) : [];
      return {
        pointId: place.pointId,
        pointName: place.pointName,
        systemId: place.systemId,
        systemCode: place.systemCode,
        parameterId,
        limits: limitsAt(
          versions.filter((version) => version.state === "approved"),
          ctx.at,
          zone,
        ),
        versions,
        latest: newest && newest.value !== null ? { value: newest.value, status: newest.status } : null,
      };
    });
  },
});
