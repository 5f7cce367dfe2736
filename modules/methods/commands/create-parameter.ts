import type { Orm } from "@/db/database";
import { defineCommand } from "@/modules/audit";
import { methodsMay } from "../abilities";
import { methodsEvents } from "../events";
import { createParameterInput } from "../input";
import type { ParameterDefinition } from "../model";
import { mustBeFree } from "../records";
import { parameter } from "../schema";

/** Stores a definition as a new parameter of the facility. */
export function insertParameter(db: Orm, { plausible, ...rest }: ParameterDefinition): number {
  return db
    .insert(parameter)
    .values({
      ...rest,
      acceptedUnits: [...rest.acceptedUnits],
      choices: rest.choices.map((choice) => ({ ...choice })),
      plausibleLow: plausible.low,
      plausibleHigh: plausible.high,
    })
    .returning({ id: parameter.id })
    .get().id;
}

export const createParameter = defineCommand({
  verb: "createParameter",
  permission: methodsMay.manageParameters,
  input: createParameterInput,
  run({ db }, definition) {
    mustBeFree(db, parameter, "code", definition.code);
    mustBeFree(db, parameter, "name", definition.name);
    const id = insertParameter(db, definition);
    return {
      result: { id, code: definition.code },
      event: { kind: methodsEvents.parameterCreated, subject: { type: "parameter", id } },
    };
  },
});
