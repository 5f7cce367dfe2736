import { requireFinite, requirePositive, requireValues, type Values } from "./values";

/** What an EWMA chart is made from. */
export interface EwmaInput {
  readonly values: Values;
  /** Weight of the newest value, above 0 up to 1. */
  readonly lambda: number;
  /** Target or centre, and standard deviation of a single value. */
  readonly centre: number;
  readonly sigma: number;
  /** Width of the limits in sigma of the statistic, 3 unless told. */
  readonly width?: number;
  /** Where the average starts, the centre unless told. */
  readonly start?: number;
  /** "exact": limits that widen from the first point. "asymptotic": the final width from the first point on. */
  readonly limits?: "exact" | "asymptotic";
}

/** An EWMA chart: the statistic, its limits at each point and the 0-based indexes strictly beyond them. */
export interface EwmaChart {
  readonly statistic: Float64Array;
  readonly lower: Float64Array;
  readonly upper: Float64Array;
  readonly signals: readonly number[];
}

function requireLambda(lambda: number): void {
  if (!(lambda > 0 && lambda <= 1)) throw new RangeError("lambda must be above 0 and at most 1.");
}

/**
 * Half the width between the limits of an EWMA chart at its point number t = 1, 2, ...: width * sigma *
 * sqrt(lambda / (2 - lambda) * (1 - (1 - lambda)^(2t))). Infinity for t gives the asymptotic limit.
 * @example ewmaHalfWidth({ lambda: 1, sigma: 2, width: 3, point: 1 }) // => 6
 */
export function ewmaHalfWidth(input: {
  readonly lambda: number;
  readonly sigma: number;
  readonly width: number;
  readonly point: number;
}): number {
  const { lambda, point } = input;
  requireLambda(lambda);
  const sigma = requirePositive(input.sigma, "sigma");
  const width = requirePositive(input.width, "width");
  if (!(point >= 1)) throw new RangeError("Points are counted from 1.");
  return width * sigma * Math.sqrt((lambda / (2 - lambda)) * (1 - (1 - lambda) ** (2 * point)));
}

/**
 * Has the level drifted a little? The exponentially weighted moving average z = lambda x + (1 - lambda) z' with its
 * limits, sensitive to small lasting shifts that single points do not show.
 *
 * Units: those of the values. Throws RangeError for lambda outside 0 to 1, sigma or width of zero or less.
 * Source: NIST/SEMATECH e-Handbook 6.3.2.4 (which uses asymptotic limits); Lucas and Saccucci 1990.
 * Checked: NIST example, lambda 0.3, limits 52.5884 and 47.4115.
 * @example ewmaChart({ values: [2, 2], lambda: 0.5, centre: 0, sigma: 1 }).statistic[1] // => 1.5
 */
export function ewmaChart(input: EwmaInput): EwmaChart {
  const { values, lambda, centre, sigma, width = 3, start = centre, limits = "exact" } = input;
  const n = requireValues(values, 1);
  requireLambda(lambda);
  requirePositive(sigma, "sigma");
  requirePositive(width, "width");
  requireFinite(centre, "centre");
  const statistic = new Float64Array(n);
  const lower = new Float64Array(n);
  const upper = new Float64Array(n);
  const signals: number[] = [];
  let z = requireFinite(start, "start");
  for (let i = 0; i < n; i++) {
    z = lambda * values[i]! + (1 - lambda) * z;
    const point = limits === "exact" ? i + 1 : Number.POSITIVE_INFINITY;
    const half = ewmaHalfWidth({ lambda, sigma, width, point });
    statistic[i] = z;
    lower[i] = centre - half;
    upper[i] = centre + half;
    if (Math.abs(z - centre) > half + 1e-9 * sigma) signals.push(i);
  }
  return { statistic, lower, upper, signals };
}
