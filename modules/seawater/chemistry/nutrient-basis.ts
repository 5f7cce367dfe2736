import { requireFinite } from "../validity";
import { ATOMIC_WEIGHTS } from "./atomic-weights.data";
import { type Atoms, molarMassGPerMol } from "./molar-mass";

/** Substances that are stated either as themselves or as the nitrogen or phosphorus in them. */
export type Nutrient = "nitrate" | "nitrite" | "ammonia" | "ammonium" | "phosphate";
export type NutrientBasis = "element" | "substance";
export type AmountUnit = "mgPerL" | "umolPerL";

const NUTRIENT_ATOMS: Record<Nutrient, { atoms: Atoms; element: "N" | "P" }> = {
  nitrate: { atoms: { N: 1, O: 3 }, element: "N" },
  nitrite: { atoms: { N: 1, O: 2 }, element: "N" },
  ammonia: { atoms: { N: 1, H: 3 }, element: "N" },
  ammonium: { atoms: { N: 1, H: 4 }, element: "N" },
  phosphate: { atoms: { P: 1, O: 4 }, element: "P" },
};

/**
 * By what is a figure in N (or P) multiplied to become one in the substance: 4.4266 for nitrate, 3.0661 for phosphate?
 *
 * Units: dimensionless. Source: atomic weights (CIAAW abridged 2021). Checked: 10 mg/L NO3-N is 44.266 mg/L NO3.
 * @example nutrientFactor("nitrate") // => 4.42664
 */
export function nutrientFactor(nutrient: Nutrient): number {
  const { atoms, element } = NUTRIENT_ATOMS[nutrient];
  return molarMassGPerMol(atoms) / ATOMIC_WEIGHTS[element];
}

/**
 * The same water stated on another basis: nitrate as N or as NO3, in mg/L or µmol/L.
 *
 * Units: as said in `from` and `to`. Throws RangeError for what is not finite. Source: atomic weights.
 * Checked: computed (0.05 mg/L PO4-P is 0.1533 mg/L PO4).
 * @example convertNutrient({ nutrient: "phosphate", value: 0.05, from: { unit: "mgPerL", basis: "element" }, to: { unit: "mgPerL", basis: "substance" } }) // => 0.153306
 */
export function convertNutrient(input: {
  nutrient: Nutrient;
  value: number;
  from: { unit: AmountUnit; basis: NutrientBasis };
  to: { unit: AmountUnit; basis: NutrientBasis };
}): number {
  const { nutrient, value, from, to } = input;
  const { atoms, element } = NUTRIENT_ATOMS[nutrient];
  const milligramsPerUnit = ({ unit, basis }: { unit: AmountUnit; basis: NutrientBasis }) => {
    if (unit === "umolPerL") return 1;
    return basis === "element" ? 1000 / ATOMIC_WEIGHTS[element] : 1000 / molarMassGPerMol(atoms);
  };
  return (requireFinite("value", value) * milligramsPerUnit(from)) / milligramsPerUnit(to);
}
