import { definePermissions, EVERY_ROLE_AQUARIST_IN_OWN_AREAS } from "@/modules/access";

export const systemsMay = definePermissions("systems", {
  read: {
    says: "see areas, systems, points and volumes",
    roles: EVERY_ROLE_AQUARIST_IN_OWN_AREAS,
  },
  manageAreas: { says: "set up sites and areas", roles: { admin: "everywhere" } },
  manageSystems: {
    says: "set up systems and their points",
    roles: { admin: "everywhere", lead: "everywhere" },
  },
  manageEquipment: {
    says: "set up equipment",
    roles: { admin: "everywhere", lead: "everywhere", operator: "everywhere" },
  },
  proposeVolume: {
    says: "propose a system's volume",
    roles: { aquarist: "own areas", operator: "everywhere", analyst: "everywhere", lead: "everywhere" },
  },
  approveVolume: { says: "approve a system's volume", roles: { lead: "everywhere" } },
  setOperatingLevel: {
    says: "set a system's water level",
    roles: { aquarist: "own areas", operator: "everywhere", lead: "everywhere" },
  },
});
