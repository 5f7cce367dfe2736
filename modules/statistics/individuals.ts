import { chartConstants, MEDIAN_MOVING_RANGE_PER_SIGMA } from "./chart-constants";
import { mean } from "./moments";
import { median } from "./quantiles";
import { requireFinite, requirePositive, requireValues, type Values } from "./values";

/** What an individuals chart is made from. */
export interface IndividualsInput {
  /** The readings of the baseline in time order. A reading that is left out joins its neighbours. */
  readonly values: Values;
  /** Sigma from the mean moving range (ISO 7870-2) or from the median moving range (not moved by single jumps). */
  readonly spread?: "mean" | "median";
  /** "exact": d2 = 1.12838, D4 = 3.26653. "printed": 1.128 and 3.267 as in most printed tables. */
  readonly constants?: "exact" | "printed";
  /** Width of the limits in sigma, 3 unless told. */
  readonly width?: number;
  /** A centre that is set rather than estimated, such as a certified value. */
  readonly centre?: number;
}

/** Limits of the individuals chart and of its moving ranges, in the unit of the values. */
export interface IndividualsLimits {
  readonly centre: number;
  readonly lower: number;
  readonly upper: number;
  readonly sigma: number;
  readonly mrBar: number;
  /** Upper limit of the moving ranges; their lower limit is always 0. */
  readonly mrUpper: number;
  readonly n: number;
}

const FACTORS = {
  exact: { d2: chartConstants(2).d2, D4: chartConstants(2).D4, median: MEDIAN_MOVING_RANGE_PER_SIGMA },
  printed: { d2: 1.128, D4: 3.267, median: 0.954 },
} as const;

/**
 * The moving ranges: the absolute difference of each value from the one before it, one fewer than the values.
 * @example Array.from(movingRanges([1, 4, 2])) // => [3, 2]
 */
export function movingRanges(values: Values): Float64Array {
  const n = requireValues(values, 2);
  const ranges = new Float64Array(n - 1);
  for (let i = 1; i < n; i++) ranges[i - 1] = Math.abs(values[i]! - values[i - 1]!);
  return ranges;
}

/**
 * Where should single readings of a steady quantity lie? The limits of an individuals and moving-range chart:
 * centre +- width * sigma with sigma = mean moving range / d2, not the standard deviation of all values, which a
 * drift would widen. Not for strongly autocorrelated readings as they are: see `autocorrelationCorrectedSigma`.
 *
 * Units: those of the values. Throws RangeError below two values, for entries that are not finite, for a width of
 * zero or less. `mrBar` is the mean moving range, or the median one when `spread` is "median".
 * Source: ISO 7870-2; NIST/SEMATECH e-Handbook 6.3.2.2. Checked: NIST flow rates, 55.8041 and 45.8159 with d2 = 1.128.
 * @example individualsLimits({ values: [10, 12, 10, 12, 10] }).mrBar // => 2
 */
export function individualsLimits(input: IndividualsInput): IndividualsLimits {
  const { values, spread = "mean", constants = "exact", width = 3 } = input;
  requirePositive(width, "width");
  const n = requireValues(values, 2);
  const ranges = movingRanges(values);
  const factors = FACTORS[constants];
  const mrBar = spread === "mean" ? mean(ranges) : median(ranges);
  const sigma = mrBar / (spread === "mean" ? factors.d2 : factors.median);
  const centre = input.centre === undefined ? mean(values) : requireFinite(input.centre, "centre");
  return {
    centre,
    lower: centre - width * sigma,
    upper: centre + width * sigma,
    sigma,
    mrBar,
    mrUpper: spread === "mean" ? factors.D4 * mrBar : factors.D4 * factors.d2 * sigma,
    n,
  };
}
