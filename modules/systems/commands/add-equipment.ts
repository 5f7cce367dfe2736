import { eq } from "drizzle-orm";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { systemsMay } from "../abilities";
import { systemsEvents } from "../events";
import { addEquipmentInput } from "../input";
import { getSystemById } from "../records";
import { equipment } from "../schema";
import { mustBeFreeCode } from "./free-code";

export const addEquipment = defineCommand({
  verb: "addEquipment",
  permission: systemsMay.manageEquipment,
  input: addEquipmentInput,
  run({ db }, input) {
    const { systemId } = input;
    const owner = getSystemById(db, systemId);
    if (owner.state === "retired")
      throw new Problem("conflict", `${owner.code} is retired and gets no new equipment.`);
    mustBeFreeCode(db, equipment, input.code, { within: eq(equipment.systemId, systemId) });
    const { id } = db.insert(equipment).values(input).returning({ id: equipment.id }).get();
    return {
      result: { id, code: input.code },
      event: {
        kind: systemsEvents.equipmentAdded,
        subject: { type: "equipment", id },
        payload: { systemId },
      },
    };
  },
});
