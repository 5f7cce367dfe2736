import { defineEvents } from "@/modules/audit/model";

export const roundsEvents = defineEvents({
  reviewed: ["day.reviewed", 1, "reviewed day sheets"],
  returned: ["day.returned", 1, "returned day sheets"],
});
