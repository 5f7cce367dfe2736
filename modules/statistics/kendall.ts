import { normalCdf } from "./normal";
import { requirePairs, sortedCopy, type Values } from "./values";

/** Kendall's statistics of a paired series. */
export interface KendallResult {
  readonly n: number;
  /** Concordant less discordant pairs. */
  readonly s: number;
  readonly variance: number;
  /** Normal deviate with continuity correction, 0 when S is 0. */
  readonly z: number;
  readonly pTwoSided: number;
  readonly tauA: number;
  /** Corrected for ties; 0 when either series does not vary. */
  readonly tauB: number;
  /** Denominator of tau-b. */
  readonly denominator: number;
}

/** Most values taken: the pairs grow with the square. */
export const MOST_PAIRED_VALUES = 5000;

/** Sizes of the groups of equal values. */
function tieGroups(values: Values): number[] {
  const sorted = sortedCopy(values);
  const groups: number[] = [];
  let size = 1;
  for (let i = 1; i <= sorted.length; i++) {
    if (i < sorted.length && sorted[i]! === sorted[i - 1]!) size++;
    else {
      if (size > 1) groups.push(size);
      size = 1;
    }
  }
  return groups;
}

const total = (groups: readonly number[], of: (t: number) => number) =>
  groups.reduce((before, t) => before + of(t), 0);

/** Variance of S under no association, with ties in both series (Kendall 1975, 4.9). */
function varianceOfS(n: number, xTies: readonly number[], yTies: readonly number[]): number {
  const cubes = (t: number) => t * (t - 1) * (2 * t + 5);
  const pairs = (t: number) => t * (t - 1);
  const triples = (t: number) => t * (t - 1) * (t - 2);
  const first = (cubes(n) - total(xTies, cubes) - total(yTies, cubes)) / 18;
  const second = n > 2 ? (total(xTies, triples) * total(yTies, triples)) / (9 * triples(n)) : 0;
  return first + second + (total(xTies, pairs) * total(yTies, pairs)) / (2 * pairs(n));
}

/** Concordant less discordant pairs. */
function scoreOf(x: Values, y: Values): number {
  let s = 0;
  for (let i = 0; i < x.length - 1; i++) {
    for (let j = i + 1; j < x.length; j++) s += Math.sign(x[j]! - x[i]!) * Math.sign(y[j]! - y[i]!);
  }
  return s;
}

/** z and p of S with the usual continuity correction. */
export function kendallTest(s: number, variance: number): { z: number; pTwoSided: number } {
  const z = s === 0 || variance <= 0 ? 0 : (s - Math.sign(s)) / Math.sqrt(variance);
  return { z, pTwoSided: Math.min(1, 2 * normalCdf(-Math.abs(z))) };
}

/**
 * Do two series rise together? Kendall's S, tau and test, with ties in both.
 *
 * Throws RangeError for series of different length, below two or above 5,000 pairs.
 * Source: Kendall 1975, Rank Correlation Methods. Checked: his examples, S 34 with D 83.4266 and variance 203.30.
 * @example kendall({ x: [1, 2, 3, 4], y: [1, 2, 3, 4] }).tauB // => 1
 */
export function kendall(input: { readonly x: Values; readonly y: Values }): KendallResult {
  const { x, y } = input;
  const n = requirePairs(x, y, 2);
  if (n > MOST_PAIRED_VALUES)
    throw new RangeError(`At most ${MOST_PAIRED_VALUES} values can be compared pair by pair.`);
  const s = scoreOf(x, y);
  const xTies = tieGroups(x);
  const yTies = tieGroups(y);
  const variance = varianceOfS(n, xTies, yTies);
  const half = (t: number) => (t * (t - 1)) / 2;
  const denominator = Math.sqrt((half(n) - total(xTies, half)) * (half(n) - total(yTies, half)));
  return {
    n,
    s,
    variance,
    ...kendallTest(s, variance),
    tauA: s / half(n),
    tauB: denominator > 0 ? s / denominator : 0,
    denominator,
  };
}
