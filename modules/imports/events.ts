import { defineEvents } from "@/modules/audit/model";

export const importsEvents = defineEvents({
  uploaded: ["import.uploaded", 1, "uploaded a file of readings"],
  surveyed: ["import.surveyed", 1, "looked through a file of readings"],
  answered: ["import.answered", 1, "said how a file of readings is to be read"],
  checkStarted: ["import.check-started", 1, "had a file of readings checked again"],
  checked: ["import.checked", 1, "checked a file of readings"],
  commitStarted: ["import.commit-started", 1, "began to commit an import"],
  committed: ["import.committed", 1, "committed an import"],
  withdrawn: ["import.withdrawn", 1, "withdrew an import"],
  discarded: ["import.discarded", 1, "discarded an import"],
  failed: ["import.failed", 1, "could not go on with an import"],
});
