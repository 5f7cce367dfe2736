import { and, asc, desc, eq, ne } from "drizzle-orm";
import { defineQuery } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { listEquipmentInput, listPointsInput } from "../input";
import type { EquipmentRow, PointRow } from "../model";
import { POINT_COLUMNS } from "../records";
import { area, equipment, point, system } from "../schema";

/** The points a person may see, in walking order, a system's default point first. Out of use or retired only when asked for. */
export const listPoints = defineQuery({
  name: "listPoints",
  permission: systemsMay.read,
  input: listPointsInput,
  run({ db, inMyAreas }, { systemId, includeRetired }): PointRow[] {
    const inUse = includeRetired ? undefined : and(eq(point.isInUse, true), ne(system.state, "retired"));
    return db
      .select(POINT_COLUMNS)
      .from(point)
      .innerJoin(system, eq(system.id, point.systemId))
      .innerJoin(area, eq(area.id, system.areaId))
      .where(and(inMyAreas(area.id), systemId === undefined ? undefined : eq(system.id, systemId), inUse))
      .orderBy(
        asc(area.walkingOrder),
        asc(area.code),
        asc(system.walkingOrder),
        asc(system.code),
        desc(point.isDefault),
        asc(point.code),
      )
      .all();
  },
});

/** The equipment a person may see, by system and code. */
export const listEquipment = defineQuery({
  name: "listEquipment",
  permission: systemsMay.read,
  input: listEquipmentInput,
  run({ db, inMyAreas }, { systemId }): EquipmentRow[] {
    return db
      .select({
        id: equipment.id,
        systemId: equipment.systemId,
        systemCode: system.code,
        code: equipment.code,
        name: equipment.name,
        kind: equipment.kind,
        state: equipment.state,
        notes: equipment.notes,
      })
      .from(equipment)
      .innerJoin(system, eq(system.id, equipment.systemId))
      .where(and(inMyAreas(system.areaId), systemId === undefined ? undefined : eq(system.id, systemId)))
      .orderBy(asc(system.code), asc(equipment.code))
      .all();
  },
});
