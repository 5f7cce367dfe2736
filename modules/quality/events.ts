import { defineEvents } from "@/modules/audit/model";

export const qualityEvents = defineEvents({
  opened: ["incident.opened", 1, "opened an incident"],
  readingJoined: ["incident.reading-joined", 1, "joined a reading to an incident"],
  noted: ["incident.noted", 1, "added a note to an incident"],
  ownerSet: ["incident.owner-set", 1, "gave an incident to somebody"],
  recheckSet: ["incident.recheck-set", 1, "set the recheck of an incident"],
  rechecked: ["incident.rechecked", 1, "recorded the recheck of an incident"],
  closed: ["incident.closed", 1, "closed an incident"],
});
