import { eq } from "drizzle-orm";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { methodsMay } from "../abilities";
import { methodsEvents } from "../events";
import { retireParameterInput } from "../input";
import { getParameter } from "../parameters";
import { parameter } from "../schema";

/** A retired parameter keeps its readings and is no longer offered; nothing is deleted. */
export const retireParameter = defineCommand({
  verb: "retireParameter",
  permission: methodsMay.manageParameters,
  input: retireParameterInput,
  run({ db, at }, { parameterId, reason }) {
    const before = getParameter(db, parameterId);
    if (before.isRetired) throw new Problem("conflict", `${before.name} is retired already.`);
    db.update(parameter)
      .set({ retiredAt: at, retiredReason: reason })
      .where(eq(parameter.id, parameterId))
      .run();
    return {
      result: { id: parameterId, code: before.code },
      event: {
        kind: methodsEvents.parameterRetired,
        subject: { type: "parameter", id: parameterId },
        reason,
      },
    };
  },
});
