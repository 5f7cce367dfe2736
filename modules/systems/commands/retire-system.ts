import { eq } from "drizzle-orm";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { retireSystemInput } from "../input";
import { getSystemById, openJoinsOf } from "../records";
import { join, system } from "../schema";

/** A retired system keeps its readings and its history, and takes no new ones; nothing is deleted. */
export const retireSystem = defineCommand({
  verb: "retireSystem",
  permission: systemsMay.manageSystems,
  input: retireSystemInput,
  run({ db, actor, at }, { systemId, reason }) {
    const before = getSystemById(db, systemId);
    if (before.state === "retired") throw new Problem("conflict", `${before.code} is retired already.`);
    db.update(system)
      .set({ state: "retired", retiredAt: at, retiredReason: reason })
      .where(eq(system.id, systemId))
      .run();
    for (const each of openJoinsOf(db, systemId)) {
      db.update(join).set({ endedAt: at, endedBy: actor.personId }).where(eq(join.id, each.id)).run();
    }
    return {
      result: { id: systemId, code: before.code },
      event: { kind: systemsEvents.systemRetired, subject: { type: "system", id: systemId }, reason },
    };
  },
});
