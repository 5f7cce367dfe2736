import { and, eq, ne } from "drizzle-orm";
import { defineQuery } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { listSystemsInput } from "../input";
import type { SystemRow } from "../model";
import { system } from "../schema";
import { systemRows } from "./system-rows";

/** The systems a person may see, in walking order. Retired ones only when asked for. */
export const listSystems = defineQuery({
  name: "listSystems",
  permission: systemsMay.read,
  input: listSystemsInput,
  run({ db, at, inMyAreas }, { areaId, kind, includeRetired }): SystemRow[] {
    const where = and(
      inMyAreas(system.areaId),
      areaId === undefined ? undefined : eq(system.areaId, areaId),
      kind === undefined ? undefined : eq(system.kind, kind),
      includeRetired ? undefined : ne(system.state, "retired"),
    );
    return systemRows(db, where, at);
  },
});
