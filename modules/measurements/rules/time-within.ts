import type { Status } from "../model";

/** A reading as far as its time and status. */
export interface TimedStatus {
  readonly takenAt: number;
  readonly status: Status;
}

/** For how much of a stretch of time it is known how things stood, and for how much of that they were within tolerance. */
export interface TimeWithin {
  /** 0 to 1 of the known time; null where nothing is known. */
  readonly share: number | null;
  /** Known time, milliseconds. */
  readonly knownMs: number;
}

const IS_WITHIN: Readonly<Record<Status, boolean | null>> = {
  within: true,
  watch: true,
  out: false,
  implausible: null,
  unjudged: null,
  none: null,
};

/**
 * Which share of the time lay within tolerance? A status holds from its reading to the next one, but no longer than
 * `holdMs`; what is implausible, cannot be judged or has no limits is not known, and neither is the time beyond
 * `holdMs`. Watch lies within tolerance. Readings in the order of time.
 * Source: common practice (last value held), no published source.
 * @example timeWithin([{ takenAt: 0, status: "within" }, { takenAt: 3, status: "out" }], 4, 10).share // => 0.75
 */
export function timeWithin(readings: readonly TimedStatus[], untilAt: number, holdMs: number): TimeWithin {
  let knownMs = 0;
  let withinMs = 0;
  readings.forEach(({ takenAt, status }, index) => {
    const isWithin = IS_WITHIN[status];
    if (isWithin === null) return;
    const endAt = Math.min(readings[index + 1]?.takenAt ?? untilAt, untilAt);
    const held = Math.max(0, Math.min(endAt - takenAt, holdMs));
    knownMs += held;
    if (isWithin) withinMs += held;
  });
  return { share: knownMs === 0 ? null : withinMs / knownMs, knownMs };
}
