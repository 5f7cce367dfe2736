import { atLeast, atMost } from "@/lib/nearly";
import type { ParameterKind, PlausibleBounds, ReadingValue } from "../model";

/** The values that a reading leaves possible. An open end is not itself possible. */
export interface PossibleValues {
  readonly from: number;
  readonly fromOpen: boolean;
  readonly to: number;
  readonly toOpen: boolean;
}

export interface PossibleContext {
  readonly kind: ParameterKind;
  readonly plausible: PlausibleBounds;
  readonly mayBeNegative: boolean;
  /** Detection limit of the method, canonical unit, when it is known; ND then means below it. */
  readonly detectionLimit?: number | null;
}

/** The plausible range with its open sides closed: nothing below 0 unless the parameter may be negative. */
export function plausibleRange(
  context: Pick<PossibleContext, "plausible" | "mayBeNegative">,
): PossibleValues {
  const { low, high } = context.plausible;
  const from = low ?? (context.mayBeNegative ? Number.NEGATIVE_INFINITY : 0);
  return { from, fromOpen: false, to: high ?? Number.POSITIVE_INFINITY, toOpen: false };
}

/**
 * Which values does a reading leave possible, before plausibility?
 * plain v: only v · "<x": everything below x · ">x": everything above x · ND: below the method's detection limit, or
 * anything when that is unknown · ">" without a number (too many to count): anything. Counts are whole: "<1" is 0.
 * Null when a plain reading has no number. Throws RangeError for a number that is not finite.
 */
export function statedValues(reading: ReadingValue, context: PossibleContext): PossibleValues | null {
  const { value, qualifier } = reading;
  if (value !== null && !Number.isFinite(value)) throw new RangeError("A reading must be a finite number.");
  const whole = context.kind === "count";
  const below = qualifier === "ND" ? (context.detectionLimit ?? null) : qualifier === "<" ? value : null;
  const all = {
    from: Number.NEGATIVE_INFINITY,
    fromOpen: false,
    to: Number.POSITIVE_INFINITY,
    toOpen: false,
  };
  if (qualifier === "")
    return value === null ? null : { from: value, fromOpen: false, to: value, toOpen: false };
  if (qualifier === ">") {
    if (value === null) return all;
    return whole ? { ...all, from: Math.floor(value) + 1 } : { ...all, from: value, fromOpen: true };
  }
  if (below === null) return all;
  return whole ? { ...all, to: Math.ceil(below) - 1 } : { ...all, to: below, toOpen: true };
}

/** The part of some values inside a range, or on which side of it they all lie. */
export function clip(values: PossibleValues, range: PossibleValues): PossibleValues | "below" | "above" {
  const below = values.toOpen ? atMost(values.to, range.from) : !atLeast(values.to, range.from);
  if (below) return "below";
  const above = values.fromOpen ? atLeast(values.from, range.to) : !atMost(values.from, range.to);
  if (above) return "above";
  const fromInside = values.from >= range.from;
  const toInside = values.to <= range.to;
  return {
    from: fromInside ? values.from : range.from,
    fromOpen: fromInside ? values.fromOpen : range.fromOpen,
    to: toInside ? values.to : range.to,
    toOpen: toInside ? values.toOpen : range.toOpen,
  };
}

/** Are all values, none, or only some of them below an inclusive lower limit? */
export function shareBelow(values: PossibleValues, limit: number): "all" | "none" | "some" {
  const all = values.toOpen ? atMost(values.to, limit) : !atLeast(values.to, limit);
  if (all) return "all";
  return atLeast(values.from, limit) ? "none" : "some";
}

/** Are all values, none, or only some of them above an inclusive upper limit? */
export function shareAbove(values: PossibleValues, limit: number): "all" | "none" | "some" {
  const all = values.fromOpen ? atLeast(values.from, limit) : !atMost(values.from, limit);
  if (all) return "all";
  return atMost(values.to, limit) ? "none" : "some";
}
