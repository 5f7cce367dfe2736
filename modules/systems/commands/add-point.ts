import { eq } from "drizzle-orm";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { addPointInput } from "../input";
import { getSystemById } from "../records";
import { point } from "../schema";
import { mustBeFreeCode } from "./free-code";

export const addPoint = defineCommand({
  verb: "addPoint",
  permission: systemsMay.manageSystems,
  input: addPointInput,
  run({ db }, input) {
    const { systemId } = input;
    const owner = getSystemById(db, systemId);
    if (owner.state === "retired")
      throw new Problem("conflict", `${owner.code} is retired and gets no new points.`);
    mustBeFreeCode(db, point, input.code, { within: eq(point.systemId, systemId) });
    if (input.isDefault) {
      db.update(point).set({ isDefault: false }).where(eq(point.systemId, systemId)).run();
    }
    const { id } = db.insert(point).values(input).returning({ id: point.id }).get();
    return {
      result: { id, code: input.code },
      event: { kind: systemsEvents.pointAdded, subject: { type: "point", id }, payload: { systemId } },
    };
  },
});
