import { definePermissions, EVERY_ROLE_AQUARIST_IN_OWN_AREAS } from "@/modules/access";

export const measurementsMay = definePermissions("measurements", {
  read: {
    says: "see readings",
    roles: EVERY_ROLE_AQUARIST_IN_OWN_AREAS,
  },
  record: {
    says: "record readings",
    roles: {
      aquarist: "own areas",
      operator: "everywhere",
      analyst: "everywhere",
      lead: "everywhere",
      veterinarian: "everywhere",
    },
  },
  correct: {
    says: "correct readings",
    roles: { aquarist: "own areas", operator: "everywhere", analyst: "everywhere", lead: "everywhere" },
  },
  explain: {
    says: "explain readings",
    roles: {
      aquarist: "own areas",
      operator: "everywhere",
      analyst: "everywhere",
      lead: "everywhere",
      veterinarian: "everywhere",
    },
  },
  planWatch: { says: "say what is read where", roles: { lead: "everywhere", admin: "everywhere" } },
  proposeLimits: {
    says: "propose limits",
    roles: { lead: "everywhere", veterinarian: "everywhere", analyst: "everywhere" },
  },
  approveLimits: { says: "approve limits", roles: { lead: "everywhere" } },
  deliver: {
    says: "bring in readings in bulk",
    roles: { analyst: "everywhere", lead: "everywhere", operator: "everywhere" },
  },
  withdrawDelivery: {
    says: "withdraw readings that came in bulk",
    roles: { analyst: "everywhere", lead: "everywhere" },
  },
  judgeAgain: { says: "judge readings again", roles: "system" },
});
