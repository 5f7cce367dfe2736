import type { ReadingValue } from "../model";

/** The minus sign of typography, which stands as wide as the plus. */
const TRUE_MINUS = "\u2212";
const MOST_DECIMALS = 9;

/**
 * A number as shown: fixed decimals rounded half away from zero on its decimal digits (1.005 → "1.01"), a true
 * minus, and never "−0". `decimals` null shows as many digits as the number has, at most nine after the point.
 * Throws RangeError for a number that is not finite.
 * @example formatNumber(-1.25, 1) // => "−1.3"
 */
export function formatNumber(value: number, decimals: number | null): string {
  if (!Number.isFinite(value)) throw new RangeError("Only a finite number can be shown.");
  const magnitude = Math.abs(value);
  const shown =
    decimals === null
      ? withoutTrailingZeros(roundHalfAway(magnitude, MOST_DECIMALS))
      : roundHalfAway(magnitude, decimals);
  return value < 0 && /[1-9]/.test(shown) ? `${TRUE_MINUS}${shown}` : shown;
}

function roundHalfAway(magnitude: number, decimals: number): string {
  // fifteen digits carry what was typed; the rest is the dust of binary conversion
  const [mantissa = "0", exponent = "0"] = magnitude.toPrecision(15).split("e");
  const shifted = Math.round(Number(`${mantissa}e${Number(exponent) + decimals}`));
  return shifted >= 1e15 ? magnitude.toFixed(decimals) : Number(`${shifted}e${-decimals}`).toFixed(decimals);
}

const withoutTrailingZeros = (text: string) => (text.includes(".") ? text.replace(/\.?0+$/, "") : text);

/**
 * Two different numbers shown so that they look different: decimals are added (to nine) until they do. Used where a
 * sentence says that one exceeds the other.
 * @example formatPair(18.04, 18, 1) // => ["18.04", "18.00"]
 */
export function formatPair(a: number, b: number, decimals: number): [string, string] {
  for (let digits = decimals; digits < MOST_DECIMALS; digits += 1) {
    const pair: [string, string] = [formatNumber(a, digits), formatNumber(b, digits)];
    if (pair[0] !== pair[1] || a === b) return pair;
  }
  return [formatNumber(a, MOST_DECIMALS), formatNumber(b, MOST_DECIMALS)];
}

/**
 * A reading as shown, without its unit: "8.12", "−1.3", "<0.05", "ND", ">" cases without a number by their text
 * ("TNTC"), choices and texts as they are.
 * A censored number keeps the digits it was given: "<0.05" with one decimal is not shown as "<0.1".
 * @example formatValue({ value: 0.05, qualifier: "<", text: "<0,05" }, 1) // => "<0.05"
 */
export function formatValue(reading: ReadingValue, decimals: number): string {
  if (reading.qualifier === "ND") return "ND";
  if (reading.value === null) return reading.text;
  if (reading.qualifier === "") return formatNumber(reading.value, decimals);
  const fixed = formatNumber(reading.value, decimals);
  const full = formatNumber(reading.value, null);
  return `${reading.qualifier}${full.length > fixed.length ? full : fixed}`;
}
