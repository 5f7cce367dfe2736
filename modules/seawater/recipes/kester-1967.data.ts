import type { Recipe } from "./recipe";

/**
 * Artificial seawater of Kester, Duedall, Connors and Pytkowicz 1967, Limnol. Oceanogr. 12, 176-179, per kilogram of
 * solution. The hydrated salts are measured out as standardised solutions, so they stand in moles.
 */
export const KESTER_1967: Recipe = {
  title: "Kester et al. 1967 artificial seawater",
  per: "kg",
  ingredients: [
    { compound: "NaCl", massG: 23.926 },
    { compound: "Na2SO4", massG: 4.008 },
    { compound: "KCl", massG: 0.677 },
    { compound: "NaHCO3", massG: 0.196 },
    { compound: "KBr", massG: 0.098 },
    { compound: "H3BO3", massG: 0.026 },
    { compound: "NaF", massG: 0.003 },
    { compound: "MgCl2", hydrationWaters: 6, amountMol: 0.05327 },
    { compound: "CaCl2", hydrationWaters: 2, amountMol: 0.01033 },
    { compound: "SrCl2", hydrationWaters: 6, amountMol: 0.00009 },
  ],
};
