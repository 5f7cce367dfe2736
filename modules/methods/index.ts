import "server-only";

export { allParameters, findParameterByCode, getParameter } from "./parameters";
export { toCanonical } from "./rules/to-canonical";
