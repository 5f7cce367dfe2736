import { gaussLegendre } from "./gauss-legendre";
import { solveLinearSystem } from "./linear-system";
import { normalCdf, normalDensity } from "./normal";
import { requireFinite, requirePositive } from "./values";

/**
 * How many points does a chart with limits at +-width sigma need on average until one lies beyond, when the mean is
 * off by `shift` sigma?
 *
 * Formula: 1 / (Phi(-width + shift) + Phi(-width - shift)). Independent normal values.
 * Throws RangeError for a width of zero or less. Checked: 370.398 at 3 sigma; NIST/SEMATECH e-Handbook 6.3.2.3.1.
 * @example shewhartRunLength({ width: 3, shift: 0 }).toFixed(3) // => "370.398"
 */
export function shewhartRunLength(input: { readonly width: number; readonly shift: number }): number {
  const width = requirePositive(input.width, "width");
  const shift = requireFinite(input.shift, "shift");
  return 1 / (normalCdf(shift - width) + normalCdf(-shift - width));
}

/** A CUSUM in sigma units. */
export interface CusumRunLengthInput {
  readonly slack: number;
  readonly decision: number;
  readonly shift: number;
  /** Head start of both sums in sigma, 0 unless told. */
  readonly headStart?: number;
}

const CUSUM_NODES = 80;

/**
 * The average run length of a CUSUM that watches one side only, by Page's integral equation on a Gauss-Legendre rule.
 *
 * Source: Page 1954; Brook and Evans 1972. Checked: k 0.5, h 4: 335.367577627242; h 5: 930.887012064239 (R spc).
 * Beware: these one-sided figures are twice the two-sided ones in control; some tables mix the two.
 */
export function oneSidedCusumRunLength(input: CusumRunLengthInput): number {
  const { shift, headStart = 0 } = input;
  const decision = requirePositive(input.decision, "decision");
  const slack = requireFinite(input.slack, "slack");
  requireFinite(shift, "shift");
  if (!(headStart >= 0 && headStart <= decision)) throw new RangeError("headStart must lie between 0 and H.");
  const { nodes, weights } = gaussLegendre(CUSUM_NODES, 0, decision);
  const drift = slack - shift;
  const matrix: Float64Array[] = [];
  for (let i = 0; i <= CUSUM_NODES; i++) {
    const from = i === 0 ? 0 : nodes[i - 1]!;
    const row = new Float64Array(CUSUM_NODES + 1);
    row[0] = -normalCdf(drift - from);
    for (let j = 0; j < CUSUM_NODES; j++) row[j + 1] = -weights[j]! * normalDensity(nodes[j]! - from + drift);
    row[i]! += 1;
    matrix.push(row);
  }
  const lengths = solveLinearSystem(matrix, new Float64Array(CUSUM_NODES + 1).fill(1));
  let length = 1 + normalCdf(drift - headStart) * lengths[0]!;
  for (let j = 0; j < CUSUM_NODES; j++) {
    length += weights[j]! * normalDensity(nodes[j]! - headStart + drift) * lengths[j + 1]!;
  }
  return length;
}

/**
 * The average run length of a two-sided tabular CUSUM, with a head start when given.
 *
 * Formula: (L+(u) L-(0) + L+(0) L-(u) - L+(0) L-(0)) / (L+(0) + L-(0)); without head start 1/L = 1/L+ + 1/L-.
 * Source: Kemp 1961; Lucas and Crosier 1982. Checked: k 0.5, h 4: 168, 74.2, 26.6, 13.3, 8.38; with head start 149, 62.7.
 * @example cusumRunLength({ slack: 0.5, decision: 4, shift: 0 }).toFixed(1) // => "167.7"
 */
export function cusumRunLength(input: CusumRunLengthInput): number {
  const { shift, headStart = 0 } = input;
  const side = (sign: number, start: number) =>
    oneSidedCusumRunLength({ ...input, shift: sign * shift, headStart: start });
  const up = side(1, 0);
  const down = side(-1, 0);
  if (headStart === 0) return (up * down) / (up + down);
  return (side(1, headStart) * down + up * side(-1, headStart) - up * down) / (up + down);
}

/** Solves L(x) = 1 + integral of L(y) kernel(y, x) over +-edge; returns the nodes, weights and L at the nodes. */
function solveRunLengths(edge: number, points: number, kernel: (to: number, from: number) => number) {
  const { nodes, weights } = gaussLegendre(points, -edge, edge);
  const matrix: Float64Array[] = [];
  for (let i = 0; i < points; i++) {
    const row = new Float64Array(points);
    for (let j = 0; j < points; j++) row[j] = -weights[j]! * kernel(nodes[j]!, nodes[i]!);
    row[i]! += 1;
    matrix.push(row);
  }
  return { nodes, weights, lengths: solveLinearSystem(matrix, new Float64Array(points).fill(1)) };
}

/**
 * The average run length of a two-sided EWMA chart with asymptotic limits at +-width sigma of the statistic, started
 * at the centre, when the mean is off by `shift` sigma: Crowder's integral equation on a Gauss-Legendre rule.
 *
 * Domain: lambda 0.01 to 1. Throws RangeError outside. Source: Crowder 1987; Lucas and Saccucci 1990, table 3.
 * Checked: (0.5, 3.071) and (0.03, 2.437) give 500 in control.
 * @example ewmaRunLength({ lambda: 0.5, width: 2, shift: 0 }).toFixed(2) // => "26.45"
 */
export function ewmaRunLength(input: {
  readonly lambda: number;
  readonly width: number;
  readonly shift: number;
}): number {
  const { lambda, shift } = input;
  if (!(lambda >= 0.01 && lambda <= 1)) throw new RangeError("lambda must lie between 0.01 and 1.");
  const edge = requirePositive(input.width, "width") * Math.sqrt(lambda / (2 - lambda));
  requireFinite(shift, "shift");
  const kernel = (to: number, from: number) =>
    normalDensity((to - (1 - lambda) * from) / lambda - shift) / lambda;
  const { nodes, weights, lengths } = solveRunLengths(edge, 120, kernel);
  let length = 1;
  for (let j = 0; j < nodes.length; j++) length += weights[j]! * kernel(nodes[j]!, 0) * lengths[j]!;
  return length;
}

/**
 * What does autocorrelation do to the limits? The average run length in control of a chart of single values that
 * follow a stationary AR(1) process with coefficient phi, with limits at +-width standard deviations of the values.
 *
 * Domain: -0.95 <= phi <= 0.95; throws RangeError outside. For limits made from moving ranges the width is
 * 3 sqrt(1 - phi). Source: Kramer and Schmid 2000. Checked: phi 0.5 gives 396.28 with the true sigma (R spc).
 * @example autocorrelatedRunLength({ phi: 0.5, width: 3 }).toFixed(2) // => "396.28"
 */
export function autocorrelatedRunLength(input: { readonly phi: number; readonly width: number }): number {
  const { phi } = input;
  if (!(phi >= -0.95 && phi <= 0.95)) throw new RangeError("phi must lie between -0.95 and 0.95.");
  const edge = requirePositive(input.width, "width");
  const noise = Math.sqrt(1 - phi * phi);
  const kernel = (to: number, from: number) => normalDensity((to - phi * from) / noise) / noise;
  const { nodes, weights, lengths } = solveRunLengths(edge, 120, kernel);
  let length = 1;
  for (let j = 0; j < nodes.length; j++) length += weights[j]! * normalDensity(nodes[j]!) * lengths[j]!;
  return length;
}
