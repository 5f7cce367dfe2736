import { packRules } from "@casl/ability/extra";
import { ALL_PERMISSIONS } from "@/app/_server/all-permissions";
import { route } from "@/app/_server/handle";
import { abilityFor } from "@/modules/access";

/** Who I am and what I may do; the rules are CASL's, packed, so that a client hides by what the server decides by. */
export const GET = route(async ({ actor }) => {
  const { personId, name, roles, areaIds } = actor;
  const rules = packRules(abilityFor(actor, ALL_PERMISSIONS).rules);
  return Response.json({ data: { personId, name, roles, areaIds, rules } });
});
