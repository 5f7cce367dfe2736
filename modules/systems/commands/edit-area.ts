import { eq } from "drizzle-orm";
import { defineCommand } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { editAreaInput } from "../input";
import { getArea } from "../records";
import { area } from "../schema";
import { mustBeFreeCode } from "./free-code";

export const editArea = defineCommand({
  verb: "editArea",
  permission: systemsMay.manageAreas,
  input: editAreaInput,
  run({ db }, { areaId, ...fields }) {
    getArea(db, areaId);
    mustBeFreeCode(db, area, fields.code, { exceptId: areaId });
    db.update(area).set(fields).where(eq(area.id, areaId)).run();
    return {
      result: { id: areaId, code: fields.code },
      event: { kind: systemsEvents.areaEdited, subject: { type: "area", id: areaId } },
    };
  },
});
