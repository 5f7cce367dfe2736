import "server-only";

export { measurementsMay } from "./abilities";
export { confirmReading, correctReading, explainReading, voidReading } from "./commands/correct-reading";
export { growDelivery, openDelivery, publishDelivery, withdrawDelivery } from "./commands/deliver-readings";
export { judgeSeriesAgain } from "./commands/judge-series-again";
export { recordReadings } from "./commands/record-readings";
export { measurementsEvents } from "./events";
