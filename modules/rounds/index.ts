import "server-only";

export { roundsMay } from "./abilities";
export { reviewDays } from "./commands/review-days";
export { dayLimits } from "./day-sheet";
export { roundsEvents } from "./events";
export { type DaySheetRow, type DaySheetShown, getDaySheet, listDaySheets } from "./queries/get-day-sheet";
export { type OffNow, offNow } from "./rules/off-now";
