import "server-only";

export { allParameters, findParameterByCode, getParameter } from "./parameters";
export { toCanonical } from "./rules/to-canonical";
export { parameterDirectory } from "./views";
