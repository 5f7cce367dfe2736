import { and, asc, eq } from "drizzle-orm";
import { defineQuery } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { listWaitingVolumesInput } from "../input";
import { system, volumeDetermination } from "../schema";

export type WaitingVolume = {
  id: number;
  systemCode: string;
  systemName: string;
  volumeL: number;
  standardUncertaintyL: number;
  proposedById: number;
  proposedAt: number;
};

/** Proposed volumes that wait for somebody's decision, the oldest first. */
export const listWaitingVolumes = defineQuery({
  name: "listWaitingVolumes",
  permission: systemsMay.read,
  input: listWaitingVolumesInput,
  run: ({ db, inMyAreas }): WaitingVolume[] =>
    db
      .select({
        id: volumeDetermination.id,
        systemCode: system.code,
        systemName: system.name,
        volumeL: volumeDetermination.volumeL,
        standardUncertaintyL: volumeDetermination.standardUncertaintyL,
        proposedById: volumeDetermination.proposedBy,
        proposedAt: volumeDetermination.proposedAt,
      })
      .from(volumeDetermination)
      .innerJoin(system, eq(system.id, volumeDetermination.systemId))
      .where(and(inMyAreas(system.areaId), eq(volumeDetermination.status, "proposed")))
      .orderBy(asc(volumeDetermination.proposedAt))
      .all(),
});
