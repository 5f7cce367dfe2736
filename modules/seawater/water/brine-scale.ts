import { whereRisingReaches } from "../root";
import { requireWithin, type ValidRange } from "../validity";
import { refractiveIndex } from "./refraction";

/** Where the reading of a sodium chloride scale can be turned into salinity, and back. */
export const BRINE_SCALE_RANGE = {
  salinityPsu: { min: 0, max: 43, unit: "psu" },
  massPercent: { min: 0, max: 10, unit: "% by mass" },
} as const satisfies Record<string, ValidRange>;

/**
 * Refractive index of sodium chloride solutions at 20 °C and 589 nm above that of pure water: our quadratic through
 * the CRC Handbook's table "Concentrative properties of aqueous solutions" from 0 to 10 % (greatest residual 5e-5).
 */
export const SODIUM_CHLORIDE_INDEX = { pureWater: 1.333, linear: 1.754361e-3, quadratic: -2.084e-7 } as const;

/** The scales are marked at this temperature; a compensating instrument brings its reading there. */
const SCALE_TEMPERATURE_C = 20;

const excess = (massPercent: number) =>
  SODIUM_CHLORIDE_INDEX.linear * massPercent + SODIUM_CHLORIDE_INDEX.quadratic * massPercent ** 2;

function seawaterExcess(salinityPsu: number): number {
  const at = (salinity: number) =>
    refractiveIndex({
      salinityPsu: salinity,
      temperatureC: SCALE_TEMPERATURE_C,
      formula: "millard-seaver-1990",
    });
  return at(salinityPsu) - at(0);
}

/**
 * How strongly does a sodium chloride solution bend light at 20 °C and 589 nm?
 *
 * Units: % by mass; answer dimensionless. Domain: 0 to 10 %, else RangeError.
 * Source: CRC Handbook of Chemistry and Physics, fitted. Checked: the table (1.3383 at 3 %).
 * @example sodiumChlorideRefractiveIndex({ massPercent: 3 }) // => 1.3383
 */
export function sodiumChlorideRefractiveIndex(input: { massPercent: number }): number {
  requireWithin("massPercent", input.massPercent, BRINE_SCALE_RANGE.massPercent, "the sodium chloride table");
  return SODIUM_CHLORIDE_INDEX.pureWater + excess(input.massPercent);
}

/**
 * What does a refractometer marked for sodium chloride ("brine" or "salt") show in seawater of this salinity? It
 * reads about 4 % high: 36.5 where a seawater scale shows 35.
 *
 * Units: psu; answer in grams of sodium chloride per kilogram. For 20 °C, or a compensating instrument zeroed in
 * pure water. Domain: 0 to 43 psu, else RangeError. Uncertainty about 0.35 (the table's last digit is 0.57 g/kg).
 * Source: CRC Handbook table and Millard and Seaver 1990. Checked: 3.65 % sodium chloride matches 35 (published).
 * @example brineScaleReadingGPerKg({ salinityPsu: 35 }) // => 36.5
 */
export function brineScaleReadingGPerKg(input: { salinityPsu: number }): number {
  requireWithin("salinityPsu", input.salinityPsu, BRINE_SCALE_RANGE.salinityPsu, "the brine scale");
  const target = seawaterExcess(input.salinityPsu);
  return 10 * whereRisingReaches(target, 0, BRINE_SCALE_RANGE.massPercent.max, excess);
}

/**
 * How salt is seawater that reads so much on a sodium chloride scale, and how much must be added to the reading?
 *
 * Units: g/kg as read; answer in psu, with correction = salinity − reading (negative). Domain: readings of 0 to 43
 * psu, else RangeError. Uncertainty about 0.35. Source and Checked: as brineScaleReadingGPerKg.
 * @example salinityFromBrineScale({ readingGPerKg: 35 }).salinityPsu // => 33.6
 */
export function salinityFromBrineScale(input: { readingGPerKg: number }): {
  salinityPsu: number;
  correctionPsu: number;
} {
  const { min, max } = BRINE_SCALE_RANGE.salinityPsu;
  const at = (salinityPsu: number) => brineScaleReadingGPerKg({ salinityPsu });
  const readings = { min: at(min), max: at(max), unit: "g/kg" };
  requireWithin("readingGPerKg", input.readingGPerKg, readings, "the brine scale");
  const salinityPsu = whereRisingReaches(input.readingGPerKg, min, max, at);
  return { salinityPsu, correctionPsu: salinityPsu - input.readingGPerKg };
}
