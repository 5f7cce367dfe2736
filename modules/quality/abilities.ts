import { definePermissions, EVERY_ROLE_AQUARIST_IN_OWN_AREAS } from "@/modules/access";

export const qualityMay = definePermissions("quality", {
  read: {
    says: "see incidents",
    roles: EVERY_ROLE_AQUARIST_IN_OWN_AREAS,
  },
  handle: {
    says: "open incidents and work on them",
    roles: {
      aquarist: "own areas",
      operator: "everywhere",
      analyst: "everywhere",
      lead: "everywhere",
      veterinarian: "everywhere",
    },
  },
  close: { says: "close incidents", roles: { lead: "everywhere" } },
});
