/**
 * Comparing converted numbers.
 *
 * A value that passed through a unit conversion carries a rounding error in its last digits: 64.4 °F becomes
 * 18.000000000000004 °C. Two numbers that differ by no more than 1e-9 of their size count as equal here, so that
 * such a value is *on* an inclusive limit of 18 °C and not beyond it.
 */
export const RELATIVE_TOLERANCE = 1e-9;

/** Below this difference numbers are equal whatever their size (rests of subtractions around zero). */
export const ABSOLUTE_FLOOR = 1e-12;

/**
 * Are two numbers equal but for rounding? Infinities equal only themselves; NaN equals nothing.
 * @example nearlyEqual(((64.4 - 32) * 5) / 9, 18) // true
 */
export function nearlyEqual(a: number, b: number): boolean {
  if (a === b) return true;
  if (!Number.isFinite(a) || !Number.isFinite(b)) return false;
  const difference = Math.abs(a - b);
  return difference <= Math.max(ABSOLUTE_FLOOR, RELATIVE_TOLERANCE * Math.max(Math.abs(a), Math.abs(b)));
}

/**
 * Is a value at most an inclusive limit?
 * @example atMost(18.000000000000007, 18) // true
 */
export function atMost(value: number, limit: number): boolean {
  return value <= limit || nearlyEqual(value, limit);
}

/**
 * Is a value at least an inclusive limit?
 * @example atLeast(17.999999999999996, 18) // true
 */
export function atLeast(value: number, limit: number): boolean {
  return value >= limit || nearlyEqual(value, limit);
}
