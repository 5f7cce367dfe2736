import { requireFinite } from "./values";

/** Stirling series coefficients B(2k) / (2k (2k - 1)), k = 1..8 (Abramowitz and Stegun 6.1.40). */
const STIRLING = [
  1 / 12,
  -1 / 360,
  1 / 1260,
  -1 / 1680,
  1 / 1188,
  -691 / 360360,
  1 / 156,
  -3617 / 122400,
] as const;

/**
 * The natural logarithm of the gamma function for x > 0, by recurrence up to 15 and Stirling's series.
 *
 * Source: Abramowitz and Stegun 1964, 6.1.15 and 6.1.40. Checked: ln Gamma(0.5) = ln(pi)/2; factorials.
 * @example logGamma(1) // => 0
 */
export function logGamma(x: number): number {
  requireFinite(x, "x");
  if (x <= 0) throw new RangeError("logGamma needs x greater than zero.");
  if (x === 1 || x === 2) return 0;
  let product = 1;
  let y = x;
  while (y < 15) {
    product *= y;
    y += 1;
  }
  return (y - 0.5) * Math.log(y) - y + 0.5 * Math.log(2 * Math.PI) + stirlingRest(y) - Math.log(product);
}

/** Stirling's series: what is left of ln Gamma(y) beside (y - 1/2) ln y - y + ln(2 pi)/2; for y of 15 or more. */
function stirlingRest(y: number): number {
  const inverse = 1 / y;
  let power = inverse;
  let series = 0;
  for (const coefficient of STIRLING) {
    series += coefficient * power;
    power *= inverse * inverse;
  }
  return series;
}

/** ln Gamma(a + b) - ln Gamma(a), without the loss of digits of a difference when a is large. */
export function logGammaStep(a: number, b: number): number {
  if (a < 15) return logGamma(a + b) - logGamma(a);
  const growth = (a - 0.5) * Math.log1p(b / a) + b * Math.log(a + b) - b;
  return growth + stirlingRest(a + b) - stirlingRest(a);
}

/** Lower regularised incomplete gamma P(a, x) by its power series; best for x < a + 1. */
function lowerSeries(a: number, x: number): number {
  let term = 1 / a;
  let total = term;
  for (let k = 1; k < 10000; k++) {
    term *= x / (a + k);
    total += term;
    if (Math.abs(term) < Math.abs(total) * 1e-17) break;
  }
  return total * Math.exp(-x + a * Math.log(x) - logGamma(a));
}

/** Upper regularised incomplete gamma Q(a, x) by Lentz's continued fraction; best for x >= a + 1. */
function upperFraction(a: number, x: number): number {
  const tiny = 1e-300;
  let b = x + 1 - a;
  let c = 1 / tiny;
  let d = 1 / b;
  let h = d;
  for (let k = 1; k < 10000; k++) {
    const an = -k * (k - a);
    b += 2;
    d = 1 / (Math.abs(an * d + b) < tiny ? tiny : an * d + b);
    c = Math.abs(b + an / c) < tiny ? tiny : b + an / c;
    const step = d * c;
    h *= step;
    if (Math.abs(step - 1) < 1e-16) break;
  }
  return Math.exp(-x + a * Math.log(x) - logGamma(a)) * h;
}

/** Both regularised incomplete gamma functions, each with full relative accuracy in its own tail. */
export function regularisedGamma(a: number, x: number): { lower: number; upper: number } {
  if (!(a > 0)) throw new RangeError("The incomplete gamma function needs a greater than zero.");
  if (!(x >= 0)) throw new RangeError("The incomplete gamma function needs x of zero or more.");
  if (x === 0) return { lower: 0, upper: 1 };
  if (x === Number.POSITIVE_INFINITY) return { lower: 1, upper: 0 };
  if (x < a + 1) {
    const lower = lowerSeries(a, x);
    return { lower, upper: 1 - lower };
  }
  const upper = upperFraction(a, x);
  return { lower: 1 - upper, upper };
}
