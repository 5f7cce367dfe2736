import "server-only";
import { listPersonNames } from "@/modules/identity";
import { askPage } from "./session";

/** Names by id, for pages whose records name people by id. */
export async function personNames(): Promise<Record<number, string>> {
  const people = await askPage(listPersonNames, {});
  return Object.fromEntries(people.map(({ id, name }) => [id, name]));
}
