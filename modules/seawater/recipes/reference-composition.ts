import { saltContentGPerKg } from "../water/salt-content";
import type { Ion } from "./ions.data";
import {
  REFERENCE_COMPOSITION,
  REFERENCE_SALT_G_PER_MOL,
  type ReferenceIon,
} from "./reference-composition.data";

/** Constituents of seawater of reference composition. */
export const REFERENCE_IONS = Object.keys(REFERENCE_COMPOSITION) as readonly ReferenceIon[];

const isReferenceIon = (ion: Ion): ion is ReferenceIon => ion in REFERENCE_COMPOSITION;

/**
 * How much of one constituent does seawater of this salinity hold?
 *
 * Units: psu; answer in g/kg and mmol/kg. Throws RangeError outside 0 to 42 psu and for a constituent that the reference
 * composition does not have. Source: Millero et al. 2008. Checked: Na 10.78145 g/kg, 468.97 mmol/kg at 35.
 * @example referenceConstituent({ ion: "Ca", salinityPsu: 35 }).gPerKg // => 0.412085
 */
export function referenceConstituent(input: { ion: Ion; salinityPsu: number }): {
  gPerKg: number;
  mmolPerKg: number;
} {
  const { ion, salinityPsu } = input;
  if (!isReferenceIon(ion)) throw new RangeError(`ion ${ion} is not in the reference composition.`);
  const saltGPerKg = saltContentGPerKg({ salinityPsu });
  const { moleFraction, massFraction } = REFERENCE_COMPOSITION[ion];
  return {
    gPerKg: massFraction * saltGPerKg,
    mmolPerKg: (1000 * moleFraction * saltGPerKg) / REFERENCE_SALT_G_PER_MOL,
  };
}
