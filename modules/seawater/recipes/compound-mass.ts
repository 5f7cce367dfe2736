import { type Atoms, molarMassGPerMol, WATER_G_PER_MOL } from "../chemistry/molar-mass";
import { requireNotNegative } from "../validity";
import { COMPOUNDS, type Compound } from "./compounds.data";
import { IONS, type Ion } from "./ions.data";

/** Which ions a formula unit of a compound gives, as a list. */
export function ionsOf(compound: Compound): readonly (readonly [Ion, number])[] {
  return Object.entries(COMPOUNDS[compound].ions) as [Ion, number][];
}

/** g/mol of an ion. */
export function ionGPerMol(ion: Ion): number {
  const atoms: Atoms = IONS[ion].atoms;
  return molarMassGPerMol(atoms);
}

/**
 * What does a mole of this compound weigh with its water of crystallisation?
 *
 * Units: moles of water per mole of salt; answer in g/mol. Throws RangeError for a negative number of waters. Source:
 * atomic weights (CIAAW abridged 2021). Checked: MgCl2·6H2O 203.295, CaCl2·2H2O 147.008, MgSO4·7H2O 246.466.
 * @example compoundGPerMol({ compound: "MgCl2", hydrationWaters: 6 }) // => 203.295
 */
export function compoundGPerMol(input: { compound: Compound; hydrationWaters?: number }): number {
  const waters = requireNotNegative("hydrationWaters", input.hydrationWaters ?? 0);
  const salt = ionsOf(input.compound).reduce((total, [ion, count]) => total + count * ionGPerMol(ion), 0);
  return salt + waters * WATER_G_PER_MOL;
}
