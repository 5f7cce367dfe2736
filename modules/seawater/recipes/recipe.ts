import { requireNotNegative, requireShareAboveZero } from "../validity";
import { compoundGPerMol, ionGPerMol, ionsOf } from "./compound-mass";
import type { Compound } from "./compounds.data";
import { IONS, type Ion } from "./ions.data";

interface Substance {
  compound: Compound;
  /** moles of water of crystallisation per mole of salt; none unless said */
  hydrationWaters?: number;
  /** share of what is weighed that is the (hydrated) compound; 1 unless said */
  purityFraction?: number;
}

/** What goes into a recipe: weighed in grams, or measured out in moles. */
export type Ingredient = Substance &
  ({ massG: number; amountMol?: undefined } | { amountMol: number; massG?: undefined });

/** Amounts for one litre, or one kilogram, of finished water. */
export interface Recipe {
  title: string;
  per: "L" | "kg";
  ingredients: readonly Ingredient[];
}

export interface IonTotal {
  ion: Ion;
  mmol: number;
  mg: number;
}

export interface RecipeTotals {
  per: "L" | "kg";
  ions: readonly IonTotal[];
  /** dissolved salts without water of crystallisation and impurities, g */
  saltG: number;
  /** what comes as water of crystallisation, g */
  crystalWaterG: number;
  /** what is weighed but is not the compound, g */
  impurityG: number;
  /** positive minus negative charges; zero for whole salts */
  chargeMmol: number;
}

function molesOf(ingredient: Ingredient): number {
  const { purityFraction = 1 } = ingredient;
  requireShareAboveZero("purityFraction", purityFraction);
  if (ingredient.amountMol !== undefined) return requireNotNegative("amountMol", ingredient.amountMol);
  return (requireNotNegative("massG", ingredient.massG) * purityFraction) / compoundGPerMol(ingredient);
}

/**
 * Which ions does a recipe give, per litre or kilogram as it is written? Water of crystallisation and purity are
 * reckoned with; impurities are taken as inert.
 *
 * Units: g, mol; answer in mmol and mg. Throws RangeError for a negative amount or a purity outside 0 to 1.
 * Source: stoichiometry with CIAAW atomic weights. Checked: computed from ASTM D1141 (Na 479.80 mmol/L) and Kester et
 * al. 1967 (Na 468.25 mmol/kg).
 * @example recipeTotals({ title: "brine", per: "L", ingredients: [{ compound: "NaCl", massG: 58.44 }] }).ions[0].mmol // => 1000
 */
export function recipeTotals(recipe: Recipe): RecipeTotals {
  const mmol = new Map<Ion, number>();
  let saltG = 0;
  let crystalWaterG = 0;
  let impurityG = 0;
  for (const ingredient of recipe.ingredients) {
    const moles = molesOf(ingredient);
    const dry = moles * compoundGPerMol({ compound: ingredient.compound });
    const hydrated = moles * compoundGPerMol(ingredient);
    saltG += dry;
    crystalWaterG += hydrated - dry;
    impurityG += ingredient.massG === undefined ? 0 : ingredient.massG - hydrated;
    for (const [ion, count] of ionsOf(ingredient.compound)) {
      mmol.set(ion, (mmol.get(ion) ?? 0) + 1000 * moles * count);
    }
  }
  const ions = [...mmol].map(([ion, amount]) => ({ ion, mmol: amount, mg: amount * ionGPerMol(ion) }));
  const chargeMmol = ions.reduce((total, { ion, mmol: amount }) => total + amount * IONS[ion].charge, 0);
  return { per: recipe.per, ions, saltG, crystalWaterG, impurityG, chargeMmol };
}
