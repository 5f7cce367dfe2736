/** What higher floors may read of this module: to join, never to write. */
export { parameterDirectory } from "./schema";
