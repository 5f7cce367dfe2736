import type { Qualifier } from "../model";

/** The window in elapsed time, whatever the clocks on the wall do. */
export const CHANGE_WINDOW_MS = 24 * 3_600_000;

/** A reading of the same point and parameter, canonical unit. */
export interface TimedValue {
  readonly id: string | number;
  readonly takenAt: number;
  readonly value: number | null;
  readonly qualifier: Qualifier;
}

/** The greatest change found, and the reading against which it was found. */
export interface Change24h {
  /** |difference|, never negative. */
  readonly change: number;
  /** value − value of the other reading. */
  readonly difference: number;
  readonly againstId: string | number;
  readonly againstValue: number;
  readonly againstAt: number;
}

/**
 * What is the greatest absolute difference between a reading and any other of the same point in the preceding 24.0
 * elapsed hours? Inclusive at exactly 24.0 h and at the same moment. Not the change from the last one: 24.0 → 24.6 → 25.2
 * is a change of 1.2. Readings with a qualifier, and those without a number, count on neither side.
 * Null when there is nothing to compare. `others` may be in any order and hold readings outside the window.
 */
export function greatestChange24h(reading: TimedValue, others: readonly TimedValue[]): Change24h | null {
  if (reading.value === null || reading.qualifier !== "") return null;
  let greatest: Change24h | null = null;
  for (const other of others) {
    if (other.id === reading.id || other.value === null || other.qualifier !== "") continue;
    const elapsed = reading.takenAt - other.takenAt;
    if (elapsed < 0 || elapsed > CHANGE_WINDOW_MS) continue;
    const difference = reading.value - other.value;
    const change = Math.abs(difference);
    if (
      greatest === null ||
      change > greatest.change ||
      (change === greatest.change && other.takenAt > greatest.againstAt)
    ) {
      greatest = {
        change,
        difference,
        againstId: other.id,
        againstValue: other.value,
        againstAt: other.takenAt,
      };
    }
  }
  return greatest;
}

/**
 * Which readings of the same point depend on one taken at this moment? Those taken from it to 24.0 h later, inclusive:
 * they are judged again when it arrives late, is corrected or withdrawn.
 */
export function dependentWindow(takenAt: number): { readonly fromAt: number; readonly toAt: number } {
  return { fromAt: takenAt, toAt: takenAt + CHANGE_WINDOW_MS };
}
