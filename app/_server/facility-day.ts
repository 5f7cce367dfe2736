import "server-only";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { addDays, operationalDayOf } from "@/lib/zone";

/** The operational day that is being worked on, "YYYY-MM-DD". */
export function operationalToday(): string {
  const { STILLWELL_ZONE, dayCutMinutes } = settings();
  return operationalDayOf(systemClock.now(), STILLWELL_ZONE, dayCutMinutes);
}

/** Today and the days before it, newest first. */
export function lastDays(count: number): string[] {
  const today = operationalToday();
  return Array.from({ length: count }, (_, index) => addDays(today, -index));
}
