import { convertByFactor, findUnit, UnitError, unitLabel } from "@/lib/units/factors";
import type { Bounds, PlausibleBounds } from "../model";
import { formatNumber } from "./format-value";

/** What is needed to see a likely slip. Canonical unit unless said otherwise. */
export interface SlipInput {
  /** The plain number as typed, in `typedUnit`. */
  readonly typed: number;
  readonly typedUnit: string | null;
  readonly canonicalUnit: string | null;
  /** Units in which this parameter may be typed. */
  readonly acceptedUnits: readonly string[];
  readonly decimals: number;
  /** Recent plain values of the same point and parameter, without the one being typed. */
  readonly recent: readonly number[];
  readonly bounds: Bounds | null;
  readonly plausible: PlausibleBounds;
  /** Conversion that also knows units without a factor (specific gravity); null where it cannot. */
  readonly toCanonical?: (value: number, unit: string) => number | null;
}

/** A suggestion; it is shown and never applied by itself. */
export type Slip =
  | {
      readonly kind: "decimal-point";
      /** What may have been meant, in the unit typed. */
      readonly value: number;
      readonly canonical: number;
      readonly sentence: string;
    }
  | {
      readonly kind: "unit";
      /** The unit in which the number may have been meant. */
      readonly unit: string;
      readonly canonical: number;
      readonly sentence: string;
    };

/** The band of usual values. Common practice, no source: five robust standard deviations (1.4826 MAD) around the median. */
const BAND_WIDTH = 5 * 1.4826;
const FEWEST_RECENT = 5;
/** A band is at least this share of its centre and this many shown steps wide on each side. */
const LEAST_SHARE = 0.02;
const LEAST_STEPS = 2;
const DECIMAL_SHIFTS = [-1, 1, -2, 2] as const;
const MOST_SUGGESTIONS = 3;

interface Band {
  readonly low: number;
  readonly high: number;
}

/**
 * Was something else meant? Looks at a number outside the usual band of its point: a shifted decimal point
 * (÷10, ×10, ÷100, ×100), or another accepted unit, that would land inside the band. The nearest to the middle of the
 * band comes first. The band is the median ± five robust deviations of at least five recent values, else the limits
 * where both sides are given; without either nothing is suggested. A value inside the band is never doubted.
 * @example suggestSlips({ typed: 81.2, typedUnit: null, canonicalUnit: null, acceptedUnits: [], decimals: 2, recent: [8.1, 8.12, 8.09, 8.11, 8.1], bounds: null, plausible: { low: 4, high: 11 } })[0].value // => 8.12
 */
export function suggestSlips(input: SlipInput): Slip[] {
  const band = usualBand(input);
  const toCanonical = (value: number, unit: string | null) => canonicalOf(input, value, unit);
  const asTyped = toCanonical(input.typed, input.typedUnit);
  if (!band || asTyped === null || input.typed === 0 || inside(asTyped, band)) return [];

  const found: Slip[] = [];
  for (const shift of DECIMAL_SHIFTS) {
    const value = Number(`${input.typed}e${shift}`);
    const shifted = Number.isNaN(value) ? input.typed * 10 ** shift : value;
    const canonical = toCanonical(shifted, input.typedUnit);
    if (canonical === null || !fits(canonical, band, input.plausible)) continue;
    found.push({
      kind: "decimal-point",
      value: shifted,
      canonical,
      sentence: decimalSentence(input, shifted, band),
    });
  }
  for (const unit of input.acceptedUnits) {
    if (unit === (input.typedUnit ?? input.canonicalUnit)) continue;
    const canonical = toCanonical(input.typed, unit);
    if (canonical === null || !fits(canonical, band, input.plausible)) continue;
    found.push({ kind: "unit", unit, canonical, sentence: unitSentence(input, unit, canonical, band) });
  }
  const middle = (band.low + band.high) / 2;
  return found
    .sort((a, b) => Math.abs(a.canonical - middle) - Math.abs(b.canonical - middle))
    .slice(0, MOST_SUGGESTIONS);
}

/** The band of usual values, or null when too little is known. */
export function usualBand(input: Pick<SlipInput, "recent" | "bounds" | "decimals">): Band | null {
  if (input.recent.length >= FEWEST_RECENT) {
    const middle = median(input.recent);
    const deviation = median(input.recent.map((value) => Math.abs(value - middle)));
    const least = Math.max(LEAST_SHARE * Math.abs(middle), LEAST_STEPS * 10 ** -input.decimals);
    const half = Math.max(BAND_WIDTH * deviation, least);
    return { low: middle - half, high: middle + half };
  }
  const low = input.bounds?.toleranceLow ?? input.bounds?.watchLow;
  const high = input.bounds?.toleranceHigh ?? input.bounds?.watchHigh;
  return low === undefined || high === undefined ? null : { low, high };
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const half = sorted.length >> 1;
  const upper = sorted[half] ?? Number.NaN;
  return sorted.length % 2 === 1 ? upper : (upper + (sorted[half - 1] ?? Number.NaN)) / 2;
}

function canonicalOf(input: SlipInput, value: number, unit: string | null): number | null {
  if (unit === null || input.canonicalUnit === null || unit === input.canonicalUnit) return value;
  if (input.toCanonical) return input.toCanonical(value, unit);
  if (findUnit(unit) === null) return null;
  try {
    return convertByFactor(value, unit, input.canonicalUnit);
  } catch (error) {
    if (error instanceof UnitError) return null;
    throw error;
  }
}

const inside = (value: number, band: Band) => value >= band.low && value <= band.high;

function fits(value: number, band: Band, plausible: PlausibleBounds): boolean {
  const possible =
    (plausible.low === null || value >= plausible.low) &&
    (plausible.high === null || value <= plausible.high);
  return possible && inside(value, band);
}

function withUnit(text: string, unit: string | null): string {
  const label = unitLabel(unit);
  return label === "" ? text : `${text}\u00a0${label}`;
}

function usual(input: SlipInput, band: Band): string {
  const low = formatNumber(band.low, input.decimals);
  const high = formatNumber(band.high, input.decimals);
  return `usual here: ${low} to ${withUnit(high, input.canonicalUnit)}`;
}

function decimalSentence(input: SlipInput, meant: number, band: Band): string {
  const unit = input.typedUnit ?? input.canonicalUnit;
  const typed = withUnit(formatNumber(input.typed, null), unit);
  return `Was ${withUnit(formatNumber(meant, null), unit)} meant instead of ${typed} (${usual(input, band)})?`;
}

function unitSentence(input: SlipInput, unit: string, canonical: number, band: Band): string {
  const typed = formatNumber(input.typed, null);
  const inTyped = withUnit(typed, input.typedUnit ?? input.canonicalUnit);
  const shown = withUnit(formatNumber(canonical, input.decimals), input.canonicalUnit);
  const same = unit === input.canonicalUnit ? "" : `, which is ${shown}`;
  return `Was ${withUnit(typed, unit)} meant instead of ${inTyped}${same} (${usual(input, band)})?`;
}
