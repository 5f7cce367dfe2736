import { defineQuery } from "@/modules/audit";
import { methodsMay } from "../abilities";
import { PARAMETER_CATALOGUE } from "../catalogue.data";
import { listParametersInput } from "../input";
import { type FacilityParameter, PARAMETER_GROUPS, type ParameterDefinition } from "../model";
import { allParameters } from "../parameters";
import { missingFromCatalogue } from "../rules/missing-from-catalogue";

/** The parameters, in the order of groups on screen and of names; retired ones only when asked for. */
export const listParameters = defineQuery({
  name: "listParameters",
  permission: methodsMay.read,
  input: listParametersInput,
  run: ({ db }, { includeRetired }): FacilityParameter[] =>
    allParameters(db)
      .filter((each) => includeRetired || !each.isRetired)
      .sort((a, b) => PARAMETER_GROUPS.indexOf(a.group) - PARAMETER_GROUPS.indexOf(b.group)),
});

/** The entries of the starter catalogue that are not there yet. */
export const listCatalogue = defineQuery({
  name: "listCatalogue",
  permission: methodsMay.manageParameters,
  input: listParametersInput,
  run: ({ db }): ParameterDefinition[] => missingFromCatalogue(PARAMETER_CATALOGUE, allParameters(db)),
});
