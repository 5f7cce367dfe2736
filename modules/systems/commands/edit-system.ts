import { eq } from "drizzle-orm";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { editSystemInput } from "../input";
import { getArea, getSystemById } from "../records";
import { system } from "../schema";
import { mustBeFreeCode } from "./free-code";

export const editSystem = defineCommand({
  verb: "editSystem",
  permission: systemsMay.manageSystems,
  input: editSystemInput,
  run({ db }, { systemId, ...fields }) {
    const before = getSystemById(db, systemId);
    if (before.state === "retired") {
      throw new Problem("conflict", `${before.code} is retired; what it was stays as it is.`);
    }
    getArea(db, fields.areaId);
    mustBeFreeCode(db, system, fields.code, { exceptId: systemId });
    db.update(system).set(fields).where(eq(system.id, systemId)).run();
    return {
      result: { id: systemId, code: fields.code },
      event: {
        kind: systemsEvents.systemEdited,
        subject: { type: "system", id: systemId },
        payload: { areaId: fields.areaId },
      },
    };
  },
});
