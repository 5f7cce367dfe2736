import { requireNotNegative, requirePositive, requireWithin } from "../validity";
import { DENSITY_RANGE, densityKgPerM3, salinityFromDensity } from "./density";

/** Cubic expansion of soda-lime glass, 1/K (from memory; a maker's value goes before it). */
export const GLASS_EXPANSION_PER_K = 25e-6;

/** 60 °F, the reference of older hydrometers, in °C. */
export const SIXTY_FAHRENHEIT_C = 140 / 9;

const waterDensity = (temperatureC: number) => densityKgPerM3({ salinityPsu: 0, temperatureC });

/**
 * What is this water's specific gravity: its density at its own temperature over that of pure water at the
 * reference temperature? Both temperatures are always said: at 35 psu it runs from 1.0234 to 1.0269 with them.
 *
 * Units: psu, °C on ITS-90. Domain: DENSITY_RANGE, else RangeError. Source: EOS-80 (Millero and Poisson 1981).
 * Checked: computed with mpmath from EOS-80 (1.026372709 at 25/25).
 * @example specificGravity({ salinityPsu: 35, temperatureC: 25, referenceTemperatureC: 25 }) // => 1.026373
 */
export function specificGravity(input: {
  salinityPsu: number;
  temperatureC: number;
  referenceTemperatureC: number;
}): number {
  return densityKgPerM3(input) / waterDensity(input.referenceTemperatureC);
}

/**
 * How salt is water of this specific gravity? (Inverse of specificGravity.)
 *
 * Units: dimensionless, °C on ITS-90; answer in psu. Throws RangeError where no salinity from 0 to 42 fits.
 * Source: EOS-80. Checked: computed with mpmath (34.50823 for 1.026 at 25/25).
 * @example salinityFromSpecificGravity({ specificGravity: 1.026, temperatureC: 25, referenceTemperatureC: 25 }) // => 34.5082
 */
export function salinityFromSpecificGravity(input: {
  specificGravity: number;
  temperatureC: number;
  referenceTemperatureC: number;
}): number {
  requirePositive("specificGravity", input.specificGravity);
  return salinityFromDensity({
    densityKgPerM3: input.specificGravity * waterDensity(input.referenceTemperatureC),
    temperatureC: input.temperatureC,
  });
}

export interface HydrometerInput {
  /** what the stem shows, a specific gravity */
  reading: number;
  /** of the water in which it floats */
  sampleTemperatureC: number;
  /** at which the glass is right; the first of the two temperatures on the stem */
  calibrationTemperatureC: number;
  /** of the pure water that the scale is relative to; the second temperature on the stem */
  referenceTemperatureC: number;
  glassExpansionPerK?: number;
}

/**
 * Which specific gravity does the water have when a glass hydrometer is read away from its calibration
 * temperature? The warm glass displaces more, so it shows too little.
 *
 * Units: dimensionless, °C, 1/K. Formula: reading × [1 − γ (t − t_cal)]. Answer: density of the sample at its own
 * temperature over water at the reference temperature. Domain: temperatures of DENSITY_RANGE, else RangeError.
 * Source: expansion of the displaced volume; γ from memory. Checked: common practice, no source.
 * @example hydrometerSpecificGravity({ reading: 1.025, sampleTemperatureC: 25, calibrationTemperatureC: 15, referenceTemperatureC: 15 }) // => 1.024744
 */
export function hydrometerSpecificGravity(input: HydrometerInput): number {
  const { glassExpansionPerK = GLASS_EXPANSION_PER_K } = input;
  requirePositive("reading", input.reading);
  requireNotNegative("glassExpansionPerK", glassExpansionPerK);
  const range = DENSITY_RANGE.temperatureC;
  requireWithin("sampleTemperatureC", input.sampleTemperatureC, range, "the hydrometer correction");
  requireWithin("calibrationTemperatureC", input.calibrationTemperatureC, range, "the hydrometer correction");
  return (
    input.reading * (1 - glassExpansionPerK * (input.sampleTemperatureC - input.calibrationTemperatureC))
  );
}

/**
 * How salt is the water in which a glass hydrometer floats?
 *
 * Units, domain, errors: as hydrometerSpecificGravity and salinityFromSpecificGravity; answer in psu.
 * Source: EOS-80 and the expansion of glass. Checked: equals salinityFromSpecificGravity at the calibration temperature.
 * @example salinityFromHydrometer({ reading: 1.026, sampleTemperatureC: 25, calibrationTemperatureC: 25, referenceTemperatureC: 25 }) // => 34.5082
 */
export function salinityFromHydrometer(input: HydrometerInput): number {
  return salinityFromSpecificGravity({
    specificGravity: hydrometerSpecificGravity(input),
    temperatureC: input.sampleTemperatureC,
    referenceTemperatureC: input.referenceTemperatureC,
  });
}
