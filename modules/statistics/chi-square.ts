import { boundBelow, findRoot } from "./find-root";
import { regularisedGamma } from "./gamma";
import { requirePositive, requireProbability } from "./values";

/**
 * The share of a chi-square distribution below x.
 * @example chiSquareCdf(0, 4) // => 0
 */
export function chiSquareCdf(x: number, df: number): number {
  requirePositive(df, "Degrees of freedom");
  return regularisedGamma(df / 2, x / 2).lower;
}

/**
 * The value below which the share p of a chi-square distribution lies.
 *
 * Domain: 0 < p < 1, df > 0; throws RangeError outside. Checked: 95 % limits of Cp for n = 50 (scipy).
 * @example chiSquareQuantile(0.95, 2).toFixed(10) // => "5.9914645471"
 */
export function chiSquareQuantile(p: number, df: number): number {
  requirePositive(df, "Degrees of freedom");
  requireProbability(p, "p");
  const upperTail = (x: number) => regularisedGamma(df / 2, x / 2).upper;
  const high = boundBelow(upperTail, 1 - p);
  if (p < 0.5) return findRoot((x) => regularisedGamma(df / 2, x / 2).lower - p, 0, high);
  return findRoot((x) => 1 - p - upperTail(x), 0, high);
}
