import { invalidField } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { methodsMay } from "../abilities";
import { PARAMETER_CATALOGUE } from "../catalogue.data";
import { methodsEvents } from "../events";
import { addCatalogueInput } from "../input";
import { allParameters } from "../parameters";
import { missingFromCatalogue } from "../rules/missing-from-catalogue";
import { insertParameter } from "./create-parameter";

/** Adds entries of the starter catalogue that are not there yet: those named, or all of them. */
export const addCatalogue = defineCommand({
  verb: "addCatalogue",
  permission: methodsMay.manageParameters,
  input: addCatalogueInput,
  run({ db }, { codes }) {
    const unknown = codes?.find((code) => !PARAMETER_CATALOGUE.some((entry) => entry.code === code));
    if (unknown !== undefined) {
      throw invalidField("/codes", "unknown", `The starter catalogue has no parameter ${unknown}.`);
    }
    const missing = missingFromCatalogue(PARAMETER_CATALOGUE, allParameters(db));
    const wanted = codes === undefined ? missing : missing.filter((entry) => codes.includes(entry.code));
    const added = wanted.map((entry) => ({ id: insertParameter(db, entry), code: entry.code }));
    return {
      result: { added },
      event: { kind: methodsEvents.catalogueAdded, payload: { codes: added.map((each) => each.code) } },
    };
  },
});
