import { defineCommand } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { createSystemInput } from "../input";
import { getArea } from "../records";
import { point, system } from "../schema";
import { mustBeFreeCode } from "./free-code";

/** A new system comes with its default point, so that a reading can be taken at once. */
export const createSystem = defineCommand({
  verb: "createSystem",
  permission: systemsMay.manageSystems,
  input: createSystemInput,
  run({ db, at }, { defaultPoint, ...fields }) {
    getArea(db, fields.areaId);
    mustBeFreeCode(db, system, fields.code);
    const { id } = db
      .insert(system)
      .values({ ...fields, createdAt: at })
      .returning({ id: system.id })
      .get();
    const first = db
      .insert(point)
      .values({ ...defaultPoint, systemId: id, isDefault: true })
      .returning({ id: point.id })
      .get();
    return {
      result: { id, code: fields.code, defaultPointId: first.id },
      event: {
        kind: systemsEvents.systemCreated,
        subject: { type: "system", id },
        payload: { areaId: fields.areaId, defaultPointId: first.id },
      },
    };
  },
});
