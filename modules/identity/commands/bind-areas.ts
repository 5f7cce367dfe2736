import { and, eq, isNull } from "drizzle-orm";
import { defineCommand } from "@/modules/audit";
import { identityMay } from "../abilities";
import { identityEvents } from "../events";
import { bindAreasInput } from "../input";
import { getPerson } from "../people";
import { areaBinding } from "../schema";

/** Says in which areas a person works; none means everywhere that their roles allow. */
export const bindAreas = defineCommand({
  verb: "bindAreas",
  permission: identityMay.managePeople,
  input: bindAreasInput,
  run(ctx, { personId, areaIds }) {
    getPerson(ctx.db, personId);
    const open = ctx.db
      .select()
      .from(areaBinding)
      .where(and(eq(areaBinding.personId, personId), isNull(areaBinding.endedAt)))
      .all();
    for (const binding of open.filter((row) => !areaIds.includes(row.areaId))) {
      ctx.db.update(areaBinding).set({ endedAt: ctx.at }).where(eq(areaBinding.id, binding.id)).run();
    }
    const known = new Set(open.map((row) => row.areaId));
    for (const areaId of new Set(areaIds)) {
      if (!known.has(areaId)) ctx.db.insert(areaBinding).values({ personId, areaId, boundAt: ctx.at }).run();
    }
    return {
      result: { personId, areaIds },
      event: {
        kind: identityEvents.areasBound,
        subject: { type: "person", id: personId },
        payload: { areaIds },
      },
    };
  },
});
