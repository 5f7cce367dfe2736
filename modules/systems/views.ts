/** What higher floors may read of this module: to join, never to write. */
export { pointDirectory } from "./schema";
