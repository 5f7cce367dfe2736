import "server-only";

export { measurementsMay } from "./abilities";
export { confirmReading, correctReading, explainReading, voidReading } from "./commands/correct-reading";
export { decideLimits } from "./commands/decide-limits";
export { growDelivery, openDelivery, publishDelivery, withdrawDelivery } from "./commands/deliver-readings";
export { judgeSeriesAgain } from "./commands/judge-series-again";
export { planWatch } from "./commands/plan-watch";
export { proposeLimits } from "./commands/propose-limits";
export { recordReadings } from "./commands/record-readings";
export { saveLimitTemplate } from "./commands/save-limit-template";
export { measurementsEvents } from "./events";
export { addExplanation, getInForce } from "./explanations";
export { readTypedValue } from "./intake";
export { limitsInForce } from "./limits";
export { getLimitWorkbook, listLimits, listLimitTemplates, listLimitWorkbooks } from "./queries/list-limits";
export { getReading, getSeries, listReadings } from "./queries/list-readings";
export { listWatch } from "./queries/list-watch";
export { explanation, reading, readingInForce, watchItem } from "./views";
