import { mean, sum } from "./moments";
import { requirePairs, requirePositive, type Values } from "./values";

/** A calibration line y = intercept + slope x with what is needed to read it backwards. */
export interface CalibrationLine {
  readonly n: number;
  readonly slope: number;
  readonly intercept: number;
  readonly slopeSe: number;
  readonly interceptSe: number;
  /** Residual standard deviation with n - 2 degrees of freedom. */
  readonly residualSd: number;
  readonly df: number;
  readonly correlation: number;
  readonly xMean: number;
  readonly yMean: number;
  /** Sum of squares of x about its mean (weighted when weights were given). */
  readonly sxx: number;
}

/** Weighted sums of products about the means. */
function centredSums(x: Values, y: Values, weight: (i: number) => number) {
  const n = x.length;
  const wx = new Float64Array(n);
  const wy = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    wx[i] = weight(i) * x[i]!;
    wy[i] = weight(i) * y[i]!;
  }
  const xMean = sum(wx) / n;
  const yMean = sum(wy) / n;
  const terms = { sxx: new Float64Array(n), sxy: new Float64Array(n), syy: new Float64Array(n) };
  for (let i = 0; i < n; i++) {
    const dx = x[i]! - xMean;
    const dy = y[i]! - yMean;
    terms.sxx[i] = weight(i) * dx * dx;
    terms.sxy[i] = weight(i) * dx * dy;
    terms.syy[i] = weight(i) * dy * dy;
  }
  return { xMean, yMean, sxx: sum(terms.sxx), sxy: sum(terms.sxy), syy: sum(terms.syy) };
}

function lineFrom(x: Values, y: Values, weight: (i: number) => number): CalibrationLine {
  const n = requirePairs(x, y, 3);
  const { xMean, yMean, sxx, sxy, syy } = centredSums(x, y, weight);
  if (!(sxx > 0)) throw new RangeError("All x are equal: no line can be drawn.");
  const slope = sxy / sxx;
  const intercept = yMean - slope * xMean;
  const residuals = new Float64Array(n);
  for (let i = 0; i < n; i++) residuals[i] = weight(i) * (y[i]! - yMean - slope * (x[i]! - xMean)) ** 2;
  const residualSd = Math.sqrt(sum(residuals) / (n - 2));
  return {
    n,
    slope,
    intercept,
    slopeSe: residualSd / Math.sqrt(sxx),
    interceptSe: residualSd * Math.sqrt(1 / n + (xMean * xMean) / sxx),
    residualSd,
    df: n - 2,
    correlation: syy > 0 ? sxy / Math.sqrt(sxx * syy) : 0,
    xMean,
    yMean,
    sxx,
  };
}

/**
 * The ordinary least-squares calibration line: how does the signal y depend on the content x when all points are
 * equally sure and x is known?
 *
 * Formula: slope = Sxy / Sxx about the means, residual sd with n - 2. Throws RangeError below three pairs, for x all
 * equal, for entries that are not finite. When y does not vary the correlation is given as 0.
 * Source: ISO 8466-1; Miller and Miller. Checked: NIST StRD Norris; fluorescein, slope 1.93, s(y/x) 0.43285.
 * @example calibrationLine({ x: [0, 1, 2], y: [1, 3, 5] }).slope // => 2
 */
export function calibrationLine(input: { readonly x: Values; readonly y: Values }): CalibrationLine {
  return lineFrom(input.x, input.y, () => 1);
}

/**
 * The calibration line through points that are not equally sure: weights 1 / sd^2, normalised so that they add to n.
 *
 * Formula: as the ordinary line with weighted means and sums. Throws RangeError for a standard deviation of zero or
 * less. Source: Miller and Miller, weighted regression. Checked: their example, 0.0738 and 0.0091.
 * @example weightedCalibrationLine({ x: [0, 1, 2], y: [1, 3, 5], sd: [1, 2, 3] }).slope.toFixed(6) // => "2.000000"
 */
export function weightedCalibrationLine(input: {
  readonly x: Values;
  readonly y: Values;
  readonly sd: Values;
}): CalibrationLine & { readonly weights: Float64Array } {
  const { x, y, sd } = input;
  requirePairs(x, sd, 3);
  const raw = Float64Array.from(sd, (value) => 1 / requirePositive(value, "sd") ** 2);
  const scale = mean(raw);
  const weights = raw.map((weight) => weight / scale);
  return { ...lineFrom(x, y, (i) => weights[i]!), weights };
}

/**
 * The line through the origin, y = slope x, with n - 1 degrees of freedom.
 *
 * Throws RangeError below two pairs and when all x are zero. Checked: NIST StRD NoInt1, 2.07438016528926.
 * @example lineThroughOrigin({ x: [1, 2], y: [2, 4] }).slope // => 2
 */
export function lineThroughOrigin(input: { readonly x: Values; readonly y: Values }): {
  readonly slope: number;
  readonly slopeSe: number;
  readonly residualSd: number;
  readonly df: number;
} {
  const { x, y } = input;
  const n = requirePairs(x, y, 2);
  const sxx = sum(Float64Array.from(x, (value) => value * value));
  if (!(sxx > 0)) throw new RangeError("All x are zero: no slope can be found.");
  const slope = sum(Float64Array.from(x, (value, i) => value * y[i]!)) / sxx;
  const squares = sum(Float64Array.from(x, (value, i) => (y[i]! - slope * value) ** 2));
  const residualSd = Math.sqrt(squares / (n - 1));
  return { slope, slopeSe: residualSd / Math.sqrt(sxx), residualSd, df: n - 1 };
}
