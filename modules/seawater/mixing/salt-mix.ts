import { requireShareAboveZero, requireShareBelowOne } from "../validity";
import type { SaltBasis } from "../water/salt-content";

/** What the bag holds and what is meant by a salinity. */
export interface SaltMix {
  /** share of the mix, as weighed, that is water; it counts as water. 0 unless said */
  moistureFraction?: number;
  /** share of the dry mix that dissolves as salt; the rest is inert and settles. 1 unless said */
  purityFraction?: number;
  /** `reference` unless said */
  basis?: SaltBasis;
}

/** Shares of a kilogram of mix: salt, water, inert matter. */
export function sharesOf(mix: SaltMix): { salt: number; inert: number; basis: SaltBasis } {
  const dry = 1 - requireShareBelowOne("moistureFraction", mix.moistureFraction ?? 0);
  const purity = requireShareAboveZero("purityFraction", mix.purityFraction ?? 1);
  return { salt: dry * purity, inert: dry * (1 - purity), basis: mix.basis ?? "reference" };
}
