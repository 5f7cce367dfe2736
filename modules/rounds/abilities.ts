import { definePermissions } from "@/modules/access";

export const roundsMay = definePermissions("rounds", {
  read: {
    says: "see day sheets",
    roles: {
      aquarist: "own areas",
      operator: "everywhere",
      analyst: "everywhere",
      lead: "everywhere",
      veterinarian: "everywhere",
      auditor: "everywhere",
      admin: "everywhere",
      reader: "everywhere",
    },
  },
  review: { says: "review day sheets", roles: { lead: "everywhere" } },
});
