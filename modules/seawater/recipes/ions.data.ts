import type { Atoms } from "../chemistry/molar-mass";

/** Constituents that recipes and waters are reckoned in, with their atoms and charge. */
export const IONS = {
  Na: { label: "Na⁺", atoms: { Na: 1 }, charge: 1 },
  Mg: { label: "Mg²⁺", atoms: { Mg: 1 }, charge: 2 },
  Ca: { label: "Ca²⁺", atoms: { Ca: 1 }, charge: 2 },
  K: { label: "K⁺", atoms: { K: 1 }, charge: 1 },
  Sr: { label: "Sr²⁺", atoms: { Sr: 1 }, charge: 2 },
  Cl: { label: "Cl⁻", atoms: { Cl: 1 }, charge: -1 },
  SO4: { label: "SO₄²⁻", atoms: { S: 1, O: 4 }, charge: -2 },
  HCO3: { label: "HCO₃⁻", atoms: { H: 1, C: 1, O: 3 }, charge: -1 },
  CO3: { label: "CO₃²⁻", atoms: { C: 1, O: 3 }, charge: -2 },
  Br: { label: "Br⁻", atoms: { Br: 1 }, charge: -1 },
  F: { label: "F⁻", atoms: { F: 1 }, charge: -1 },
  I: { label: "I⁻", atoms: { I: 1 }, charge: -1 },
  OH: { label: "OH⁻", atoms: { O: 1, H: 1 }, charge: -1 },
  "B(OH)3": { label: "B(OH)₃", atoms: { B: 1, O: 3, H: 3 }, charge: 0 },
  "B(OH)4": { label: "B(OH)₄⁻", atoms: { B: 1, O: 4, H: 4 }, charge: -1 },
  CO2: { label: "CO₂", atoms: { C: 1, O: 2 }, charge: 0 },
} as const satisfies Record<string, { label: string; atoms: Atoms; charge: number }>;

export type Ion = keyof typeof IONS;
