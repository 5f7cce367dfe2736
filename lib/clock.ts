/** Where the time comes from. Passed in, so that a test or a seed can say what time it is. */
export type Clock = { now(): number };

/** The machine's clock, UTC epoch milliseconds. */
export const systemClock: Clock = { now: () => Date.now() };

/** A clock that shows what it is told. */
export class SetClock implements Clock {
  #at: number;
  constructor(at: number) {
    this.#at = at;
  }
  now(): number {
    return this.#at;
  }
  set(at: number): void {
    this.#at = at;
  }
}

export const SECOND_MS = 1000;
export const MINUTE_MS = 60 * SECOND_MS;
export const HOUR_MS = 60 * MINUTE_MS;
/** 24 elapsed hours; a calendar day may be 23 or 25 (see lib/zone.ts). */
export const DAY_MS = 24 * HOUR_MS;
