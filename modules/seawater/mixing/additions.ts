import { ATOMIC_WEIGHTS } from "../chemistry/atomic-weights.data";
import { compoundGPerMol, ionsOf } from "../recipes/compound-mass";
import type { Compound } from "../recipes/compounds.data";
import type { Ion } from "../recipes/ions.data";
import { requireNotNegative, requirePositive, requireShareAboveZero } from "../validity";

/** What an addition raises. */
export type Raised = "alkalinity" | "calcium" | "magnesium";

/** The usual compounds for each, with their water of crystallisation. */
export const ADDITIVES = {
  NaHCO3: { raises: "alkalinity", compound: "NaHCO3", hydrationWaters: 0 },
  Na2CO3: { raises: "alkalinity", compound: "Na2CO3", hydrationWaters: 0 },
  KHCO3: { raises: "alkalinity", compound: "KHCO3", hydrationWaters: 0 },
  CaCl2: { raises: "calcium", compound: "CaCl2", hydrationWaters: 0 },
  "CaCl2.2H2O": { raises: "calcium", compound: "CaCl2", hydrationWaters: 2 },
  "CaCl2.6H2O": { raises: "calcium", compound: "CaCl2", hydrationWaters: 6 },
  MgCl2: { raises: "magnesium", compound: "MgCl2", hydrationWaters: 0 },
  "MgCl2.6H2O": { raises: "magnesium", compound: "MgCl2", hydrationWaters: 6 },
  MgSO4: { raises: "magnesium", compound: "MgSO4", hydrationWaters: 0 },
  "MgSO4.7H2O": { raises: "magnesium", compound: "MgSO4", hydrationWaters: 7 },
} as const satisfies Record<string, { raises: Raised; compound: Compound; hydrationWaters: number }>;

export type Additive = keyof typeof ADDITIVES;
type AdditiveFor<Kind extends Raised> = {
  [Key in Additive]: (typeof ADDITIVES)[Key]["raises"] extends Kind ? Key : never;
}[Additive];

export type AlkalinityAdditive = AdditiveFor<"alkalinity">;
export type CalciumAdditive = AdditiveFor<"calcium">;
export type MagnesiumAdditive = AdditiveFor<"magnesium">;

interface Addition {
  volumeL: number;
  /** share of what is weighed that is the compound; 1 unless said */
  purityFraction?: number;
}

/** Equivalents of alkalinity per mole of ion. */
const ALKALINITY_OF: Partial<Record<Ion, number>> = { HCO3: 1, CO3: 2 };

function requireKind(additive: Additive, kind: Raised): (typeof ADDITIVES)[Additive] {
  const found = ADDITIVES[additive];
  if (found.raises !== kind) throw new RangeError(`${additive} does not raise ${kind}.`);
  return found;
}

function grams(mol: number, additive: (typeof ADDITIVES)[Additive], purityFraction = 1): number {
  return (mol * compoundGPerMol(additive)) / requireShareAboveZero("purityFraction", purityFraction);
}

/**
 * How much of a carbonate raises the alkalinity of this water so much? A proposal: add slowly, dissolved, and measure.
 *
 * Units: L, meq/L, share; answer in g. Throws RangeError for a volume not above zero, a negative rise, a compound of another
 * kind. No precipitation. Source: stoichiometry. Checked: computed (84.006 g NaHCO3, 52.994 g Na2CO3 per equivalent).
 * @example alkalinityAdditionG({ volumeL: 1000, riseMeqPerL: 0.5, additive: "NaHCO3" }) // => 42.003
 */
export function alkalinityAdditionG(
  input: Addition & { riseMeqPerL: number; additive: AlkalinityAdditive },
): number {
  const additive = requireKind(input.additive, "alkalinity");
  const equivalents = ionsOf(additive.compound).reduce(
    (total, [ion, count]) => total + count * (ALKALINITY_OF[ion] ?? 0),
    0,
  );
  const rise = requireNotNegative("riseMeqPerL", input.riseMeqPerL) / 1000;
  return grams(
    (requirePositive("volumeL", input.volumeL) * rise) / equivalents,
    additive,
    input.purityFraction,
  );
}

function elementAdditionG(
  input: Addition & { riseMgPerL: number; additive: Additive },
  kind: Raised,
  gPerMol: number,
): number {
  const additive = requireKind(input.additive, kind);
  const rise = requireNotNegative("riseMgPerL", input.riseMgPerL) / 1000;
  return grams((requirePositive("volumeL", input.volumeL) * rise) / gPerMol, additive, input.purityFraction);
}

/**
 * How much calcium chloride raises the calcium of this water so much? (It heats the water it is dissolved in.)
 *
 * Units: L, mg/L of calcium, share; answer in g. Throws RangeError as alkalinityAdditionG. Source: stoichiometry.
 * Checked: computed (73.36095 g of the dihydrate).
 * @example calciumAdditionG({ volumeL: 1000, riseMgPerL: 20, additive: "CaCl2.2H2O" }) // => 73.361
 */
export function calciumAdditionG(
  input: Addition & { riseMgPerL: number; additive: CalciumAdditive },
): number {
  return elementAdditionG(input, "calcium", ATOMIC_WEIGHTS.Ca);
}

/**
 * How much magnesium chloride or sulfate raises the magnesium of this water so much?
 *
 * Units: L, mg/L of magnesium, share; answer in g. Throws RangeError as alkalinityAdditionG. Source: stoichiometry.
 * Checked: computed (418.2164 g of the chloride hexahydrate).
 * @example magnesiumAdditionG({ volumeL: 1000, riseMgPerL: 50, additive: "MgCl2.6H2O" }) // => 418.216
 */
export function magnesiumAdditionG(
  input: Addition & { riseMgPerL: number; additive: MagnesiumAdditive },
): number {
  return elementAdditionG(input, "magnesium", ATOMIC_WEIGHTS.Mg);
}
