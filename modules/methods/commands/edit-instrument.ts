import { eq } from "drizzle-orm";
import { invalidField, Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { methodsMay } from "../abilities";
import { methodsEvents } from "../events";
import { editInstrumentInput } from "../input";
import { getInstrumentById } from "../records";
import { instrument } from "../schema";

/** Changes an instrument or its state. A retired one keeps its checks and its readings and does not come back. */
export const editInstrument = defineCommand({
  verb: "editInstrument",
  permission: methodsMay.manageInstruments,
  input: editInstrumentInput,
  run({ db }, { instrumentId, retiredReason, ...fields }) {
    const before = getInstrumentById(db, instrumentId);
    if (before.state === "retired") {
      throw new Problem("conflict", `${before.code} is retired and no longer changes.`);
    }
    const retires = fields.state === "retired";
    if (retires && (retiredReason ?? "").length < 3) {
      throw invalidField("/retiredReason", "required", "Say why it is retired, in a few words.");
    }
    db.update(instrument)
      .set({ ...fields, retiredReason: retires ? retiredReason : null })
      .where(eq(instrument.id, instrumentId))
      .run();
    return {
      result: { id: instrumentId, code: before.code },
      event: {
        kind: methodsEvents.instrumentEdited,
        subject: { type: "instrument", id: instrumentId },
        reason: retires ? retiredReason : null,
      },
    };
  },
});
