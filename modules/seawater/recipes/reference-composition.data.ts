import type { Ion } from "./ions.data";

/** Mean molar mass of the salt of reference composition, g/mol. */
export const REFERENCE_SALT_G_PER_MOL = 31.4038218;

/**
 * Reference composition of seawater: mole and mass fractions of the dissolved salt. Millero, Feistel, Wright and
 * McDougall 2008, Deep-Sea Res. I 55, 50-72 (mole fractions from memory; they reproduce the published mass fractions to
 * 1e-7, add up to 1, and are neutral).
 */
export const REFERENCE_COMPOSITION = {
  Na: { moleFraction: 0.4188071, massFraction: 0.3065958 },
  Mg: { moleFraction: 0.0471678, massFraction: 0.0365055 },
  Ca: { moleFraction: 0.0091823, massFraction: 0.0117186 },
  K: { moleFraction: 0.0091159, massFraction: 0.0113495 },
  Sr: { moleFraction: 0.000081, massFraction: 0.000226 },
  Cl: { moleFraction: 0.4874839, massFraction: 0.5503396 },
  SO4: { moleFraction: 0.0252152, massFraction: 0.0771319 },
  HCO3: { moleFraction: 0.001534, massFraction: 0.0029805 },
  Br: { moleFraction: 0.000752, massFraction: 0.0019134 },
  CO3: { moleFraction: 0.0002134, massFraction: 0.0004078 },
  "B(OH)4": { moleFraction: 0.00009, massFraction: 0.0002259 },
  F: { moleFraction: 0.000061, massFraction: 0.0000369 },
  OH: { moleFraction: 0.0000071, massFraction: 0.0000038 },
  "B(OH)3": { moleFraction: 0.0002807, massFraction: 0.0005527 },
  CO2: { moleFraction: 0.0000086, massFraction: 0.0000121 },
} as const satisfies Partial<Record<Ion, { moleFraction: number; massFraction: number }>>;

export type ReferenceIon = keyof typeof REFERENCE_COMPOSITION;
