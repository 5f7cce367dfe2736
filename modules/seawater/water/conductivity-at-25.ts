import { requireNotNegative, requirePositive, requireWithin, type ValidRange } from "../validity";
import { conductivityMsPerCm, practicalSalinity } from "./salinity";

/** Relative change of a dilute water's conductivity per °C about 25 °C (Standard Methods 2510 B, from memory). */
export const CONDUCTIVITY_COEFFICIENT_PER_C = 0.0191;

/** The straight-line correction is for fresh water between these temperatures. */
export const CONDUCTIVITY_AT_25_LINEAR_RANGE = {
  temperatureC: { min: 0, max: 50, unit: "°C" },
} as const satisfies Record<string, ValidRange>;

/**
 * What would this seawater's conductivity be at 25 °C? Through PSS-78; for fresh, permeate or tap water use
 * freshConductivityAt25MsPerCm.
 *
 * Units: mS/cm, °C on ITS-90. Domain: that of practicalSalinity, else RangeError.
 * Source: UNESCO 44 (1983). Checked: computed with mpmath from PSS-78 (53.16156663).
 * @example conductivityAt25MsPerCm({ conductivityMsPerCm: 48, temperatureC: 20 }) // => 53.1616
 */
export function conductivityAt25MsPerCm(input: {
  conductivityMsPerCm: number;
  temperatureC: number;
}): number {
  return conductivityMsPerCm({ salinityPsu: practicalSalinity(input), temperatureC: 25 });
}

/**
 * What would this fresh water's conductivity be at 25 °C, by a straight line? Not for seawater: there it is off by
 * up to 0.2 %.
 *
 * Units: mS/cm, °C, 1/°C (0.0191 unless said; many meters use 0.02). Domain: 0 to 50 °C, else RangeError.
 * Formula: k / (1 + α (t − 25)). Source: Standard Methods 2510 B (from memory). Checked: arithmetic.
 * @example freshConductivityAt25MsPerCm({ conductivityMsPerCm: 12.5, temperatureC: 18, coefficientPerC: 0.02 }) // => 14.534884
 */
export function freshConductivityAt25MsPerCm(input: {
  conductivityMsPerCm: number;
  temperatureC: number;
  coefficientPerC?: number;
}): number {
  const { conductivityMsPerCm: conductivity, temperatureC } = input;
  const { coefficientPerC = CONDUCTIVITY_COEFFICIENT_PER_C } = input;
  requireNotNegative("conductivityMsPerCm", conductivity);
  const { temperatureC: range } = CONDUCTIVITY_AT_25_LINEAR_RANGE;
  requireWithin("temperatureC", temperatureC, range, "the straight-line correction");
  requireNotNegative("coefficientPerC", coefficientPerC);
  return conductivity / requirePositive("correction", 1 + coefficientPerC * (temperatureC - 25));
}

/**
 * Which reading does a TDS meter show for this conductivity? The factor is the meter's own convention, so it must
 * be said: 0.5 (sodium chloride), 0.64 or 0.7 (natural water) are met.
 *
 * Units: µS/cm at 25 °C; answer in mg/L. Throws RangeError for a negative conductivity or a factor that is not
 * above zero. Source: common practice, no source. Checked: arithmetic.
 * @example totalDissolvedSolidsMgPerL({ conductivityAt25UsPerCm: 1500, factor: 0.7 }) // => 1050
 */
export function totalDissolvedSolidsMgPerL(input: {
  conductivityAt25UsPerCm: number;
  factor: number;
}): number {
  requireNotNegative("conductivityAt25UsPerCm", input.conductivityAt25UsPerCm);
  return input.conductivityAt25UsPerCm * requirePositive("factor", input.factor);
}
