import { eq } from "drizzle-orm";
import type { z } from "zod";
import { invalidField, Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { methodsMay } from "../abilities";
import { methodsEvents } from "../events";
import { editParameterInput } from "../input";
import type { FacilityParameter } from "../model";
import { getParameter } from "../parameters";
import { mustBeFree } from "../records";
import { definitionFaults } from "../rules/definition-faults";
import { parameter } from "../schema";

type Input = z.output<typeof editParameterInput>;

/** What stored readings rest on stays: the code, the kind, the unit and every answer there has been. */
function mustKeepWhatReadingsRestOn(before: FacilityParameter, input: Input): void {
  if (input.code !== undefined && input.code !== before.code) {
    const detail = `The code ${before.code} never changes: files and lists name the parameter by it.`;
    throw invalidField("/code", "fixed", detail);
  }
  if (input.kind !== undefined && input.kind !== before.kind) {
    const detail = `What a value of ${before.name} is made of cannot change: readings may be stored already. Retire it and set up another.`;
    throw invalidField("/kind", "fixed", detail);
  }
  if (input.unit !== undefined && input.unit !== before.unit) {
    const detail = `The unit of ${before.name} (${before.unit ?? "none"}) cannot change: readings may be stored in it already. Accept another unit for typing, or retire the parameter and set up another.`;
    throw invalidField("/unit", "fixed", detail);
  }
  const gone = before.choices.find((old) => !input.choices.some((choice) => choice.code === old.code));
  if (gone) {
    const detail = `The answer “${gone.label}” cannot be taken away: readings may carry it already. Change its words or what it means.`;
    throw invalidField("/choices", "fixed", detail);
  }
}

/** Changes how a parameter is shown, typed and judged plausible. Its code, kind and unit never change. */
export const editParameter = defineCommand({
  verb: "editParameter",
  permission: methodsMay.manageParameters,
  input: editParameterInput,
  run({ db }, input) {
    const before = getParameter(db, input.parameterId);
    if (before.isRetired) throw new Problem("conflict", `${before.name} is retired and no longer changes.`);
    mustKeepWhatReadingsRestOn(before, input);
    mustBeFree(db, parameter, "name", input.name, before.id);
    const { parameterId, code: _code, kind: _kind, unit: _unit, plausible, ...fields } = input;
    const errors = definitionFaults({ ...fields, plausible, kind: before.kind, unit: before.unit }).map(
      ({ path, sentence }) => ({ pointer: `/${path.join("/")}`, code: "definition", detail: sentence }),
    );
    if (errors[0]) throw new Problem("invalid", errors[0].detail, errors);
    db.update(parameter)
      .set({ ...fields, plausibleLow: plausible.low, plausibleHigh: plausible.high })
      .where(eq(parameter.id, parameterId))
      .run();
    return {
      result: { id: parameterId, code: before.code },
      event: { kind: methodsEvents.parameterEdited, subject: { type: "parameter", id: parameterId } },
    };
  },
});
