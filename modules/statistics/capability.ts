import { chiSquareQuantile } from "./chi-square";
import { normalQuantile } from "./normal";
import { requireFinite, requirePositive, requireProbability } from "./values";

/** How a process fits its tolerance. Indices of a side without a limit are null. */
export interface Capability {
  /** Width of the tolerance over six sigma; needs both limits. */
  readonly cp: number | null;
  readonly cpUpper: number | null;
  readonly cpLower: number | null;
  /** The smaller of the sides that have a limit. */
  readonly cpk: number;
  /** Distance of the mean from the middle over half the tolerance; needs both limits. */
  readonly offCentre: number | null;
}

/**
 * Does a steady process fit between its tolerance limits? Cp = (upper - lower) / 6 sigma, Cpk with the nearer limit.
 * Not for a process that is out of control or strongly autocorrelated: the figures then promise nothing.
 *
 * Throws RangeError without any limit, for lower >= upper, for sigma of zero or less.
 * Source: NIST/SEMATECH e-Handbook 6.1.6. Checked: limits 8 and 20, mean 16, s 2: Cp 1.0, Cpk 0.6667, k 0.3333.
 * @example capability({ mean: 16, sigma: 2, lower: 8, upper: 20 }).cp // => 1
 */
export function capability(input: {
  readonly mean: number;
  readonly sigma: number;
  readonly lower?: number;
  readonly upper?: number;
}): Capability {
  const { lower, upper } = input;
  const mean = requireFinite(input.mean, "mean");
  const sigma = requirePositive(input.sigma, "sigma");
  const cpUpper = upper === undefined ? null : (requireFinite(upper, "upper") - mean) / (3 * sigma);
  const cpLower = lower === undefined ? null : (mean - requireFinite(lower, "lower")) / (3 * sigma);
  const sides = [cpUpper, cpLower].filter((side): side is number => side !== null);
  if (sides.length === 0) throw new RangeError("Capability needs a lower or an upper limit.");
  const cpk = Math.min(...sides);
  if (lower === undefined || upper === undefined) return { cp: null, cpUpper, cpLower, cpk, offCentre: null };
  if (lower >= upper) throw new RangeError("The lower limit must lie below the upper limit.");
  return {
    cp: (upper - lower) / (6 * sigma),
    cpUpper,
    cpLower,
    cpk,
    offCentre: Math.abs((lower + upper) / 2 - mean) / ((upper - lower) / 2),
  };
}

/** A confidence interval. */
export interface Interval {
  readonly lower: number;
  readonly upper: number;
}

function requireSample(n: number): number {
  if (!(Number.isInteger(n) && n >= 2)) throw new RangeError("n must be a whole number of 2 or more.");
  return n;
}

/**
 * Confidence limits of Cp estimated from n normal values, by the chi-square distribution of the variance.
 *
 * Source: NIST/SEMATECH e-Handbook 6.1.6. Checked: Cp 1, n 50: 0.8025 to 1.1971 (scipy).
 * @example cpInterval({ cp: 1, n: 50 }).upper.toFixed(4) // => "1.1971"
 */
export function cpInterval(input: {
  readonly cp: number;
  readonly n: number;
  readonly confidence?: number;
}): Interval {
  const { confidence = 0.95 } = input;
  const cp = requireFinite(input.cp, "cp");
  const df = requireSample(input.n) - 1;
  const tail = (1 - requireProbability(confidence, "confidence")) / 2;
  return {
    lower: cp * Math.sqrt(chiSquareQuantile(tail, df) / df),
    upper: cp * Math.sqrt(chiSquareQuantile(1 - tail, df) / df),
  };
}

/**
 * Confidence limits of Cpk estimated from n normal values, by the normal approximation.
 *
 * Source: NIST/SEMATECH e-Handbook 6.1.6. Checked: Cpk 2/3, n 50: 0.5056 to 0.8278 (scipy).
 * @example cpkInterval({ cpk: 2 / 3, n: 50 }).lower.toFixed(4) // => "0.5056"
 */
export function cpkInterval(input: {
  readonly cpk: number;
  readonly n: number;
  readonly confidence?: number;
}): Interval {
  const { confidence = 0.95 } = input;
  const cpk = requireFinite(input.cpk, "cpk");
  const n = requireSample(input.n);
  const z = normalQuantile(1 - (1 - requireProbability(confidence, "confidence")) / 2);
  const half = z * Math.sqrt(1 / (9 * n) + (cpk * cpk) / (2 * (n - 1)));
  return { lower: cpk - half, upper: cpk + half };
}
