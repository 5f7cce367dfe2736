import { definePermissions } from "@/modules/access";

export const notificationsMay = definePermissions("notifications", {
  readOutbox: {
    says: "see the mail that went out",
    roles: { admin: "everywhere", auditor: "everywhere" },
  },
});
