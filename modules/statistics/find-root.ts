/**
 * The zero of a continuous function between two bounds at which its signs differ (Brent's method: inverse quadratic
 * and secant steps that fall back on halving), to the last digits of a double.
 *
 * Throws RangeError when the function has the same sign at both bounds.
 * Source: Brent 1973, Algorithms for Minimization without Derivatives, chapter 4.
 * @example findRoot((x) => x - 2, 0, 4) // => 2
 */
export function findRoot(f: (x: number) => number, from: number, to: number, relative = 1e-15): number {
  let a = from;
  let b = to;
  let fa = f(a);
  let fb = f(b);
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (fa > 0 === fb > 0) throw new RangeError("No zero is enclosed between the bounds.");
  let c = a;
  let fc = fa;
  let step = b - a;
  let before = step;
  for (let pass = 0; pass < 200; pass++) {
    if (Math.abs(fc) < Math.abs(fb)) {
      [a, b, c] = [b, c, b];
      [fa, fb, fc] = [fb, fc, fb];
    }
    const tolerance = 2 * relative * Math.abs(b) + 1e-300;
    const half = 0.5 * (c - b);
    if (Math.abs(half) <= tolerance || fb === 0) return b;
    const trial = brentStep(a, b, c, fa, fb, fc, half);
    const usable =
      Math.abs(before) >= tolerance &&
      Math.abs(fa) > Math.abs(fb) &&
      Math.abs(trial) < Math.min(1.5 * Math.abs(half), 0.5 * Math.abs(before)) &&
      trial > 0 === half > 0;
    before = usable ? step : half;
    step = usable ? trial : half;
    a = b;
    fa = fb;
    b += Math.abs(step) > tolerance ? step : Math.sign(half) * tolerance;
    fb = f(b);
    if (fb > 0 === fc > 0) {
      c = a;
      fc = fa;
      step = b - a;
      before = step;
    }
  }
  return b;
}

/** One secant or inverse quadratic step from b. */
function brentStep(
  a: number,
  b: number,
  c: number,
  fa: number,
  fb: number,
  fc: number,
  half: number,
): number {
  const s = fb / fa;
  if (a === c) return (2 * half * s) / (s - 1) || 0;
  const q = fa / fc;
  const r = fb / fc;
  const p = s * (2 * half * q * (q - r) - (b - a) * (r - 1));
  return -p / ((q - 1) * (r - 1) * (s - 1));
}

/** The smallest bound, doubled from 1, at which a falling function has dropped to `level` or below. */
export function boundBelow(f: (x: number) => number, level: number): number {
  let high = 1;
  for (let pass = 0; pass < 1000 && f(high) > level; pass++) high *= 2;
  return high;
}
