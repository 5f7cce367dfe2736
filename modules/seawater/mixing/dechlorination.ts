import { ATOMIC_WEIGHTS } from "../chemistry/atomic-weights.data";
import { type Atoms, molarMassGPerMol } from "../chemistry/molar-mass";
import { requireNotNegative, requirePositive, requireShareAboveZero, requireWithin } from "../validity";

/** Grams per mole of chlorine, Cl2, in which residuals are stated. */
const CHLORINE_G_PER_MOL = 2 * ATOMIC_WEIGHTS.Cl;

/**
 * Reducing agents with the moles that take up one mole of Cl2. Thiosulfate goes as far as pH, time and excess let it: at pH 8
 * and quickly two moles are used (to tetrathionate, 7.0 g/g, the careful figure and the default); one mole (to sulfate
 * and sulfur, 3.5 g/g) is the usual figure at pH below 7; a quarter (to sulfate, 0.88 g/g) needs excess chlorine.
 */
export const DECHLORINATORS = {
  "thiosulfate-to-tetrathionate": { atoms: { Na: 2, S: 2, O: 8, H: 10 }, molPerMolCl2: 2 },
  "thiosulfate-to-sulfur": { atoms: { Na: 2, S: 2, O: 8, H: 10 }, molPerMolCl2: 1 },
  "thiosulfate-to-sulfate": { atoms: { Na: 2, S: 2, O: 8, H: 10 }, molPerMolCl2: 0.25 },
  "ascorbic-acid": { atoms: { C: 6, H: 8, O: 6 }, molPerMolCl2: 1 },
  "sodium-ascorbate": { atoms: { C: 6, H: 7, O: 6, Na: 1 }, molPerMolCl2: 1 },
  "sodium-sulfite": { atoms: { Na: 2, S: 1, O: 3 }, molPerMolCl2: 1 },
  "sodium-bisulfite": { atoms: { Na: 1, H: 1, S: 1, O: 3 }, molPerMolCl2: 1 },
  "sodium-metabisulfite": { atoms: { Na: 2, S: 2, O: 5 }, molPerMolCl2: 0.5 },
} as const satisfies Record<string, { atoms: Atoms; molPerMolCl2: number }>;

export type Dechlorinator = keyof typeof DECHLORINATORS;

/**
 * How many grams of the agent take up a gram of chlorine? Thiosulfate as the pentahydrate.
 *
 * Units: g per g of Cl2. Source: stoichiometry of the reaction named. Checked: ascorbic acid 2.5 parts (common practice).
 * @example dechlorinatorGPerG("ascorbic-acid") // => 2.484
 */
export function dechlorinatorGPerG(agent: Dechlorinator): number {
  const { atoms, molPerMolCl2 } = DECHLORINATORS[agent];
  return (molPerMolCl2 * molarMassGPerMol(atoms)) / CHLORINE_G_PER_MOL;
}

export interface Dechlorination {
  massG: number;
  /** set free from chloramine, which the agent does not remove */
  ammoniaReleasedMgNPerL: number;
}

/**
 * How much of a reducing agent takes the chlorine out of this water? A proposal: test for total chlorine afterwards, and
 * aerate, for sulfites take up oxygen too.
 *
 * Units: L, mg/L total chlorine as Cl2, share of it that is (mono)chloramine, excess as a share of the need, purity. Answer: g of
 * the agent, and the ammonia that chloramine leaves behind (one N per Cl2, 0.1975 mg per mg). Throws RangeError for values
 * outside. Source: stoichiometry; Standard Methods 4500-Cl for the counting as Cl2. Checked: molar masses by hand.
 * @example dechlorination({ volumeL: 1000, totalChlorineMgPerL: 2, agent: "thiosulfate-to-tetrathionate" }).massG // => 14.00
 */
export function dechlorination(input: {
  volumeL: number;
  totalChlorineMgPerL: number;
  agent?: Dechlorinator;
  chloramineFraction?: number;
  excessFraction?: number;
  purityFraction?: number;
}): Dechlorination {
  const { agent = "thiosulfate-to-tetrathionate", chloramineFraction = 0 } = input;
  const { excessFraction = 0, purityFraction = 1 } = input;
  const chlorine = requireNotNegative("totalChlorineMgPerL", input.totalChlorineMgPerL);
  requireWithin("chloramineFraction", chloramineFraction, { min: 0, max: 1, unit: "" }, "a share");
  const needG = (requirePositive("volumeL", input.volumeL) * chlorine * dechlorinatorGPerG(agent)) / 1000;
  const withExcess = needG * (1 + requireNotNegative("excessFraction", excessFraction));
  return {
    massG: withExcess / requireShareAboveZero("purityFraction", purityFraction),
    ammoniaReleasedMgNPerL: (chlorine * chloramineFraction * ATOMIC_WEIGHTS.N) / CHLORINE_G_PER_MOL,
  };
}
