import { defineEvents } from "@/modules/audit/model";

export const methodsEvents = defineEvents({
  parameterCreated: ["parameter.created", 1, "set up a parameter"],
  parameterEdited: ["parameter.edited", 1, "changed a parameter"],
  parameterRetired: ["parameter.retired", 1, "retired a parameter"],
  catalogueAdded: ["parameters.catalogue-added", 1, "added parameters of the starter catalogue"],
  methodCreated: ["method.created", 1, "set up a method"],
  methodEdited: ["method.edited", 1, "changed a method"],
  instrumentCreated: ["instrument.created", 1, "set up an instrument"],
  instrumentEdited: ["instrument.edited", 1, "changed an instrument"],
  instrumentChecked: ["instrument.checked", 1, "checked an instrument"],
});
