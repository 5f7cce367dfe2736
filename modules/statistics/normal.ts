import { regularisedGamma } from "./gamma";
import { requireProbability } from "./values";

/** The density of the standard normal distribution at z. */
export function normalDensity(z: number): number {
  return Math.exp(-0.5 * z * z) / Math.sqrt(2 * Math.PI);
}

/**
 * The share of a standard normal distribution below z, with full relative accuracy in both tails.
 *
 * Source: Abramowitz and Stegun 1964, 26.2 with 6.5 (incomplete gamma). Checked: Phi(-2) = 0.0227501319481792.
 * @example normalCdf(0) // => 0.5
 */
export function normalCdf(z: number): number {
  if (Number.isNaN(z)) throw new RangeError("z must be a number.");
  const { lower, upper } = regularisedGamma(0.5, 0.5 * z * z);
  return z < 0 ? 0.5 * upper : 0.5 + 0.5 * lower;
}

/** Acklam-type starting value by the tail expansion of Abramowitz and Stegun 26.2.23 (error below 4.5e-4). */
function roughQuantile(p: number): number {
  const t = Math.sqrt(-2 * Math.log(p));
  const above = 2.515517 + t * (0.802853 + t * 0.010328);
  const below = 1 + t * (1.432788 + t * (0.189269 + t * 0.001308));
  return above / below - t;
}

/**
 * The z below which the share p of a standard normal distribution lies (Halley steps on `normalCdf`).
 *
 * Domain: 0 < p < 1; throws RangeError outside. Checked: 0.975 gives 1.959963984540054.
 * @example normalQuantile(0.5) // => 0
 */
export function normalQuantile(p: number): number {
  requireProbability(p, "p");
  if (p === 0.5) return 0;
  if (p > 0.5) return -normalQuantile(1 - p);
  let z = roughQuantile(p);
  for (let k = 0; k < 4; k++) {
    const step = (normalCdf(z) - p) / normalDensity(z);
    z -= step / (1 + 0.5 * z * step);
  }
  return z;
}
