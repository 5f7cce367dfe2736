import { requireFinite, requirePositive, requireValues, type Values } from "./values";

/** What a tabular CUSUM is made from, all in the unit of the values. */
export interface CusumInput {
  readonly values: Values;
  readonly target: number;
  /** Allowance K, usually half the shift to be found. */
  readonly slack: number;
  /** Decision limit H; a sum strictly above it signals. */
  readonly decision: number;
  /** Fast initial response: where both sums start, 0 unless told; H/2 is usual (Lucas and Crosier 1982). */
  readonly headStart?: number;
  /** "continue" (as NIST prints it): the sums run on. "restart": both begin again at the head start. */
  readonly afterSignal?: "continue" | "restart";
}

/** The two sums, the plain cumulative deviation and the 0-based indexes at which each sum is above H. */
export interface CusumChart {
  readonly high: Float64Array;
  readonly low: Float64Array;
  readonly cumulativeDeviation: Float64Array;
  readonly signalsHigh: readonly number[];
  readonly signalsLow: readonly number[];
}

/**
 * Has the level moved from its target by about twice the slack? The tabular CUSUM:
 * high = max(0, high' + x - target - K), low = max(0, low' + target - K - x), signal when a sum exceeds H.
 *
 * Throws RangeError for a negative slack, H of zero or less, a head start outside 0 to H.
 * Source: NIST/SEMATECH e-Handbook 6.3.2.3; Lucas and Crosier 1982, Technometrics 24, 199-205.
 * Checked: NIST example, target 325, K 0.3175, H 4.1959: first signal at group 14.
 * @example cusumChart({ values: [1, 3], target: 0, slack: 1, decision: 1 }).signalsHigh // => [1]
 */
export function cusumChart(input: CusumInput): CusumChart {
  const { values, target, slack, decision, headStart = 0, afterSignal = "continue" } = input;
  const n = requireValues(values, 1);
  requireFinite(target, "target");
  requirePositive(decision, "decision");
  if (!(Number.isFinite(slack) && slack >= 0)) throw new RangeError("slack must be zero or more.");
  if (!(headStart >= 0 && headStart <= decision)) throw new RangeError("headStart must lie between 0 and H.");
  const high = new Float64Array(n);
  const low = new Float64Array(n);
  const cumulativeDeviation = new Float64Array(n);
  const signalsHigh: number[] = [];
  const signalsLow: number[] = [];
  let up = headStart;
  let down = headStart;
  let total = 0;
  for (let i = 0; i < n; i++) {
    const deviation = values[i]! - target;
    total += deviation;
    up = Math.max(0, up + deviation - slack);
    down = Math.max(0, down - deviation - slack);
    high[i] = up;
    low[i] = down;
    cumulativeDeviation[i] = total;
    if (up > decision) signalsHigh.push(i);
    if (down > decision) signalsLow.push(i);
    if (afterSignal === "restart" && (up > decision || down > decision)) {
      up = headStart;
      down = headStart;
    }
  }
  return { high, low, cumulativeDeviation, signalsHigh, signalsLow };
}
