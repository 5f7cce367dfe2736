import { requireFinite, requireValues, type Values } from "./values";

/**
 * The sum of a series with Neumaier's compensation, so that small terms beside large ones are not lost.
 *
 * Source: Neumaier 1974, ZAMM 54, 39-51. Checked: NIST StRD NumAcc1, NumAcc3.
 * @example sum([1, 1e100, 1, -1e100]) // => 2
 */
export function sum(values: Values): number {
  let total = 0;
  let lost = 0;
  for (let i = 0; i < values.length; i++) {
    const value = values[i]!;
    const next = total + value;
    lost += Math.abs(total) >= Math.abs(value) ? total - next + value : value - next + total;
    total = next;
  }
  return total + lost;
}

/**
 * The arithmetic mean: a compensated sum, then one correction by the mean of the deviations.
 *
 * Units: those of the values. Throws RangeError for an empty series or an entry that is not finite.
 * Checked: NIST StRD Michelso, Lottery, NumAcc1, NumAcc3 (13 digits).
 * @example mean([10000001, 10000003, 10000002]) // => 10000002
 */
export function mean(values: Values): number {
  const n = requireValues(values, 1);
  const first = requireFinite(sum(values) / n, "The mean");
  let rest = 0;
  for (let i = 0; i < n; i++) rest += values[i]! - first;
  return first + rest / n;
}

/** Sum of squared deviations about `centre`, corrected for the deviation of `centre` from the mean (two passes). */
function sumOfSquares(values: Values, centre: number): number {
  let squares = 0;
  let lostSquares = 0;
  let deviations = 0;
  for (let i = 0; i < values.length; i++) {
    const d = values[i]! - centre;
    const term = d * d;
    const next = squares + term;
    lostSquares += squares >= term ? squares - next + term : term - next + squares;
    squares = next;
    deviations += d;
  }
  return squares + lostSquares - (deviations * deviations) / values.length;
}

/**
 * The sample variance (denominator n - 1) in two passes. The one-pass formula that subtracts squared sums loses all
 * digits on values such as 1000000.1 and must not be used.
 *
 * Units: those of the values, squared. Throws RangeError below two values.
 * Source: Chan, Golub and LeVeque 1983, The American Statistician 37, 242-247. Checked: NIST StRD univariate.
 * @example variance([2, 4, 4, 4, 5, 5, 7, 9]) // => 4.571428571428571
 */
export function variance(values: Values): number {
  const n = requireValues(values, 2);
  return requireFinite(Math.max(0, sumOfSquares(values, mean(values))) / (n - 1), "The variance");
}

/**
 * The sample standard deviation (denominator n - 1).
 *
 * Checked: NIST StRD Michelso 0.0790105478190518, Lottery 291.699727470969.
 * @example standardDeviation([10000001, 10000003, 10000002]) // => 1
 */
export function standardDeviation(values: Values): number {
  return Math.sqrt(variance(values));
}

/**
 * How much each value resembles the one before it: the lag-1 autocorrelation coefficient
 * r1 = sum (y_t - m)(y_t+1 - m) / sum (y_t - m)^2, between -1 and 1.
 *
 * Throws RangeError below three values and for a series without any spread (r1 is then undefined).
 * Source: NIST StRD, univariate summary statistics. Checked: Michelso 0.535199668621283, Lottery -0.120948622967393.
 * @example lagOneAutocorrelation([10000001, 10000003, 10000002]) // => -0.5
 */
export function lagOneAutocorrelation(values: Values): number {
  const n = requireValues(values, 3);
  const centre = mean(values);
  const near = Float64Array.from(values, (value) => value - centre);
  const rest = sum(near) / n;
  const deviations = near.map((deviation) => deviation - rest);
  const below = sum(deviations.map((deviation) => deviation * deviation));
  if (!(below > 0)) {
    throw new RangeError("All values are equal: their autocorrelation is undefined.");
  }
  const products = deviations.subarray(1).map((deviation, i) => deviation * deviations[i]!);
  return sum(products) / below;
}
