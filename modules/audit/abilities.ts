import { definePermissions } from "@/modules/access";

export const auditMay = definePermissions("audit", {
  readHistory: {
    says: "read the whole history",
    roles: { lead: "everywhere", auditor: "everywhere", admin: "everywhere" },
  },
  readRecord: { says: "read the history of one record", roles: "everyone" },
  readHealth: {
    says: "see the health of the installation",
    roles: { admin: "everywhere", auditor: "everywhere" },
  },
  backUp: { says: "make a backup", roles: "system" },
  askForBackup: { says: "ask for a backup", roles: { admin: "everywhere" } },
  retryJobs: { says: "have failed work tried again", roles: { admin: "everywhere" } },
  verify: { says: "have the history checked", roles: { auditor: "everywhere", admin: "everywhere" } },
  recordVerification: { says: "note what a check of the history found", roles: "system" },
  makeCheckpoint: { says: "send checkpoints of the history", roles: "system" },
});
