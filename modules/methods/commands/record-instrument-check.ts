import type { z } from "zod";
import type { Orm } from "@/db/database";
import { settings } from "@/lib/env";
import { invariant } from "@/lib/invariant";
import { invalidField, Problem } from "@/lib/problem";
import { matchUnit } from "@/lib/units/factors";
import { epochToLocal } from "@/lib/zone";
import { defineCommand } from "@/modules/audit";
import { methodsMay } from "../abilities";
import { methodsEvents } from "../events";
import { recordInstrumentCheckInput } from "../input";
import { getParameter } from "../parameters";
import { getInstrumentById } from "../records";
import { checkDue } from "../rules/check-due";
import { instrumentCheck } from "../schema";

type Input = z.output<typeof recordInstrumentCheckInput>;

/** The unit's code, as the parameter accepts it; as written where no parameter is named. */
function unitOf(db: Orm, { parameterId, unit }: Input): string | null {
  if (parameterId === null || unit === null) return unit;
  const measured = getParameter(db, parameterId);
  const match = matchUnit(unit, measured.acceptedUnits);
  if (match.state === "one") return match.unit.code;
  const detail = `“${unit}” is not accepted for ${measured.name}. Use one of: ${measured.acceptedUnits.join(", ")}.`;
  throw invalidField("/unit", "unknown-unit", detail);
}

function mustHoldTogether({ verdict, asFound, asLeft }: Input): void {
  if (verdict === "adjusted" && asLeft === null) {
    throw invalidField("/asLeft", "required", "Say what it read after the adjustment.");
  }
  if (verdict === "adjusted" && asFound === null) {
    throw invalidField("/asFound", "required", "Say what it read before the adjustment.");
  }
}

/** One check of an instrument against a standard. The due date that follows is kept with it. */
export const recordInstrumentCheck = defineCommand({
  verb: "recordInstrumentCheck",
  permission: methodsMay.checkInstruments,
  input: recordInstrumentCheckInput,
  run({ db, actor, at }, input) {
    invariant(actor.personId !== null, "a person checks an instrument");
    const { code, state, checkEveryDays } = getInstrumentById(db, input.instrumentId);
    if (state === "retired") throw new Problem("conflict", `${code} is retired: it is checked no more.`);
    mustHoldTogether(input);
    const checkedAt = input.checkedAt ?? at;
    if (checkedAt > at) {
      throw invalidField("/checkedAt", "future", "The check lies in the future: correct its day and time.");
    }
    const on = epochToLocal(checkedAt, settings().STILLWELL_ZONE).on;
    const { dueOn } = checkDue({ checkEveryDays, last: { on, verdict: input.verdict } }, on);
    const { id } = db
      .insert(instrumentCheck)
      .values({ ...input, unit: unitOf(db, input), checkedAt, checkedBy: actor.personId, dueOn })
      .returning({ id: instrumentCheck.id })
      .get();
    return {
      result: { id, dueOn },
      event: {
        kind: methodsEvents.instrumentChecked,
        subject: { type: "instrument", id: input.instrumentId },
        payload: { checkId: id, verdict: input.verdict },
      },
    };
  },
});
