import { mean, standardDeviation } from "./moments";
import { median, medianOfSorted } from "./quantiles";
import { requirePositive, requireValues, sortedCopy, type Values } from "./values";

/** Turns a median absolute deviation into a standard deviation for normal data: 1 / Phi^-1(0.75). */
export const MAD_TO_SIGMA = 1.482602218505602;

/**
 * The median absolute deviation from the median, not scaled. For an estimate of sigma multiply by `MAD_TO_SIGMA`
 * (ISO 13528 prints 1.483).
 * @example medianAbsoluteDeviation([1, 2, 3, 4, 100]) // => 1
 */
export function medianAbsoluteDeviation(values: Values): number {
  const n = requireValues(values, 1);
  const middle = median(values);
  const deviations = new Float64Array(n);
  for (let i = 0; i < n; i++) deviations[i] = Math.abs(values[i]! - middle);
  return medianOfSorted(deviations.sort());
}

/** When algorithm A stops: at a relative change below a number, or "third-figure" as ISO 13528 describes it. */
export type AlgorithmAStop = "third-figure" | { readonly relativeChange: number };

/** What algorithm A found; `stop` names the rule by which it stopped, for the result depends on it. */
export interface AlgorithmAResult {
  readonly mean: number;
  readonly sd: number;
  readonly iterations: number;
  readonly stop: string;
  /** Mean and standard deviation at the start and after each iteration. */
  readonly trace: readonly { readonly mean: number; readonly sd: number }[];
}

/** Factors of ISO 13528 and ISO 5725-5: winsorising width, MAD factor, correction of the winsorised deviation. */
const ALGORITHM_A = { width: 1.5, madFactor: 1.483, sdFactor: 1.134, mostIterations: 10_000 } as const;

function thirdFigureKept(before: number, after: number): boolean {
  return Number(before.toPrecision(3)) === Number(after.toPrecision(3));
}

/** One round: pull every value inside mean +- 1.5 sd and take mean and 1.134 times the deviation. */
function winsorise(values: Values, centre: number, sd: number): { mean: number; sd: number } {
  const delta = ALGORITHM_A.width * sd;
  const pulled = Float64Array.from(values, (value) =>
    Math.min(Math.max(value, centre - delta), centre + delta),
  );
  return { mean: mean(pulled), sd: ALGORITHM_A.sdFactor * standardDeviation(pulled) };
}

/**
 * Robust mean and standard deviation by algorithm A: what would they be without the pull of a few extreme values?
 *
 * Start: median and 1.483 MAD. Each round pulls values to mean +- 1.5 sd. The sd converges slowly, so the stop rule
 * matters in its second digit: by default the relative change of both is below 1e-9; "third-figure" stops when
 * neither changes in its third significant figure. Throws RangeError below two values; when more than half the
 * values are equal the MAD is 0 and the result is the median with sd 0.
 * Units: those of the values. Source: ISO 13528:2015 annex C, ISO 5725-5:1998.
 * Checked: creosote data of ISO 5725-5, mean 20.412; converged sd 1.0698.
 * @example algorithmA({ values: [1, 2, 3] }).mean // => 2
 */
export function algorithmA(input: {
  readonly values: Values;
  readonly stop?: AlgorithmAStop;
}): AlgorithmAResult {
  const { values, stop = { relativeChange: 1e-9 } } = input;
  requireValues(values, 2);
  const least = stop === "third-figure" ? 0 : requirePositive(stop.relativeChange, "relativeChange");
  const sorted = sortedCopy(values);
  let now = { mean: medianOfSorted(sorted), sd: ALGORITHM_A.madFactor * medianAbsoluteDeviation(values) };
  const trace = [now];
  while (now.sd > 0 && trace.length <= ALGORITHM_A.mostIterations) {
    const next = winsorise(values, now.mean, now.sd);
    const still =
      stop === "third-figure"
        ? thirdFigureKept(now.mean, next.mean) && thirdFigureKept(now.sd, next.sd)
        : Math.abs(next.sd - now.sd) <= least * next.sd &&
          Math.abs(next.mean - now.mean) <= least * Math.max(Math.abs(next.mean), next.sd);
    trace.push(next);
    now = next;
    if (still) break;
  }
  return {
    mean: now.mean,
    sd: now.sd,
    iterations: trace.length - 1,
    stop: stop === "third-figure" ? "no change in the third significant figure" : `relative change ${least}`,
    trace,
  };
}
