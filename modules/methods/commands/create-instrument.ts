import { defineCommand } from "@/modules/audit";
import { methodsMay } from "../abilities";
import { methodsEvents } from "../events";
import { createInstrumentInput } from "../input";
import { mustBeFree } from "../records";
import { instrument } from "../schema";

export const createInstrument = defineCommand({
  verb: "createInstrument",
  permission: methodsMay.manageInstruments,
  input: createInstrumentInput,
  run({ db }, fields) {
    mustBeFree(db, instrument, "code", fields.code);
    const { id } = db.insert(instrument).values(fields).returning({ id: instrument.id }).get();
    return {
      result: { id, code: fields.code },
      event: { kind: methodsEvents.instrumentCreated, subject: { type: "instrument", id } },
    };
  },
});
