import { requireFinite, requirePositive, requireWithin, type ValidRange } from "../validity";

/** One standard atmosphere, kPa (exact). */
export const STANDARD_ATMOSPHERE_KPA = 101.325;

/** Where the standard atmosphere's lowest layer lies. */
export const ALTITUDE_RANGE = {
  altitudeM: { min: -500, max: 11000, unit: "m" },
} as const satisfies Record<string, ValidRange>;

/** International Standard Atmosphere, troposphere: P = P0 (1 − lapse h)^exponent. */
export const STANDARD_ATMOSPHERE = { lapsePerM: 2.25577e-5, exponent: 5.25588 } as const;

/**
 * Which air pressure is usual at this altitude? Only where there is no barometer: weather moves it by 3 %.
 *
 * Units: m above sea level; answer in kPa. Domain: −500 to 11,000 m, else RangeError.
 * Source: International Standard Atmosphere 1976. Checked: computed with mpmath (95.46083 kPa at 500 m).
 * @example barometricPressureKPa({ altitudeM: 500 }) // => 95.461
 */
export function barometricPressureKPa(input: { altitudeM: number }): number {
  requireWithin("altitudeM", input.altitudeM, ALTITUDE_RANGE.altitudeM, "the standard atmosphere");
  const { lapsePerM, exponent } = STANDARD_ATMOSPHERE;
  return STANDARD_ATMOSPHERE_KPA * (1 - lapsePerM * input.altitudeM) ** exponent;
}

/**
 * How strongly is the water supersaturated with all gases together?
 *
 * Units: kPa both (the barometer at the tank; the saturometer's excess over it); answer in %, 100 is balance.
 * Throws RangeError for a barometer not above zero or an excess below minus the barometer.
 * Formula: 100 (BP + ΔP) / BP. Source: Colt 1984, AFS Special Publication 14 (from memory). Checked: arithmetic.
 * @example totalGasPressurePercent({ barometricPressureKPa: 101.325, excessPressureKPa: 3 }) // => 102.96077
 */
export function totalGasPressurePercent(input: {
  barometricPressureKPa: number;
  excessPressureKPa: number;
}): number {
  const barometer = requirePositive("barometricPressureKPa", input.barometricPressureKPa);
  const excess = requireFinite("excessPressureKPa", input.excessPressureKPa);
  if (excess < -barometer) {
    throw new RangeError("excessPressureKPa cannot be less than minus the barometric pressure.");
  }
  return (100 * (barometer + excess)) / barometer;
}
