import { definePermissions } from "@/modules/access";

export const methodsMay = definePermissions("methods", {
  read: {
    says: "see parameters, methods and instruments",
    roles: {
      aquarist: "everywhere",
      operator: "everywhere",
      analyst: "everywhere",
      lead: "everywhere",
      veterinarian: "everywhere",
      auditor: "everywhere",
      admin: "everywhere",
      reader: "everywhere",
    },
  },
  manageParameters: { says: "set up parameters", roles: { admin: "everywhere", lead: "everywhere" } },
  manageMethods: {
    says: "set up methods",
    roles: { admin: "everywhere", lead: "everywhere", analyst: "everywhere" },
  },
  manageInstruments: {
    says: "set up instruments",
    roles: { admin: "everywhere", lead: "everywhere", analyst: "everywhere" },
  },
  checkInstruments: {
    says: "record checks of instruments",
    roles: {
      aquarist: "everywhere",
      operator: "everywhere",
      analyst: "everywhere",
      lead: "everywhere",
    },
  },
});
