import { mean, standardDeviation } from "./moments";
import { studentTQuantile } from "./student-t";
import { requireValues, sortedCopy, type Values } from "./values";

/** Fewest spiked samples and fewest blanks of the procedure, and the count from which a rank replaces the highest. */
const PROCEDURE = { fewest: 7, confidence: 0.99, rankFrom: 100 } as const;

/** How the part from the blanks was found. */
export type BlankRule =
  | "no blank gave a number"
  | "highest blank"
  | "99th percentile of blanks"
  | "mean and t";

/** A method detection limit with its two parts, in the unit of the results. */
export interface MethodDetectionLimit {
  readonly limit: number;
  readonly fromSpikes: number;
  /** Null when no blank gave a number: this part then does not apply. */
  readonly fromBlanks: number | null;
  readonly blankRule: BlankRule;
  readonly spikeSd: number;
  readonly t: number;
}

/** Student's t at 99 %, one-sided, for n results. */
function tFor(n: number): number {
  return studentTQuantile(PROCEDURE.confidence, n - 1);
}

/**
 * The part of the method detection limit that the blanks give. Null entries are blanks without a number (not
 * detected). None numeric: does not apply (null). Some: the highest, or with 100 blanks or more the value at rank
 * round(0.99 n). All: the mean, taken as 0 when negative, plus t times the standard deviation.
 *
 * Throws RangeError below 7 blanks. Source: 40 CFR 136 Appendix B rev. 2 (2017) and EPA 821-R-16-006, steps from memory.
 * Checked: 164 blanks ending 1.5, 1.7, 1.9, 5.0, 10 give rank 162, 1.9.
 * @example detectionLimitFromBlanks([2, null, 1, null, null, null, null]).fromBlanks // => 2
 */
export function detectionLimitFromBlanks(blanks: readonly (number | null)[]): {
  readonly fromBlanks: number | null;
  readonly blankRule: BlankRule;
} {
  const n = blanks.length;
  if (n < PROCEDURE.fewest) throw new RangeError(`At least 7 method blanks are needed, ${n} given.`);
  const known = blanks.filter((blank): blank is number => blank !== null);
  if (known.length === 0) return { fromBlanks: null, blankRule: "no blank gave a number" };
  requireValues(known, 1, "blanks");
  if (known.length === n) {
    const fromBlanks = Math.max(mean(known), 0) + tFor(n) * standardDeviation(known);
    return { fromBlanks, blankRule: "mean and t" };
  }
  const sorted = sortedCopy(known);
  if (n < PROCEDURE.rankFrom) return { fromBlanks: sorted[sorted.length - 1]!, blankRule: "highest blank" };
  const fromTop = n - Math.round(0.99 * n);
  const place = Math.max(0, sorted.length - 1 - fromTop);
  return { fromBlanks: sorted[place]!, blankRule: "99th percentile of blanks" };
}

/**
 * The lowest content that this method tells from nothing with 99 % confidence, from spiked samples and blanks that
 * went through the whole procedure: the greater of t times the sd of the spikes and the part from the blanks.
 *
 * The days and batches over which the results must be spread (three batches on three dates, the last 24 months) are
 * the caller's to check. Throws RangeError below 7 spikes or 7 blanks.
 * Source: 40 CFR 136 Appendix B rev. 2 (2017). Checked: constructed sets recomputed with scipy.
 */
export function methodDetectionLimit(input: {
  readonly spikes: Values;
  readonly blanks: readonly (number | null)[];
}): MethodDetectionLimit {
  const n = requireValues(input.spikes, PROCEDURE.fewest, "spikes");
  const t = tFor(n);
  const spikeSd = standardDeviation(input.spikes);
  const fromSpikes = t * spikeSd;
  const { fromBlanks, blankRule } = detectionLimitFromBlanks(input.blanks);
  return { limit: Math.max(fromSpikes, fromBlanks ?? 0), fromSpikes, fromBlanks, blankRule, spikeSd, t };
}

/**
 * May last year's limit stay? Yes while the new one is 0.5 to 2.0 times it and fewer than 3 % of blanks exceed it.
 *
 * Source: 40 CFR 136 Appendix B rev. 2, annual verification (from memory).
 * @example detectionLimitMayStay({ standing: 1, fresh: 2, shareOfBlanksAbove: 0.02 }) // => true
 */
export function detectionLimitMayStay(input: {
  readonly standing: number;
  readonly fresh: number;
  readonly shareOfBlanksAbove: number;
}): boolean {
  const { standing, fresh, shareOfBlanksAbove } = input;
  if (!(standing > 0 && fresh > 0)) throw new RangeError("Both limits must be greater than zero.");
  if (!(shareOfBlanksAbove >= 0 && shareOfBlanksAbove <= 1))
    throw new RangeError("A share lies between 0 and 1.");
  const ratio = fresh / standing;
  return ratio >= 0.5 && ratio <= 2 && shareOfBlanksAbove < 0.03;
}
