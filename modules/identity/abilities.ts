import { definePermissions } from "@/modules/access";

export const identityMay = definePermissions("identity", {
  listPeople: { says: "see who works here", roles: "everyone" },
  readPeople: {
    says: "see people, their addresses and roles",
    roles: { admin: "everywhere", auditor: "everywhere", lead: "everywhere" },
  },
  managePeople: { says: "invite, suspend and change people", roles: { admin: "everywhere" } },
  grantRoles: { says: "grant and end roles", roles: { admin: "everywhere" } },
  nameDeputies: { says: "name deputies", roles: { admin: "everywhere", lead: "everywhere" } },
  ownAccount: { says: "change your own password and preferences", roles: "everyone" },
  enterByLink: { says: "sign in or set a password", roles: "system" },
});
