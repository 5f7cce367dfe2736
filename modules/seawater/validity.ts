/** The span in which a formula holds, both ends included, with the unit a page shows beside it. */
export interface ValidRange {
  readonly min: number;
  readonly max: number;
  readonly unit: string;
}

/** A converted value that equals a bound to within this share of its size lies on the bound (64.4 °F is 18 °C). */
const BOUND_TOLERANCE = 1e-9;

const withUnit = (value: number, unit: string) => (unit === "" ? `${value}` : `${value} ${unit}`);

/** Refuses a value outside the span in which `formula` holds; returns the value. Throws RangeError. */
export function requireWithin(name: string, value: number, range: ValidRange, formula: string): number {
  const below = range.min - BOUND_TOLERANCE * Math.max(1, Math.abs(range.min));
  const above = range.max + BOUND_TOLERANCE * Math.max(1, Math.abs(range.max));
  if (!(value >= below && value <= above)) {
    throw new RangeError(
      `${name} is ${withUnit(value, range.unit)}; ${formula} holds from ${range.min} to ${withUnit(range.max, range.unit)}.`,
    );
  }
  return value;
}

/** Refuses what is not a finite number. Throws RangeError. */
export function requireFinite(name: string, value: number): number {
  if (!Number.isFinite(value)) throw new RangeError(`${name} must be a finite number, not ${value}.`);
  return value;
}

/** Refuses what is not a finite number above zero. Throws RangeError. */
export function requirePositive(name: string, value: number): number {
  if (!(Number.isFinite(value) && value > 0)) {
    throw new RangeError(`${name} must be greater than zero, not ${value}.`);
  }
  return value;
}

/** Refuses what is not a finite number of zero or more. Throws RangeError. */
export function requireNotNegative(name: string, value: number): number {
  if (!(Number.isFinite(value) && value >= 0)) {
    throw new RangeError(`${name} must be zero or more, not ${value}.`);
  }
  return value;
}

/** Refuses what is not a share from 0 (included) to 1 (excluded): a moisture, say. Throws RangeError. */
export function requireShareBelowOne(name: string, value: number): number {
  if (!(value >= 0 && value < 1)) {
    throw new RangeError(`${name} must be a share from 0 to below 1, not ${value}.`);
  }
  return value;
}

/** Refuses what is not a share above 0 and up to 1: a purity, say. Throws RangeError. */
export function requireShareAboveZero(name: string, value: number): number {
  if (!(value > 0 && value <= 1)) {
    throw new RangeError(`${name} must be a share above 0 and up to 1, not ${value}.`);
  }
  return value;
}
