import { asc, count, eq } from "drizzle-orm";
import { defineQuery } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { listAreasInput } from "../input";
import type { AreaRow, SiteRow } from "../model";
import { area, site, system } from "../schema";

/** The facility's sites. They hold no water, so every reader sees them. */
export const listSites = defineQuery({
  name: "listSites",
  permission: systemsMay.read,
  input: listAreasInput,
  run: ({ db }): SiteRow[] => db.select().from(site).orderBy(asc(site.code)).all(),
});

/** The areas a person may see, in walking order, each with how many systems it has (retired ones included). */
export const listAreas = defineQuery({
  name: "listAreas",
  permission: systemsMay.read,
  input: listAreasInput,
  run: ({ db, inMyAreas }): AreaRow[] =>
    db
      .select({
        id: area.id,
        siteId: area.siteId,
        code: area.code,
        name: area.name,
        biosecurityLevel: area.biosecurityLevel,
        walkingOrder: area.walkingOrder,
        systemCount: count(system.id),
      })
      .from(area)
      .leftJoin(system, eq(system.areaId, area.id))
      .where(inMyAreas(area.id))
      .groupBy(area.id)
      .orderBy(asc(area.walkingOrder), asc(area.code))
      .all(),
});
