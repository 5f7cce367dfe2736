import { definePermissions, EVERY_ROLE_AQUARIST_IN_OWN_AREAS } from "@/modules/access";

export const roundsMay = definePermissions("rounds", {
  read: {
    says: "see day sheets",
    roles: EVERY_ROLE_AQUARIST_IN_OWN_AREAS,
  },
  review: { says: "review day sheets", roles: { lead: "everywhere" } },
});
