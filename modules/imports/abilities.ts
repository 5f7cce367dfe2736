import { definePermissions } from "@/modules/access";

export const importsMay = definePermissions("imports", {
  read: {
    says: "see imports",
    roles: {
      operator: "everywhere",
      analyst: "everywhere",
      lead: "everywhere",
      veterinarian: "everywhere",
      auditor: "everywhere",
      admin: "everywhere",
    },
  },
  /** Rows for systems outside a person's own areas are refused one by one. */
  upload: {
    says: "import files of readings",
    roles: { operator: "own areas", analyst: "everywhere", lead: "everywhere" },
  },
  withdraw: { says: "withdraw imports", roles: { analyst: "everywhere", lead: "everywhere" } },
  work: { says: "carry on imports", roles: "system" },
});
