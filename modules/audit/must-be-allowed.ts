import { Problem } from "@/lib/problem";
import { type Actor, may, type Permission } from "@/modules/access";

/**
 * The first thing asked of whoever wants anything: a role that gives this permission (in some area). Asked before what was
 * sent is looked at, so that a refusal tells nothing about the content or about what is stored.
 * @throws Problem `not-allowed`
 */
export function mustBeAllowed(actor: Actor, permission: Permission): void {
  if (may(actor, permission)) return;
  throw new Problem("not-allowed", `Your role does not allow you to ${permission.says}.`);
}
