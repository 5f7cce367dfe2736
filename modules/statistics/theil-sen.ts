import { MOST_PAIRED_VALUES } from "./kendall";
import { mannKendall } from "./mann-kendall";
import { normalQuantile } from "./normal";
import { median, medianOfSorted } from "./quantiles";
import { requirePairs, requireProbability, type Values } from "./values";

/** A robust line with the confidence interval of its slope. */
export interface TheilSenLine {
  readonly slope: number;
  /** Median of the values less slope times the median time (Conover). */
  readonly intercept: number;
  readonly slopeLower: number;
  readonly slopeUpper: number;
  readonly pairs: number;
}

/** The slopes of all pairs with different times, ascending. */
function pairSlopes(times: Values, values: Values): Float64Array {
  const n = values.length;
  const slopes = new Float64Array((n * (n - 1)) / 2);
  let count = 0;
  for (let i = 0; i < n - 1; i++) {
    for (let j = i + 1; j < n; j++) {
      const span = times[j]! - times[i]!;
      if (span !== 0) slopes[count++] = (values[j]! - values[i]!) / span;
    }
  }
  return slopes.subarray(0, count).sort();
}

/** The value at a 1-based position that need not be whole, kept inside the series. */
function atPosition(sorted: Float64Array, position: number): number {
  const place = Math.min(Math.max(position, 1), sorted.length);
  const below = Math.floor(place);
  const above = Math.min(below + 1, sorted.length);
  return sorted[below - 1]! + (place - below) * (sorted[above - 1]! - sorted[below - 1]!);
}

/**
 * How fast does it rise or fall, whatever a few wild readings do? The median slope of all pairs.
 *
 * Confidence limits stand at positions (N - C)/2 and (N + C)/2 + 1 of the N ordered slopes, C = z sqrt(var S), with
 * interpolation. Throws RangeError below 4 or above 5,000 values, for lengths that differ, for times all equal.
 * Units: unit of the values per unit of the times.
 * Source: Theil 1950; Sen 1968; Gilbert 1987; USEPA 2009 Unified Guidance 17.3.3. Checked: example 17-6, 26.66667 with
 * 20.0 to 35.71182.
 * @example theilSen({ times: [0, 1, 2, 3], values: [1, 3, 5, 70] }).slope // => 12.5
 */
export function theilSen(input: {
  readonly times: Values;
  readonly values: Values;
  readonly confidence?: number;
}): TheilSenLine {
  const { times, values, confidence = 0.95 } = input;
  const n = requirePairs(times, values, 4);
  if (n > MOST_PAIRED_VALUES)
    throw new RangeError(`At most ${MOST_PAIRED_VALUES} values can be compared pair by pair.`);
  const slopes = pairSlopes(times, values);
  if (slopes.length === 0) throw new RangeError("All times are equal: no slope can be found.");
  const { variance } = mannKendall({ values, times });
  const z = normalQuantile(1 - (1 - requireProbability(confidence, "confidence")) / 2);
  const reach = z * Math.sqrt(Math.max(0, variance));
  const slope = medianOfSorted(slopes);
  return {
    slope,
    intercept: median(values) - slope * median(times),
    slopeLower: atPosition(slopes, (slopes.length - reach) / 2),
    slopeUpper: atPosition(slopes, (slopes.length + reach) / 2 + 1),
    pairs: slopes.length,
  };
}
