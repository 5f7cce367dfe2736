import { formatLocal } from "@/lib/zone";
import type { Bounds, LimitShape } from "../model";
import { formatNumber } from "../rules/format-value";

/** "10.0 to 14.0", "up to 14.0", "from 10.0"; nothing where both sides are open. */
function span(
  low: number | undefined,
  high: number | undefined,
  show: (value: number) => string,
): string | null {
  if (low !== undefined && high !== undefined) return `${show(low)} to ${show(high)}`;
  if (low !== undefined) return `from ${show(low)}`;
  return high === undefined ? null : `up to ${show(high)}`;
}

/**
 * Limits at one moment as words, open sides left out; decimals are added where a limit has more than are shown.
 * @example boundsWords({ target: 12, toleranceHigh: 14 }, 1) // => ["target 12.0", "tolerance up to 14.0"]
 */
export function boundsWords(bounds: Bounds, decimals: number): string[] {
  const show = (value: number) => {
    const full = formatNumber(value, null);
    const fixed = formatNumber(value, decimals);
    return full.length > fixed.length ? full : fixed;
  };
  const watch = span(bounds.watchLow, bounds.watchHigh, show);
  const tolerance = span(bounds.toleranceLow, bounds.toleranceHigh, show);
  return [
    bounds.target === undefined ? null : `target ${show(bounds.target)}`,
    watch === null ? null : `watch ${watch}`,
    tolerance === null ? null : `tolerance ${tolerance}`,
    bounds.greatestChange24h === undefined
      ? null
      : `change at most ${show(bounds.greatestChange24h)} in any 24\u00a0h`,
  ].filter((words) => words !== null);
}

const MONTHS = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];

/** "03-21" as "21 Mar". */
export function monthDayWords(monthDay: string): string {
  const [month = 0, day = 0] = monthDay.split("-").map(Number);
  return `${day} ${MONTHS[month - 1] ?? "?"}`;
}

/** One line of limits: when (a knot of a ramp or a season) and what. */
export interface ShapeLine {
  readonly when: string | null;
  readonly words: string;
}

/** How limits run through time, a line for each knot. */
export function shapeLines(shape: LimitShape, decimals: number, zone: string): ShapeLine[] {
  const words = (bounds: Bounds) => boundsWords(bounds, decimals).join(" · ");
  switch (shape.kind) {
    case "constant":
      return [{ when: null, words: words(shape.bounds) }];
    case "ramp":
      return shape.knots.map((knot) => ({
        when: formatLocal(knot.at, zone, "day"),
        words: words(knot.bounds),
      }));
    case "season":
      return shape.knots.map((knot) => ({ when: monthDayWords(knot.monthDay), words: words(knot.bounds) }));
  }
}
