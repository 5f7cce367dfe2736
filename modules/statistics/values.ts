/** A series of numbers: an ordinary array or any typed array of floating point numbers. */
export type Values = ArrayLike<number>;

/** Refuses an empty or too short series and any entry that is not a finite number; returns its length. */
export function requireValues(values: Values, least: number, name = "values"): number {
  const n = values.length;
  if (n < least) {
    throw new RangeError(`${name}: at least ${least} values are needed, ${n} given.`);
  }
  for (let i = 0; i < n; i++) {
    if (!Number.isFinite(values[i]!)) {
      throw new RangeError(`${name}: entry ${i} is not a finite number.`);
    }
  }
  return n;
}

/** Refuses a number that is not finite; returns it. */
export function requireFinite(value: number, name: string): number {
  if (!Number.isFinite(value)) throw new RangeError(`${name} must be a finite number.`);
  return value;
}

/** Refuses a number that is not finite and above zero; returns it. */
export function requirePositive(value: number, name: string): number {
  if (!(Number.isFinite(value) && value > 0)) throw new RangeError(`${name} must be greater than zero.`);
  return value;
}

/** Refuses a probability outside the open interval 0 to 1; returns it. */
export function requireProbability(value: number, name: string): number {
  if (!(value > 0 && value < 1)) throw new RangeError(`${name} must lie between 0 and 1.`);
  return value;
}

/** Refuses two series of different length; returns the length. */
export function requirePairs(x: Values, y: Values, least: number): number {
  if (x.length !== y.length) {
    throw new RangeError(`x and y must have the same length, ${x.length} and ${y.length} given.`);
  }
  requireValues(x, least, "x");
  return requireValues(y, least, "y");
}

/** An ascending copy; the input is left as it is. */
export function sortedCopy(values: Values): Float64Array {
  return Float64Array.from(values).sort();
}
