import { and, ne } from "drizzle-orm";
import { z } from "zod";
import { defineQuery } from "@/modules/audit";
import { systemsMay } from "../abilities";
import type { Measured } from "../model";
import { system } from "../schema";
import { systemRows } from "./system-rows";
import { operatingOf } from "./volume-of";

/** What a system holds today; `says` is the reason where that cannot be told. */
export interface OperatingVolume {
  readonly systemId: number;
  readonly volume: Measured | null;
  readonly says: string | null;
}

/** What every system that a person may see holds today. */
export const listOperatingVolumes = defineQuery({
  name: "listOperatingVolumes",
  permission: systemsMay.read,
  input: z.strictObject({}),
  run({ db, at, inMyAreas }): OperatingVolume[] {
    return systemRows(db, and(inMyAreas(system.areaId), ne(system.state, "retired")), at).map(({ id }) => ({
      systemId: id,
      ...operatingOf(db, id, at),
    }));
  },
});
