import { boundBelow, findRoot } from "./find-root";
import { logGamma, logGammaStep } from "./gamma";
import { gaussLegendre } from "./gauss-legendre";
import { normalCdf } from "./normal";
import { requireFinite, requirePositive, requireProbability } from "./values";

/** Continued fraction of the incomplete beta function (Lentz). */
function betaFraction(x: number, a: number, b: number): number {
  const tiny = 1e-300;
  let c = 1;
  let d = 1 - ((a + b) * x) / (a + 1);
  d = 1 / (Math.abs(d) < tiny ? tiny : d);
  let h = d;
  for (let k = 1; k < 20000; k++) {
    const even = (k * (b - k) * x) / ((a + 2 * k - 1) * (a + 2 * k));
    d = 1 / (1 + even * d || tiny);
    c = 1 + even / c || tiny;
    h *= d * c;
    const odd = (-(a + k) * (a + b + k) * x) / ((a + 2 * k) * (a + 2 * k + 1));
    d = 1 / (1 + odd * d || tiny);
    c = 1 + odd / c || tiny;
    const step = d * c;
    h *= step;
    if (Math.abs(step - 1) < 1e-16) break;
  }
  return h;
}

/**
 * The regularised incomplete beta function; `rest` is 1 - x, given apart so that no digits are lost near x = 1.
 *
 * Source: Abramowitz and Stegun 1964, 26.5.8. Checked: I(0.5; a, a) = 0.5, Student t and F quantiles of scipy.
 */
export function regularisedBeta(x: number, rest: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (rest <= 0) return 1;
  const logBeta = logGamma(Math.min(a, b)) - logGammaStep(Math.max(a, b), Math.min(a, b));
  const logX = x < 0.5 ? Math.log(x) : Math.log1p(-rest);
  const logFactor = a * logX + b * Math.log(rest) - logBeta;
  const factor = Math.exp(logFactor);
  if (x < (a + 1) / (a + b + 2)) return (factor * betaFraction(x, a, b)) / a;
  return 1 - (factor * betaFraction(rest, b, a)) / b;
}

/** Refuses degrees of freedom of zero or less; infinitely many give the normal distribution. */
function requireDf(df: number): void {
  if (!(df > 0)) throw new RangeError("Degrees of freedom must be greater than zero.");
}

/** The share of Student's t distribution above a t of zero or more. */
function upperTail(t: number, df: number): number {
  if (df === Number.POSITIVE_INFINITY) return normalCdf(-t);
  const square = t * t;
  const sum = df + square;
  return 0.5 * regularisedBeta(df / sum, square / sum, df / 2, 0.5);
}

/**
 * The share of Student's t distribution below t.
 * @example studentTCdf(0, 5) // => 0.5
 */
export function studentTCdf(t: number, df: number): number {
  requireDf(df);
  requireFinite(t, "t");
  return t < 0 ? upperTail(-t, df) : 1 - upperTail(t, df);
}

/**
 * The t below which the share p of Student's distribution lies; df need not be whole and may be infinite.
 *
 * Domain: 0 < p < 1, df > 0; throws RangeError outside.
 * Checked: one-sided 99 % values of 40 CFR 136 Appendix B (3.143 for 6 degrees of freedom), scipy.
 * @example studentTQuantile(0.5, 3) // => 0
 */
export function studentTQuantile(p: number, df: number): number {
  requireDf(df);
  requireProbability(p, "p");
  if (p < 0.5) return -upperQuantile(p, df);
  return upperQuantile(1 - p, df);
}

function upperQuantile(tail: number, df: number): number {
  if (tail === 0.5) return 0;
  const f = (t: number) => upperTail(t, df);
  return findRoot((t) => f(t) - tail, 0, boundBelow(f, tail));
}

/**
 * The share of the noncentral t distribution (df, noncentrality delta) below t, by integrating over the chi
 * distribution of the denominator (in its fourth root, which keeps small df smooth).
 *
 * Source: definition T = (Z + delta) / (chi / sqrt(df)). Checked: df 4, delta 4.06727564116139 gives 0.05 at 2.1318.
 * @example noncentralTCdf(0, 5, 0).toFixed(12) // => "0.500000000000"
 */
export function noncentralTCdf(t: number, df: number, delta: number): number {
  requirePositive(df, "Degrees of freedom");
  const middle = Math.sqrt(df);
  const from = Math.max(0, middle - 9) ** 0.25;
  const { nodes, weights } = gaussLegendre(160, from, (middle + 9) ** 0.25);
  const logScale = (1 - df / 2) * Math.LN2 - logGamma(df / 2) + Math.log(4);
  let total = 0;
  for (let i = 0; i < nodes.length; i++) {
    const chi = nodes[i]! ** 4;
    const density = Math.exp(logScale + (df - 0.25) * Math.log(chi) - 0.5 * chi * chi);
    total += weights[i]! * density * normalCdf((t * chi) / middle - delta);
  }
  return Math.min(1, total);
}
