import { polynomial } from "../polynomial";
import { ipts68FromIts90, ZERO_CELSIUS_K } from "../temperature-scale";
import { requireNotNegative, requireWithin, type ValidRange } from "../validity";
import { STANDARD_ATMOSPHERE_KPA } from "./gas-pressure";

/** Where the oxygen saturation of Benson and Krause 1984 holds; pressure from half an atmosphere to 1.1. */
export const OXYGEN_RANGE = {
  temperatureC: { min: 0, max: 40, unit: "°C" },
  salinityPsu: { min: 0, max: 40, unit: "psu" },
  pressureKPa: { min: 50, max: 112, unit: "kPa" },
} as const satisfies Record<string, ValidRange>;

/** Benson and Krause 1984 eq. 32 in powers of 1/T, its salinity term, and the pressure terms of Standard Methods 4500-O. */
export const BENSON_KRAUSE_1984 = {
  water: [-139.34411, 1.575701e5, -6.642308e7, 1.2438e10, -8.621949e11],
  salt: [1.7674e-2, -10.754, 2140.7],
  vapour: [11.8571, -3840.7, -216961],
  theta: [0.000975, -1.426e-5, 6.436e-8],
} as const;

const NAME = "oxygen saturation (Benson and Krause 1984)";

/** Pressure of water vapour at saturation, atm, as Standard Methods 4500-O has it. */
function vapourPressureAtm(inverseK: number): number {
  return Math.exp(polynomial(inverseK, BENSON_KRAUSE_1984.vapour));
}

function pressureFactor(atm: number, t68: number, inverseK: number): number {
  const vapour = vapourPressureAtm(inverseK);
  const theta = polynomial(t68, BENSON_KRAUSE_1984.theta);
  return (atm * (1 - vapour / atm) * (1 - theta * atm)) / ((1 - vapour) * (1 - theta));
}

export interface OxygenConditions {
  temperatureC: number;
  salinityPsu: number;
  /** the barometer at the tank, not brought to sea level; one standard atmosphere unless said */
  pressureKPa?: number;
}

/**
 * How much oxygen does this water hold when it is in balance with moist air?
 *
 * Units: °C on ITS-90, psu, kPa; answer in mg/L. Domain: OXYGEN_RANGE, else RangeError.
 * Source: Benson and Krause 1984, Limnol. Oceanogr. 29, 620-632, eq. 32, with the pressure terms of Standard Methods
 * 4500-O (also USGS tables). Checked: Benson and Krause (14.621 at 0 °C, 9.870 at 16 °C, 7.305 at 32 °C, fresh).
 * @example oxygenSaturationMgPerL({ temperatureC: 20, salinityPsu: 35 }) // => 7.395
 */
export function oxygenSaturationMgPerL(input: OxygenConditions): number {
  const { temperatureC, salinityPsu, pressureKPa = STANDARD_ATMOSPHERE_KPA } = input;
  requireWithin("temperatureC", temperatureC, OXYGEN_RANGE.temperatureC, NAME);
  requireWithin("salinityPsu", salinityPsu, OXYGEN_RANGE.salinityPsu, NAME);
  requireWithin("pressureKPa", pressureKPa, OXYGEN_RANGE.pressureKPa, NAME);
  const t68 = ipts68FromIts90(temperatureC);
  const inverseK = 1 / (t68 + ZERO_CELSIUS_K);
  const logarithm =
    polynomial(inverseK, BENSON_KRAUSE_1984.water) -
    salinityPsu * polynomial(inverseK, BENSON_KRAUSE_1984.salt);
  return Math.exp(logarithm) * pressureFactor(pressureKPa / STANDARD_ATMOSPHERE_KPA, t68, inverseK);
}

/**
 * What percentage of its saturation does the measured oxygen make?
 *
 * Units: mg/L, °C on ITS-90, psu, kPa (the barometer at the tank); answer in %. Domain: OXYGEN_RANGE, else RangeError.
 * Source: 100 × measured / saturation (Benson and Krause 1984). Checked: computed with mpmath (95.9818 %).
 * @example oxygenSaturationPercent({ oxygenMgPerL: 6.5, temperatureC: 25, salinityPsu: 35 }) // => 95.99
 */
export function oxygenSaturationPercent(input: OxygenConditions & { oxygenMgPerL: number }): number {
  requireNotNegative("oxygenMgPerL", input.oxygenMgPerL);
  return (100 * input.oxygenMgPerL) / oxygenSaturationMgPerL(input);
}

/**
 * How many mg/L of oxygen is a given percentage of saturation? (Inverse of oxygenSaturationPercent.)
 *
 * Units: %, °C on ITS-90, psu, kPa; answer in mg/L. Domain: OXYGEN_RANGE, else RangeError. Source: as above.
 * @example oxygenFromSaturationPercentMgPerL({ saturationPercent: 100, temperatureC: 20, salinityPsu: 35 }) // => 7.395
 */
export function oxygenFromSaturationPercentMgPerL(
  input: OxygenConditions & { saturationPercent: number },
): number {
  requireNotNegative("saturationPercent", input.saturationPercent);
  return (input.saturationPercent / 100) * oxygenSaturationMgPerL(input);
}
