import { eq } from "drizzle-orm";
import { defineCommand } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { editEquipmentInput } from "../input";
import { getEquipment } from "../records";
import { equipment } from "../schema";
import { mustBeFreeCode } from "./free-code";

export const editEquipment = defineCommand({
  verb: "editEquipment",
  permission: systemsMay.manageEquipment,
  input: editEquipmentInput,
  run({ db }, { equipmentId, ...fields }) {
    const { systemId } = getEquipment(db, equipmentId);
    mustBeFreeCode(db, equipment, fields.code, {
      exceptId: equipmentId,
      within: eq(equipment.systemId, systemId),
    });
    db.update(equipment).set(fields).where(eq(equipment.id, equipmentId)).run();
    return {
      result: { id: equipmentId, code: fields.code },
      event: {
        kind: systemsEvents.equipmentEdited,
        subject: { type: "equipment", id: equipmentId },
        payload: { systemId },
      },
    };
  },
});
