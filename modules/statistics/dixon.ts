import { findRoot } from "./find-root";
import { logGamma } from "./gamma";
import { gaussLegendre } from "./gauss-legendre";
import { normalCdf, normalDensity } from "./normal";
import { requireProbability, requireValues, sortedCopy, type Values } from "./values";

/** Dixon's ratios: how many values are left out at the far end (above) and at the other end (below). */
export type DixonRatio = "r10" | "r11" | "r21" | "r22";

/** Sizes for which the test is used. */
export const DIXON_SIZES = { least: 3, most: 30 } as const;

/** The ratio usual for n values: r10 up to 7, r11 for 8 to 10, r21 for 11 to 13, r22 from 14. */
export function dixonRatioFor(n: number): DixonRatio {
  if (!(Number.isInteger(n) && n >= DIXON_SIZES.least && n <= DIXON_SIZES.most)) {
    throw new RangeError(`Dixon's test is for 3 to 30 values, not ${n}.`);
  }
  if (n <= 7) return "r10";
  if (n <= 10) return "r11";
  return n <= 13 ? "r21" : "r22";
}

const GAPS = { r10: [1, 0], r11: [1, 1], r21: [2, 1], r22: [2, 2] } as const;

/** The ratio of a suspect at the top of an ascending series. */
function ratioAtTop(sorted: Values, ratio: DixonRatio): number {
  const [above, below] = GAPS[ratio];
  const n = sorted.length;
  const whole = sorted[n - 1]! - sorted[below]!;
  return whole > 0 ? (sorted[n - 1]! - sorted[n - 1 - above]!) / whole : 0;
}

/** A grid over the lower reference value v and the greatest value x = v + w, with their joint weights. */
function grid(n: number, below: number) {
  const { nodes, weights } = gaussLegendre(40, 0, 13);
  const middle = n - 2 - below;
  const scale = Math.exp(logGamma(n + 1) - logGamma(below + 1) - logGamma(middle + 1));
  const points: { v: number; w: number; atV: number; atX: number; weight: number }[] = [];
  for (let v = -8; v <= 8; v += 0.2) {
    const atV = normalCdf(v);
    for (let k = 0; k < nodes.length; k++) {
      const w = nodes[k]!;
      const weight = scale * 0.2 * weights[k]! * normalDensity(v) * normalDensity(v + w) * atV ** below;
      if (weight > 1e-16) points.push({ v, w, atV, atX: normalCdf(v + w), weight });
    }
  }
  return { points, middle };
}

const knownCriticals = new Map<string, number>();

/**
 * The value that Dixon's ratio of a named end exceeds with the chance alpha in n normal values, computed by
 * integration instead of read from the printed tables, which hold misprints.
 *
 * Formula: P(R > r) = integral over the greatest and the lower reference value of the chance that the values between
 * leave the gap free. Domain: n = 3 to 30, alpha 0.0005 to 0.5; throws RangeError outside.
 * Source: Dixon 1950, 1951; integral after McBane 2006, J. Stat. Software 16(3). Checked: simulation of 4 million
 * samples within 0.001; Dean and Dixon's printed table (whose 0.926 for n 4 at 0.5 % is a misprint for 0.921).
 * @example dixonCritical({ n: 7, alpha: 0.05 }).toFixed(3) // => "0.507"
 */
export function dixonCritical(input: {
  readonly n: number;
  readonly alpha: number;
  readonly ratio?: DixonRatio;
}): number {
  const { n, alpha } = input;
  const ratio = input.ratio ?? dixonRatioFor(n);
  dixonRatioFor(n);
  if (!(alpha >= 0.0005 && alpha <= 0.5)) throw new RangeError("alpha must lie between 0.0005 and 0.5.");
  const [above, below] = GAPS[ratio];
  if (n < above + below + 2)
    throw new RangeError(`The ratio ${ratio} needs ${above + below + 2} values or more.`);
  const key = `${ratio} ${n} ${alpha}`;
  const known = knownCriticals.get(key);
  if (known !== undefined) return known;
  const { points, middle } = grid(n, below);
  const exceeds = (r: number) => {
    let chance = 0;
    for (const { v, w, atV, atX, weight } of points) {
      const edge = normalCdf(v + w - r * w);
      const inside = Math.max(0, edge - atV);
      chance += weight * inside ** middle;
      if (above === 2) chance += weight * middle * (atX - edge) * inside ** (middle - 1);
    }
    return chance;
  };
  const critical = findRoot((r) => exceeds(r) - alpha, 0.01, 0.9999, 1e-10);
  knownCriticals.set(key, critical);
  return critical;
}

/** What Dixon's test found. */
export interface DixonTest {
  readonly ratio: DixonRatio;
  readonly q: number;
  readonly critical: number;
  readonly suspect: number;
  readonly outlier: boolean;
}

/**
 * Is one end of a small series too far from its neighbour? Q = gap / range for the end with the greater ratio. With
 * "either" end suspected (default) the critical value is the one-sided one at alpha/2.
 *
 * Throws RangeError outside 3 to 30 values and when all are equal.
 * Source: Dixon 1951; Miller and Miller. Checked: nitrite, 4 values Q 0.700 kept, 7 values Q 0.606 rejected.
 * @example dixonTest({ values: [0.403, 0.41, 0.401, 0.38] }).outlier // => false
 */
export function dixonTest(input: {
  readonly values: Values;
  readonly alpha?: number;
  readonly side?: "either" | "greatest" | "smallest";
}): DixonTest {
  const { values, alpha = 0.05, side = "either" } = input;
  requireProbability(alpha, "alpha");
  const n = requireValues(values, DIXON_SIZES.least);
  const ratio = dixonRatioFor(n);
  const sorted = sortedCopy(values);
  if (sorted[0]! === sorted[n - 1]!) throw new RangeError("All values are equal: none is farther out.");
  const top = side === "smallest" ? -1 : ratioAtTop(sorted, ratio);
  const mirrored = sorted.map((value) => -value).reverse();
  const bottom = side === "greatest" ? -1 : ratioAtTop(mirrored, ratio);
  const q = Math.max(top, bottom);
  const critical = dixonCritical({ n, alpha: side === "either" ? alpha / 2 : alpha, ratio });
  return { ratio, q, critical, suspect: top >= bottom ? sorted[n - 1]! : sorted[0]!, outlier: q > critical };
}
