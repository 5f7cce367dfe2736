import { boundBelow, findRoot } from "./find-root";
import { regularisedBeta } from "./student-t";
import { requirePositive, requireProbability } from "./values";

/** The share of Fisher's F distribution above f. */
export function fisherFUpperTail(f: number, df1: number, df2: number): number {
  requirePositive(df1, "Degrees of freedom above");
  requirePositive(df2, "Degrees of freedom below");
  if (!(f >= 0)) throw new RangeError("F must be zero or more.");
  const sum = df2 + df1 * f;
  return regularisedBeta(df2 / sum, (df1 * f) / sum, df2 / 2, df1 / 2);
}

/**
 * The F below which the share p of Fisher's distribution lies.
 *
 * Domain: 0 < p < 1, both degrees of freedom > 0; throws RangeError outside.
 * Checked: p 0.99, 1 and 7 degrees of freedom give 12.2463833484351 (scipy); F(p; 2, 2) = p / (1 - p).
 * @example fisherFQuantile(0.5, 2, 2) // => 1
 */
export function fisherFQuantile(p: number, df1: number, df2: number): number {
  requireProbability(p, "p");
  const tail = (f: number) => fisherFUpperTail(f, df1, df2);
  return findRoot((f) => tail(f) - (1 - p), 0, boundBelow(tail, 1 - p));
}
