import { requireValues, sortedCopy, type Values } from "./values";

/**
 * Which reading of "quantile" is meant: Hyndman and Fan's type 7 (spreadsheets, R, NumPy) or type 6 (Weibull,
 * position p(n + 1), common in hydrology).
 */
export type QuantileType = 6 | 7;

/**
 * The median: the middle value, or the mean of the two middle values.
 *
 * Units: those of the values. Throws RangeError for an empty series or an entry that is not finite.
 * @example median([3, 1, 2, 10]) // => 2.5
 */
export function median(values: Values): number {
  requireValues(values, 1);
  return medianOfSorted(sortedCopy(values));
}

/** The median of an ascending series that is not empty. */
export function medianOfSorted(sorted: Values): number {
  const half = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2;
}

/**
 * The value below which the share p of the series lies, interpolated between neighbours.
 *
 * Domain: 0 <= p <= 1. Throws RangeError outside it and for an empty series.
 * Source: Hyndman and Fan 1996, The American Statistician 50, 361-365 (types 6 and 7). Checked: NumPy "weibull", "linear".
 * @example quantile([1, 2, 3, 4], 0.25) // => 1.75
 */
export function quantile(values: Values, p: number, type: QuantileType = 7): number {
  const n = requireValues(values, 1);
  if (!(p >= 0 && p <= 1)) throw new RangeError("A quantile's share must lie between 0 and 1.");
  const sorted = sortedCopy(values);
  const position = type === 7 ? p * (n - 1) : Math.min(Math.max(p * (n + 1) - 1, 0), n - 1);
  const below = Math.floor(position);
  const above = Math.min(below + 1, n - 1);
  return sorted[below]! + (position - below) * (sorted[above]! - sorted[below]!);
}
