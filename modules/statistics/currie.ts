import { findRoot } from "./find-root";
import { normalQuantile } from "./normal";
import { noncentralTCdf, studentTQuantile } from "./student-t";
import { requirePositive, requireProbability } from "./values";

/** Currie's three limits. */
export interface CurrieLimits {
  readonly critical: number;
  readonly detection: number;
  readonly quantification: number;
}

/**
 * Critical level, detection and quantification limits of a net count above a blank of B counts.
 *
 * "paired": blank counted once for as long as the sample; "well known": blank known without error. Quantification is
 * at 10 % relative standard deviation. Working formulas: 2.326 sqrt B, 2.706 + 4.653 sqrt B, 50 (1 + sqrt(1 + B/12.5));
 * 1.645 sqrt B, 2.706 + 3.290 sqrt B, 50 (1 + sqrt(1 + B/25)). Not for B below about 5 counts.
 * Throws RangeError for a negative blank. Source: Currie 1968, Anal. Chem. 40, 586-593. Checked: B 100.
 * @example currieCountLimits({ blankCounts: 100, blank: "paired" }).quantification // => 200
 */
export function currieCountLimits(input: {
  readonly blankCounts: number;
  readonly blank: "paired" | "well known";
  readonly alpha?: number;
  readonly beta?: number;
}): CurrieLimits {
  const { blankCounts, blank, alpha = 0.05, beta = 0.05 } = input;
  if (!(Number.isFinite(blankCounts) && blankCounts >= 0))
    throw new RangeError("Counts must be zero or more.");
  const zAlpha = normalQuantile(1 - requireProbability(alpha, "alpha"));
  const zBeta = normalQuantile(1 - requireProbability(beta, "beta"));
  const variance = blank === "paired" ? 2 * blankCounts : blankCounts;
  const critical = zAlpha * Math.sqrt(variance);
  const inner = 1 + (4 * critical) / zBeta ** 2 + (4 * critical ** 2) / (zAlpha * zBeta) ** 2;
  return {
    critical,
    detection: critical + (zBeta ** 2 / 2) * (1 + Math.sqrt(inner)),
    quantification: 50 * (1 + Math.sqrt(1 + variance / 25)),
  };
}

/**
 * The same limits for a measured quantity whose standard deviation at zero is known or estimated.
 *
 * Known: 1.645 s, 3.290 s, 10 s. Estimated with df degrees of freedom: t s for the critical value and delta s for
 * detection, delta from the noncentral t distribution (not 2 t). Quantification is 10 s.
 * Throws RangeError for s or df of zero or less.
 * Source: Currie 1995, Pure Appl. Chem. 67, 1699-1723. Checked: df 4 gives 2.132 and 4.067.
 */
export function currieLimits(input: {
  readonly sd: number;
  readonly df?: number;
  readonly alpha?: number;
  readonly beta?: number;
}): CurrieLimits {
  const { df, alpha = 0.05, beta = 0.05 } = input;
  const sd = requirePositive(input.sd, "sd");
  requireProbability(alpha, "alpha");
  requireProbability(beta, "beta");
  if (df === undefined) {
    const critical = normalQuantile(1 - alpha) * sd;
    return { critical, detection: critical + normalQuantile(1 - beta) * sd, quantification: 10 * sd };
  }
  const t = studentTQuantile(1 - alpha, requirePositive(df, "df"));
  const most = 4 * (t + studentTQuantile(1 - beta, df)) + 20;
  const delta = findRoot((trial) => noncentralTCdf(t, df, trial) - beta, 0, most, 1e-13);
  return { critical: t * sd, detection: delta * sd, quantification: 10 * sd };
}
