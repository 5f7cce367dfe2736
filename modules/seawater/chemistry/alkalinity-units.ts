import { requireFinite, requirePositive } from "../validity";
import { CALCIUM_CARBONATE_G_PER_MOL, CALCIUM_OXIDE_G_PER_MOL } from "./molar-mass";

/**
 * Units in which alkalinity and hardness are stated. A mole of calcium carbonate has two equivalents, so 1 meq/L is
 * 50.04 mg/L CaCO3; a clinical handbook (Hadfield 2021, appendix A2) prints 100, which is wrong.
 */
export type AlkalinityUnit =
  | "meqPerL"
  | "dKH"
  | "mgPerLCaCO3"
  | "clarkDegree"
  | "frenchDegree"
  | "mmolPerLCaCO3";

/** mg/L as CaCO3 in one Clark (English) degree: one grain in an imperial gallon. */
export const CLARK_DEGREE_MG_PER_L = 64.79891 / 4.54609;

/** One unit in mg/L as CaCO3. A German degree (dKH) is 10 mg/L of calcium oxide; a French degree 10 mg/L of CaCO3. */
export const ALKALINITY_UNIT_MG_PER_L_CACO3: Readonly<Record<AlkalinityUnit, number>> = {
  meqPerL: CALCIUM_CARBONATE_G_PER_MOL / 2,
  dKH: (10 * CALCIUM_CARBONATE_G_PER_MOL) / CALCIUM_OXIDE_G_PER_MOL,
  mgPerLCaCO3: 1,
  clarkDegree: CLARK_DEGREE_MG_PER_L,
  frenchDegree: 10,
  mmolPerLCaCO3: CALCIUM_CARBONATE_G_PER_MOL,
};

/**
 * The same alkalinity or hardness in another unit.
 *
 * Units: as said. Throws RangeError for what is not finite. Source: definitions and atomic weights (CIAAW 2021).
 * Checked: computed (7 dKH is 124.936 mg/L CaCO3).
 * @example convertAlkalinity({ value: 2.5, from: "meqPerL", to: "dKH" }) // => 7.0096
 */
export function convertAlkalinity(input: {
  value: number;
  from: AlkalinityUnit;
  to: AlkalinityUnit;
}): number {
  const { from, to } = input;
  const value = requireFinite("value", input.value);
  return (value * ALKALINITY_UNIT_MG_PER_L_CACO3[from]) / ALKALINITY_UNIT_MG_PER_L_CACO3[to];
}

/**
 * Alkalinity per kilogram, as oceanographers state it, per litre.
 *
 * Units: µmol/kg, kg/m³ at the temperature at which the litre is meant; answer in meq/L. Throws RangeError for a
 * density not above zero. Source: definition. Checked: computed (2.3536889).
 * @example alkalinityMeqPerL({ alkalinityUmolPerKg: 2300, densityKgPerM3: 1023.343 }) // => 2.353689
 */
export function alkalinityMeqPerL(input: { alkalinityUmolPerKg: number; densityKgPerM3: number }): number {
  const density = requirePositive("densityKgPerM3", input.densityKgPerM3);
  return (requireFinite("alkalinityUmolPerKg", input.alkalinityUmolPerKg) * density) / 1e6;
}

/**
 * Alkalinity per litre stated per kilogram. (Inverse of alkalinityMeqPerL.)
 *
 * Units: meq/L, kg/m³; answer in µmol/kg. Throws RangeError for a density not above zero. Source: definition.
 * @example alkalinityUmolPerKg({ alkalinityMeqPerL: 2.3536889, densityKgPerM3: 1023.343 }) // => 2300.000
 */
export function alkalinityUmolPerKg(input: { alkalinityMeqPerL: number; densityKgPerM3: number }): number {
  const density = requirePositive("densityKgPerM3", input.densityKgPerM3);
  return (requireFinite("alkalinityMeqPerL", input.alkalinityMeqPerL) * 1e6) / density;
}
