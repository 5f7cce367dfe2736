import type { Recipe } from "./recipe";

/** Substitute ocean water of ASTM D1141-98, per litre of solution, anhydrous salts (from memory; total 36.032 g). */
export const ASTM_D1141: Recipe = {
  title: "ASTM D1141-98 substitute ocean water",
  per: "L",
  ingredients: [
    { compound: "NaCl", massG: 24.53 },
    { compound: "MgCl2", massG: 5.2 },
    { compound: "Na2SO4", massG: 4.09 },
    { compound: "CaCl2", massG: 1.16 },
    { compound: "KCl", massG: 0.695 },
    { compound: "NaHCO3", massG: 0.201 },
    { compound: "KBr", massG: 0.101 },
    { compound: "H3BO3", massG: 0.027 },
    { compound: "SrCl2", massG: 0.025 },
    { compound: "NaF", massG: 0.003 },
  ],
};
