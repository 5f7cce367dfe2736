import { and, eq, sql } from "drizzle-orm";
import { notFound } from "@/lib/problem";
import type { QueryContext } from "@/modules/audit";
import { defineQuery } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemByCodeInput } from "../input";
import type { SystemDetail, SystemRow } from "../model";
import { getSystemById } from "../records";
import { system } from "../schema";
import { listEquipment, listPoints } from "./list-points";
import { systemRows } from "./system-rows";

/**
 * The system with this code, where the person may see it.
 * @throws Problem `not-found`
 */
export function visibleSystem({ db, inMyAreas }: QueryContext, code: string, at: number): SystemRow {
  const sameCode = eq(sql`lower(${system.code})`, code.toLowerCase());
  const [found] = systemRows(db, and(sameCode, inMyAreas(system.areaId)), at);
  if (!found) throw notFound(`system ${code}`);
  return found;
}

/** One system with its points and equipment, those out of use included. @throws Problem `not-found` */
export const getSystem = defineQuery({
  name: "getSystem",
  permission: systemsMay.read,
  input: systemByCodeInput,
  run(ctx, { code }): SystemDetail {
    const found = visibleSystem(ctx, code, ctx.at);
    const { retiredAt, retiredReason } = getSystemById(ctx.db, found.id);
    return {
      ...found,
      retiredAt,
      retiredReason,
      points: listPoints.run(ctx, { systemId: found.id, includeRetired: true }),
      equipment: listEquipment.run(ctx, { systemId: found.id }),
    };
  },
});
