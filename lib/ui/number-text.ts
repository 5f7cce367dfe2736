/**
 * How is a number written on screen? Fixed decimals, a true minus sign (U+2212), thousands apart by a narrow
 * no-break space (U+202F) from five figures on (SI brochure, 9th ed. 2019, 5.4.4: spaces, no commas; four figures stay together).
 * Never "−0.0". Rounds half away from zero on the decimal digits as written, for showing only.
 * @throws RangeError when the value is not finite or decimals is not an integer from 0 to 12
 * @example numberText(-1.25, 1) === "−1.3"
 * @example numberText(27810, 0) === "27\u202F810"
 */
export function numberText(value: number, decimals: number): string {
  if (!Number.isFinite(value)) throw new RangeError("The value is not a finite number");
  if (!Number.isInteger(decimals) || decimals < 0 || decimals > 12)
    throw new RangeError("Decimals must be 0 to 12");
  const digits = roundHalfAway(Math.abs(value), decimals);
  const [whole = "0", fraction] = digits.split(".");
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, "\u202f") : whole;
  const negative = value < 0 && /[1-9]/.test(digits);
  return `${negative ? "\u2212" : ""}${grouped}${fraction === undefined ? "" : `.${fraction}`}`;
}

function roundHalfAway(magnitude: number, decimals: number): string {
  if (magnitude >= 1e21)
    return BigInt(magnitude).toString() + (decimals > 0 ? `.${"0".repeat(decimals)}` : "");
  // the shortest decimal text of the double decides the tie, so that 1.005 is a tie as it is written
  const [mantissa = "0", exponent = "0"] = magnitude.toString().split("e");
  const shifted = Math.round(Number(`${mantissa}e${Number(exponent) + decimals}`));
  return Number(`${shifted}e-${decimals}`).toFixed(decimals);
}
