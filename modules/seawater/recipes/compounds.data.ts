import type { Ion } from "./ions.data";

/** Salts that recipes are made of, without their water: which ions a formula unit gives to the water. */
export const COMPOUNDS = {
  NaCl: { name: "sodium chloride", ions: { Na: 1, Cl: 1 } },
  Na2SO4: { name: "sodium sulfate", ions: { Na: 2, SO4: 1 } },
  KCl: { name: "potassium chloride", ions: { K: 1, Cl: 1 } },
  K2SO4: { name: "potassium sulfate", ions: { K: 2, SO4: 1 } },
  NaHCO3: { name: "sodium hydrogen carbonate", ions: { Na: 1, HCO3: 1 } },
  Na2CO3: { name: "sodium carbonate", ions: { Na: 2, CO3: 1 } },
  KHCO3: { name: "potassium hydrogen carbonate", ions: { K: 1, HCO3: 1 } },
  KBr: { name: "potassium bromide", ions: { K: 1, Br: 1 } },
  NaBr: { name: "sodium bromide", ions: { Na: 1, Br: 1 } },
  H3BO3: { name: "boric acid", ions: { "B(OH)3": 1 } },
  NaF: { name: "sodium fluoride", ions: { Na: 1, F: 1 } },
  KI: { name: "potassium iodide", ions: { K: 1, I: 1 } },
  MgCl2: { name: "magnesium chloride", ions: { Mg: 1, Cl: 2 } },
  MgSO4: { name: "magnesium sulfate", ions: { Mg: 1, SO4: 1 } },
  CaCl2: { name: "calcium chloride", ions: { Ca: 1, Cl: 2 } },
  SrCl2: { name: "strontium chloride", ions: { Sr: 1, Cl: 2 } },
} as const satisfies Record<string, { name: string; ions: Partial<Record<Ion, number>> }>;

export type Compound = keyof typeof COMPOUNDS;
