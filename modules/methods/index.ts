import "server-only";

export { methodsMay } from "./abilities";
export { addCatalogue } from "./commands/add-catalogue";
export { createInstrument } from "./commands/create-instrument";
export { createMethod } from "./commands/create-method";
export { createParameter } from "./commands/create-parameter";
export { editInstrument } from "./commands/edit-instrument";
export { editMethod } from "./commands/edit-method";
export { editParameter } from "./commands/edit-parameter";
export { recordInstrumentCheck } from "./commands/record-instrument-check";
export { retireParameter } from "./commands/retire-parameter";
export { methodsEvents } from "./events";
export { allParameters, findParameterByCode, getParameter } from "./parameters";
export { getInstrument, listInstruments } from "./queries/list-instruments";
export { listMethods } from "./queries/list-methods";
export { listCatalogue, listParameters } from "./queries/list-parameters";
export { toCanonical } from "./rules/to-canonical";
export { parameterDirectory } from "./views";
