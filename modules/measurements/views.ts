/** What higher floors may read of this module's tables: to join, never to write. */
export { explanation, reading, readingInForce, watchItem } from "./schema";
