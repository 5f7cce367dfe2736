import { requireFinite, requirePositive, type Values } from "./values";

/**
 * A point within this many sigma of a line counts as on it, so that a converted value such as 64.4 degF = 18 degC does
 * not fall off its line by the last digit of a double.
 */
export const ON_THE_LINE = 1e-9;

/** A missing value either ends every run ("break") or is left out as if it had never been due ("skip"). */
export type MissingConvention = "break" | "skip";

/** Series in sigma units without or with gaps (NaN), and where each entry stands in the given series. */
export interface Standardised {
  readonly z: Float64Array;
  /** Index in the given series of each entry, or null when nothing was left out. */
  readonly index: Uint32Array | null;
}

/**
 * Turns readings into distances from the centre in sigma. Null, undefined and NaN are missing values.
 * Throws RangeError for sigma of zero or less and for an infinite reading.
 */
export function standardise(input: {
  readonly values: ArrayLike<number | null>;
  readonly centre: number;
  readonly sigma: number;
  readonly missing: MissingConvention;
}): Standardised {
  const { values, centre, sigma, missing } = input;
  requireFinite(centre, "centre");
  requirePositive(sigma, "sigma");
  const n = values.length;
  const z = new Float64Array(n);
  let gaps = 0;
  for (let i = 0; i < n; i++) {
    const value = values[i]!;
    if (value == null || Number.isNaN(value)) {
      z[i] = Number.NaN;
      gaps++;
    } else if (Number.isFinite(value)) z[i] = (value - centre) / sigma;
    else throw new RangeError(`values: entry ${i} is infinite.`);
  }
  if (gaps === 0 || missing === "break") return { z, index: null };
  const index = new Uint32Array(n - gaps);
  const kept = new Float64Array(n - gaps);
  let next = 0;
  for (let i = 0; i < n; i++) {
    if (Number.isNaN(z[i]!)) continue;
    index[next] = i;
    kept[next++] = z[i]!;
  }
  return { z: kept, index };
}

/**
 * All bits set when the condition holds and none otherwise: `(count + 1) & when(holds)` counts a run without a jump,
 * which on noise is about four times as fast as asking.
 */
function when(holds: boolean): number {
  return -holds;
}

/** Which points lie strictly beyond `limit` sigma on either side. */
export function oneBeyond(z: Values, limit: number): number[] {
  const hits: number[] = [];
  const edge = limit + ON_THE_LINE;
  for (let i = 0; i < z.length; i++) if (Math.abs(z[i]!) > edge) hits.push(i);
  return hits;
}

/** At which points are `length` in a row on one side of the centre line? On the line is neither side. */
export function runOnOneSide(z: Values, length: number): number[] {
  const hits: number[] = [];
  let above = 0;
  let below = 0;
  for (let i = 0; i < z.length; i++) {
    const value = z[i]!;
    above = (above + 1) & when(value > ON_THE_LINE);
    below = (below + 1) & when(value < -ON_THE_LINE);
    if (above >= length || below >= length) hits.push(i);
  }
  return hits;
}

/** At which points have `length` points (length - 1 steps) risen steadily or fallen steadily? A tie breaks it. */
export function steadyTrend(z: Values, length: number): number[] {
  const hits: number[] = [];
  const steps = length - 1;
  let rising = 0;
  let falling = 0;
  for (let i = 1; i < z.length; i++) {
    const step = z[i]! - z[i - 1]!;
    rising = (rising + 1) & when(step > ON_THE_LINE);
    falling = (falling + 1) & when(step < -ON_THE_LINE);
    if (rising >= steps || falling >= steps) hits.push(i);
  }
  return hits;
}

/** At which points have `length` points gone up and down in turn? Where they lie is irrelevant; a tie breaks it. */
export function alternation(z: Values, length: number): number[] {
  const hits: number[] = [];
  const steps = length - 1;
  let turns = 0;
  let before = 0;
  for (let i = 1; i < z.length; i++) {
    const step = z[i]! - z[i - 1]!;
    const direction = Number(step > ON_THE_LINE) - Number(step < -ON_THE_LINE);
    turns = ((turns & when(direction === -before)) + 1) & when(direction !== 0);
    before = direction;
    if (turns >= steps) hits.push(i);
  }
  return hits;
}

const BITS = Uint8Array.from({ length: 64 }, (_, mask) => mask.toString(2).replaceAll("0", "").length);

/**
 * At which points are k of the last m points strictly beyond `limit` sigma on the same side? Only a point that is
 * itself beyond completes the rule, and the window need not be full.
 */
export function someOfLast(z: Values, k: number, m: number, limit: number): number[] {
  const hits: number[] = [];
  const edge = limit + ON_THE_LINE;
  const window = (1 << m) - 1;
  let above = 0;
  let below = 0;
  for (let i = 0; i < z.length; i++) {
    const value = z[i]!;
    const known = window & when(value === value);
    above = ((above << 1) | Number(value > edge)) & known;
    below = ((below << 1) | Number(value < -edge)) & known;
    if ((above & 1 & when(BITS[above]! >= k)) | (below & 1 & when(BITS[below]! >= k))) hits.push(i);
  }
  return hits;
}

/** At which points have `length` in a row hugged the centre line within one sigma, on either side? */
export function runInsideZoneC(z: Values, length: number, atOneSigma: "outside" | "inside"): number[] {
  const hits: number[] = [];
  const edge = atOneSigma === "inside" ? 1 + ON_THE_LINE : 1 - ON_THE_LINE;
  let points = 0;
  for (let i = 0; i < z.length; i++) {
    points = (points + 1) & when(Math.abs(z[i]!) < edge);
    if (points >= length) hits.push(i);
  }
  return hits;
}

/** Whether a stretch has points above and points below the centre line. */
function bothSides(z: Values, from: number, to: number): boolean {
  let above = false;
  let below = false;
  for (let i = from; i <= to; i++) {
    above ||= z[i]! > 0;
    below ||= z[i]! < 0;
  }
  return above && below;
}

/** At which points have `length` in a row avoided the zone within one sigma, on both sides or on any? */
export function runOutsideZoneC(z: Values, length: number, sides: "both" | "any"): number[] {
  const hits: number[] = [];
  const edge = 1 + ON_THE_LINE;
  let points = 0;
  for (let i = 0; i < z.length; i++) {
    const value = z[i]!;
    points = (points + 1) & when(Math.abs(value) > edge);
    if (points < length) continue;
    if (sides === "any" || bothSides(z, i - length + 1, i)) hits.push(i);
  }
  return hits;
}

/** Puts hits found in a series without its gaps back to where they stand in the given series. */
export function placedHits(hits: number[], index: Uint32Array | null): number[] {
  return index === null ? hits : hits.map((hit) => index[hit]!);
}
