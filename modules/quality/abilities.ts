import { definePermissions } from "@/modules/access";

export const qualityMay = definePermissions("quality", {
  read: {
    says: "see incidents",
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
