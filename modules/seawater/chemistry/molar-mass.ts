import { ATOMIC_WEIGHTS, type Element } from "./atomic-weights.data";

/** How many atoms of each element one formula unit has. */
export type Atoms = Partial<Record<Element, number>>;

/**
 * What does a mole of this substance weigh?
 *
 * Units: atoms per formula unit; answer in g/mol. Source: CIAAW abridged atomic weights 2021.
 * Checked: calcium carbonate 100.086.
 * @example molarMassGPerMol({ Ca: 1, C: 1, O: 3 }) // => 100.086
 */
export function molarMassGPerMol(atoms: Atoms): number {
  let total = 0;
  for (const [element, count] of Object.entries(atoms)) total += ATOMIC_WEIGHTS[element as Element] * count;
  return total;
}

/** g/mol of water. */
export const WATER_G_PER_MOL = molarMassGPerMol({ H: 2, O: 1 });
