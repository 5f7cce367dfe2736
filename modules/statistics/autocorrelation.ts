import { type IndividualsInput, type IndividualsLimits, individualsLimits } from "./individuals";
import { lagOneAutocorrelation } from "./moments";
import { requirePositive } from "./values";

/** When the correction is applied: only when r1 is significant (default) or always. */
export type CorrectionRule = "significant" | "always";

/** Individuals limits with sigma corrected for autocorrelation. */
export interface CorrectedLimits extends IndividualsLimits {
  /** Sigma from moving ranges as if the readings were independent. */
  readonly uncorrectedSigma: number;
  readonly r1: number;
  /** |r1| above this is significant at 95 %: 1.96 / sqrt(n). */
  readonly r1Limit: number;
  readonly corrected: boolean;
  /** A sentence for the reader, or null when nothing needs saying. */
  readonly warning: string | null;
}

/** A correction divides by sqrt(1 - r1); nearer to 1 than this the readings say nothing about sigma. */
const GREATEST_R1 = 0.95;

function warningFor(r1: number, significant: boolean, corrected: boolean): string | null {
  if (!significant) return null;
  const how =
    r1 > 0
      ? "Neighbouring readings resemble each other, so moving ranges understate the spread"
      : "Neighbouring readings swing against each other, so moving ranges overstate the spread";
  const done = corrected
    ? `sigma is corrected by 1/sqrt(1 - r1)`
    : `sigma is not corrected, most signals may be false`;
  return `${how} (r1 = ${r1.toFixed(2)}); ${done}.`;
}

/**
 * Limits of an individuals chart for readings that depend on the ones before: sigma = (mean moving range / d2) /
 * sqrt(1 - r1), which is the standard deviation of an AR(1) process with phi = r1.
 *
 * Throws as `individualsLimits`, for fewer than 3 values, for readings that are all equal, for r1 above 0.95.
 * Source: E|x(t) - x(t-1)| = (2 / sqrt(pi)) sigma sqrt(1 - phi). Checked: NIST StRD Michelso, 0.0683008069713248 with
 * d2 = 1.128. A set `centre` and `width` work as in `individualsLimits`; the moving-range limit is not corrected.
 * @example correctedIndividualsLimits({ values: [1, 2, 1, 2, 1, 3] }).corrected // => false
 */
export function correctedIndividualsLimits(
  input: IndividualsInput & { readonly correct?: CorrectionRule },
): CorrectedLimits {
  const { values, correct = "significant", width = 3 } = input;
  const plain = individualsLimits(input);
  const r1 = lagOneAutocorrelation(values);
  const r1Limit = 1.96 / Math.sqrt(plain.n);
  const significant = Math.abs(r1) > r1Limit;
  const corrected = correct === "always" || significant;
  if (corrected && r1 > GREATEST_R1) {
    throw new RangeError(
      `Readings resemble their neighbours too much (r1 = ${r1.toFixed(3)}); thin them out before setting limits.`,
    );
  }
  const sigma = corrected ? plain.sigma / Math.sqrt(1 - r1) : plain.sigma;
  return {
    ...plain,
    sigma,
    lower: plain.centre - width * sigma,
    upper: plain.centre + width * sigma,
    uncorrectedSigma: plain.sigma,
    r1,
    r1Limit: requirePositive(r1Limit, "r1Limit"),
    corrected,
    warning: warningFor(r1, significant, corrected),
  };
}

/**
 * By how much does autocorrelation widen the variance of a mean of many values? (1 + phi) / (1 - phi) for AR(1).
 *
 * Domain: -1 < phi < 1; throws RangeError outside. Checked: phi 0.5 gives 3.
 * @example meanVarianceInflation(0.5) // => 3
 */
export function meanVarianceInflation(phi: number): number {
  if (!(phi > -1 && phi < 1)) throw new RangeError("phi must lie between -1 and 1.");
  return (1 + phi) / (1 - phi);
}
