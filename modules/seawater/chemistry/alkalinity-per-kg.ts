import { requireFinite, requirePositive } from "../validity";

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
