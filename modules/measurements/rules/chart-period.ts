import { addDays, dayBounds, epochToLocal, isCalendarDay } from "@/lib/zone";

/** From when until when a chart shows, as days and as moments. `fromAt` null: from the first reading on. */
export interface ChartPeriod {
  readonly fromAt: number | null;
  readonly toAt: number;
  readonly toOn: string;
  /** Whether it is two chosen days rather than so many days up to now. */
  readonly isChosen: boolean;
  /** What was wrong with the days that were asked for. */
  readonly problem: string | null;
}

const DAY_MS = 86_400_000;

/**
 * Which stretch of time does an address ask for? Two days (both belong to it), or so many days up to now (`days`; null:
 * everything). Days that are none, or in the wrong order, give the preset and a sentence.
 */
export function chartPeriod(
  asked: { readonly from?: string | undefined; readonly to?: string | undefined },
  days: number | null,
  now: number,
  zone: string,
): ChartPeriod {
  const today = epochToLocal(now, zone).on;
  const { from, to = today } = asked;
  const preset = (problem: string | null): ChartPeriod => ({
    fromAt: days === null ? null : now - days * DAY_MS,
    toAt: now,
    toOn: today,
    isChosen: false,
    problem,
  });
  if (from === undefined) return preset(null);
  if (!isCalendarDay(from) || !isCalendarDay(to)) {
    return preset("A day in this address is none. Write days such as 2026-03-01, or choose them below.");
  }
  if (to < from) return preset("The last day lies before the first. Choose them the other way round.");
  return {
    fromAt: dayBounds(from, zone, 0).fromAt,
    toAt: Math.min(
      dayBounds(addDays(to, 1), zone, 0).fromAt,
      Math.max(now, dayBounds(from, zone, 0).fromAt + 1),
    ),
    toOn: to,
    isChosen: true,
    problem: null,
  };
}
