import { logGamma } from "./gamma";
import { gaussLegendre } from "./gauss-legendre";
import { normalCdf, normalDensity } from "./normal";

/** The factors that turn a mean range or a mean standard deviation of subgroups of n into chart limits. */
export interface ChartConstants {
  readonly n: number;
  /** Mean and standard deviation of the range of n normal values, in sigma. */
  readonly d2: number;
  readonly d3: number;
  /** Mean of the sample standard deviation, in sigma. */
  readonly c4: number;
  readonly A: number;
  readonly A2: number;
  readonly A3: number;
  readonly B3: number;
  readonly B4: number;
  readonly B5: number;
  readonly B6: number;
  readonly D1: number;
  readonly D2: number;
  readonly D3: number;
  readonly D4: number;
  readonly E2: number;
  readonly E3: number;
}

/** Subgroup sizes for which factors are given. */
export const SUBGROUP_SIZES = { least: 2, most: 25 } as const;

const known = new Map<number, ChartConstants>();

/** The chance that the range of n standard normal values exceeds w. */
function rangeExceeds(w: number, n: number): number {
  const step = 0.125;
  let inside = 0;
  for (let x = -9 - w; x <= 9; x += step) {
    inside += normalDensity(x) * (normalCdf(x + w) - normalCdf(x)) ** (n - 1);
  }
  return 1 - n * step * inside;
}

/** Mean and standard deviation of the range of n standard normal values, by integration of its distribution. */
function rangeMoments(n: number): { d2: number; d3: number } {
  const { nodes, weights } = gaussLegendre(48, 0, 14);
  let first = 0;
  let second = 0;
  for (let i = 0; i < nodes.length; i++) {
    const tail = weights[i]! * rangeExceeds(nodes[i]!, n);
    first += tail;
    second += 2 * nodes[i]! * tail;
  }
  return { d2: first, d3: Math.sqrt(second - first * first) };
}

/**
 * Control-chart factors for subgroups of n, computed from their definitions rather than from a rounded table:
 * d2 and d3 by integrating the distribution of the range, c4 from the gamma function.
 *
 * Domain: n = 2 to 25; throws RangeError outside. Negative lower factors are 0.
 * Source: ISO 7870-2, ASTM E2587; definitions in the NIST/SEMATECH e-Handbook 6.3.2.1.
 * Checked: d2(2) = 2/sqrt(pi), d3(2) = sqrt(2 - 4/pi), ten digits of an independent integration for n = 2 to 25.
 * @example chartConstants(2).d2 // => 1.1283791670955126
 */
export function chartConstants(n: number): ChartConstants {
  if (!Number.isInteger(n) || n < SUBGROUP_SIZES.least || n > SUBGROUP_SIZES.most) {
    throw new RangeError(`Chart factors exist for subgroups of 2 to 25, not ${n}.`);
  }
  const found = known.get(n);
  if (found) return found;
  const { d2, d3 } =
    n === 2 ? { d2: 2 / Math.sqrt(Math.PI), d3: Math.sqrt(2 - 4 / Math.PI) } : rangeMoments(n);
  const c4 = Math.sqrt(2 / (n - 1)) * Math.exp(logGamma(n / 2) - logGamma((n - 1) / 2));
  const spread = 3 * Math.sqrt(1 - c4 * c4);
  const made: ChartConstants = {
    n,
    d2,
    d3,
    c4,
    A: 3 / Math.sqrt(n),
    A2: 3 / (d2 * Math.sqrt(n)),
    A3: 3 / (c4 * Math.sqrt(n)),
    B3: Math.max(0, 1 - spread / c4),
    B4: 1 + spread / c4,
    B5: Math.max(0, c4 - spread),
    B6: c4 + spread,
    D1: Math.max(0, d2 - 3 * d3),
    D2: d2 + 3 * d3,
    D3: Math.max(0, 1 - (3 * d3) / d2),
    D4: 1 + (3 * d3) / d2,
    E2: 3 / d2,
    E3: 3 / c4,
  };
  known.set(n, made);
  return made;
}

/** Median of |x1 - x2| of two independent standard normal values: sqrt(2) times the normal quartile. */
export const MEDIAN_MOVING_RANGE_PER_SIGMA = 0.9538725524089396;
