import {
  controlRuleHits,
  type IndividualsLimits,
  individualsLimits,
  lagOneAutocorrelation,
} from "@/modules/statistics";
import type { Qualifier, Status } from "../model";

/** A reading as far as a control chart needs it. */
export interface ChartedReading {
  readonly at: number;
  readonly value: number | null;
  readonly qualifier: Qualifier;
  readonly status: Status;
}

/** Fewer points than this say too little about the spread. */
export const LEAST_BASELINE = 20;

/** The control limits of a baseline, or a sentence that says why there are none. */
export type Baseline =
  | {
      readonly ok: true;
      readonly limits: IndividualsLimits;
      /** Lag-1 autocorrelation of the baseline; null where it cannot be told. */
      readonly r1: number | null;
      readonly warning: string | null;
    }
  | { readonly ok: false; readonly sentence: string };

/** Is it a figure that a control chart may use? Not what is only known as less or more than, nor what cannot be true. */
export function isChartable<R extends ChartedReading>(reading: R): reading is R & { readonly value: number } {
  return reading.value !== null && reading.qualifier === "" && reading.status !== "implausible";
}

/**
 * The centre and control limits of an individuals chart from the readings of a baseline, both ends inclusive. At least
 * 20 readings that differ. Warns where neighbours resemble each other by more than chance (|r1| above 1.96 / √n).
 * Source: ISO 7870-2 (individuals and moving range); the least number of 20: common practice.
 * Checked: `individualsLimits` and `lagOneAutocorrelation` against NIST data sets (tests/published).
 */
export function controlBaseline(readings: readonly ChartedReading[], fromAt: number, toAt: number): Baseline {
  const values = readings
    .filter((each) => each.at >= fromAt && each.at <= toAt)
    .filter(isChartable)
    .map((each) => each.value);
  if (values.length < LEAST_BASELINE) {
    const found = values.length === 1 ? "1 reading" : `${values.length} readings`;
    return {
      ok: false,
      sentence: `The baseline holds ${found} with a plain number; control limits need at least ${LEAST_BASELINE}. Choose a longer baseline.`,
    };
  }
  const limits = individualsLimits({ values });
  if (limits.sigma === 0) {
    return {
      ok: false,
      sentence:
        "All readings of the baseline are the same, so it says nothing about their spread. Choose another baseline.",
    };
  }
  const r1 = lagOneAutocorrelation(values);
  return { ok: true, limits, r1, warning: warningOf(r1, values.length) };
}

/**
 * Says by how much dependence moves the lines: the mean moving range of an AR(1) process is (2 / √π) σ √(1 − r1).
 */
function warningOf(r1: number, n: number): string | null {
  if (Math.abs(r1) <= 1.96 / Math.sqrt(n)) return null;
  const figure = r1.toFixed(2).replace("-", "−");
  const ratio = Math.sqrt(1 - r1);
  return r1 > 0
    ? `Neighbouring readings of the baseline resemble each other (lag-1 autocorrelation ${figure}), so moving ranges understate the spread: these lines lie about ${percent(1 - ratio)} % too close to the centre, and points beyond them may mean nothing.`
    : `Neighbouring readings of the baseline swing against each other (lag-1 autocorrelation ${figure}), so moving ranges overstate the spread: these lines lie about ${percent(ratio - 1)} % too far from the centre.`;
}

const percent = (share: number): number => Math.round(100 * share);

/** A reading beyond a control limit: its index in the series and which limit. */
export interface BeyondControl {
  readonly index: number;
  readonly side: "upper" | "lower";
}

/**
 * Which readings lie strictly beyond the control limits? One point beyond three sigma, the first test of every set of
 * rules (Western Electric 1956; Nelson 1984; ISO 7870-2). A point on the line is not beyond it.
 */
export function beyondControl(
  readings: readonly ChartedReading[],
  { centre, sigma }: IndividualsLimits,
): BeyondControl[] {
  const values = readings.map((each) => (isChartable(each) ? each.value : null));
  const hits = controlRuleHits({ values, centre, sigma, rules: ["N1"] }).N1;
  return hits.map((index) => ({ index, side: (values[index] ?? centre) > centre ? "upper" : "lower" }));
}
