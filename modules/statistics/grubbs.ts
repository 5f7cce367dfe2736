import { mean, standardDeviation } from "./moments";
import { studentTQuantile } from "./student-t";
import { requireProbability, requireValues, type Values } from "./values";

/** Which end is suspected: the greatest, the smallest, or either. */
export type OutlierSide = "either" | "greatest" | "smallest";

/** What Grubbs' test found; `index` is the 0-based place of the suspect. */
export interface GrubbsTest {
  readonly g: number;
  readonly critical: number;
  readonly index: number;
  readonly outlier: boolean;
}

/**
 * The critical value of Grubbs' statistic for n values: (n - 1)/sqrt n sqrt(t^2 / (n - 2 + t^2)), t with n - 2 degrees
 * of freedom at alpha/(2n) when either end is suspected and alpha/n when one end was named beforehand.
 *
 * Throws RangeError below three values. Checked: n 8, 5 %: 2.0317 one-sided, 2.1266 two-sided.
 * @example grubbsCritical({ n: 8, alpha: 0.05, side: "greatest" }).toFixed(3) // => "2.032"
 */
export function grubbsCritical(input: {
  readonly n: number;
  readonly alpha: number;
  readonly side: OutlierSide;
}): number {
  const { n, side } = input;
  if (!(Number.isInteger(n) && n >= 3)) throw new RangeError("Grubbs' test needs three values or more.");
  const alpha = requireProbability(input.alpha, "alpha");
  const t = studentTQuantile(1 - alpha / (side === "either" ? 2 * n : n), n - 2);
  return ((n - 1) / Math.sqrt(n)) * Math.sqrt((t * t) / (n - 2 + t * t));
}

/**
 * Is the most extreme value too far out to belong to the others? For one suspect in normal data; for several use
 * `generalisedEsd`. A value is not thrown away because of a test alone.
 *
 * Throws RangeError below three values and when all are equal.
 * Source: NIST/SEMATECH e-Handbook 1.3.5.17.1. Checked: uranium data, G 2.4687 against 2.032.
 * @example grubbsTest({ values: [1, 2, 1, 2, 1, 2, 9] }).index // => 6
 */
export function grubbsTest(input: {
  readonly values: Values;
  readonly alpha?: number;
  readonly side?: OutlierSide;
}): GrubbsTest {
  const { values, alpha = 0.05, side = "either" } = input;
  const n = requireValues(values, 3);
  const centre = mean(values);
  const sd = standardDeviation(values);
  if (!(sd > 0)) throw new RangeError("All values are equal: none is farther out than the others.");
  const distance = (value: number) =>
    side === "either" ? Math.abs(value - centre) : side === "greatest" ? value - centre : centre - value;
  let index = 0;
  for (let i = 1; i < n; i++) if (distance(values[i]!) > distance(values[index]!)) index = i;
  const g = distance(values[index]!) / sd;
  const critical = grubbsCritical({ n, alpha, side });
  return { g, critical, index, outlier: g > critical };
}
