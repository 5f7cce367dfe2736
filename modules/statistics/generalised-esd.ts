import { mean, standardDeviation } from "./moments";
import { studentTQuantile } from "./student-t";
import { requireProbability, requireValues, type Values } from "./values";

/** One step of the test: the value taken out, its statistic and critical value. */
export interface EsdStep {
  readonly index: number;
  readonly value: number;
  readonly r: number;
  readonly critical: number;
}

/**
 * Which of up to `most` values are outliers? Rosner's generalised extreme studentised deviate: takes out the most
 * extreme value `most` times and then counts up to the LAST step whose statistic exceeds its critical value. It does
 * not stop at the first step that is not significant, so outliers do not hide one another.
 *
 * Domain: approximately normal data, 25 values or more by preference (15 at least for a good approximation).
 * Throws RangeError when fewer than `most` + 2 values are given. Ends early only when the rest are all equal.
 * Source: Rosner 1983, Technometrics 25, 165-172; NIST/SEMATECH e-Handbook 1.3.5.17.3. Checked: its 54 values, 3 outliers.
 */
export function generalisedEsd(input: {
  readonly values: Values;
  readonly most: number;
  readonly alpha?: number;
}): {
  readonly steps: readonly EsdStep[];
  /** 0-based indexes of the outliers in the order in which they were taken out. */
  readonly outliers: readonly number[];
} {
  const { values, most, alpha = 0.05 } = input;
  requireProbability(alpha, "alpha");
  if (!(Number.isInteger(most) && most >= 1))
    throw new RangeError("most must be a whole number of 1 or more.");
  const n = requireValues(values, most + 2);
  const left = Array.from({ length: n }, (_, index) => index);
  const steps: EsdStep[] = [];
  for (let i = 1; i <= most; i++) {
    const kept = Float64Array.from(left, (index) => values[index]!);
    const centre = mean(kept);
    const sd = standardDeviation(kept);
    if (!(sd > 0)) break;
    let place = 0;
    for (let j = 1; j < kept.length; j++) {
      if (Math.abs(kept[j]! - centre) > Math.abs(kept[place]! - centre)) place = j;
    }
    const t = studentTQuantile(1 - alpha / (2 * (n - i + 1)), n - i - 1);
    const critical = ((n - i) * t) / Math.sqrt((n - i - 1 + t * t) * (n - i + 1));
    steps.push({
      index: left[place]!,
      value: kept[place]!,
      r: Math.abs(kept[place]! - centre) / sd,
      critical,
    });
    left.splice(place, 1);
  }
  const count = steps.findLastIndex((step) => step.r > step.critical) + 1;
  return { steps, outliers: steps.slice(0, count).map((step) => step.index) };
}
