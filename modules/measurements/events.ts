import { defineEvents } from "@/modules/audit/model";

export const measurementsEvents = defineEvents({
  recorded: ["reading.recorded", 1, "recorded readings"],
  corrected: ["reading.corrected", 1, "corrected a reading"],
  voided: ["reading.voided", 1, "struck a reading out"],
  confirmed: ["reading.confirmed", 1, "confirmed a reading that is off"],
  explained: ["reading.explained", 1, "explained a reading"],
  judgedAgain: ["reading.judged-again", 1, "judged readings again"],
  deliveryOpened: ["delivery.opened", 1, "began to bring in readings in bulk"],
  deliveryGrown: ["delivery.grown", 1, "brought in a part of a bulk of readings"],
  deliveryPublished: ["delivery.published", 1, "made a bulk of readings visible"],
  deliveryWithdrawn: ["delivery.withdrawn", 1, "withdrew a bulk of readings"],
  limitsProposed: ["limits.proposed", 1, "proposed limits"],
  limitsApproved: ["limits.approved", 1, "approved limits"],
  limitsDeclined: ["limits.declined", 1, "declined limits"],
  templateSaved: ["limits.template-saved", 1, "saved a template of limits"],
  watchPlanned: ["watch.planned", 1, "said what is read where"],
});
