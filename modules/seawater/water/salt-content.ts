import { requireWithin } from "../validity";
import { PRACTICAL_SALINITY_RANGE } from "./salinity";

/** Grams of salt per kilogram of seawater of reference composition at practical salinity 35 (Millero et al. 2008). */
export const REFERENCE_SALT_AT_35_G_PER_KG = 35.16504;

/**
 * What is weighed to reach a salinity: `reference` takes the salt that seawater of reference composition holds
 * (35.16504 g/kg at 35); `nominal` takes the salinity itself as g/kg, which is 0.47 % less salt.
 */
export type SaltBasis = "reference" | "nominal";

export const SALT_BASES = ["reference", "nominal"] as const satisfies readonly SaltBasis[];

const perPsu = (basis: SaltBasis) => (basis === "reference" ? REFERENCE_SALT_AT_35_G_PER_KG / 35 : 1);

/**
 * How many grams of dry salt are in a kilogram of water of this salinity?
 *
 * Units: psu; answer in g/kg. Domain: 0 to 42 psu, else RangeError.
 * Source: Millero, Feistel, Wright and McDougall 2008, Deep-Sea Res. I 55, 50-72. Checked: 35.16504 at 35.
 * @example saltContentGPerKg({ salinityPsu: 35 }) // => 35.16504
 */
export function saltContentGPerKg(input: { salinityPsu: number; basis?: SaltBasis }): number {
  const { salinityPsu, basis = "reference" } = input;
  requireWithin("salinityPsu", salinityPsu, PRACTICAL_SALINITY_RANGE.salinityPsu, "practical salinity");
  return salinityPsu * perPsu(basis);
}

/**
 * Which salinity do so many grams of dry salt in a kilogram of water make? (Inverse of saltContentGPerKg.)
 *
 * Units: g/kg; answer in psu. Domain: up to 42 psu, else RangeError. Source: as saltContentGPerKg.
 * @example salinityFromSaltContent({ saltContentGPerKg: 35, basis: "nominal" }) // => 35
 */
export function salinityFromSaltContent(input: { saltContentGPerKg: number; basis?: SaltBasis }): number {
  const salinityPsu = input.saltContentGPerKg / perPsu(input.basis ?? "reference");
  return requireWithin(
    "salinityPsu",
    salinityPsu,
    PRACTICAL_SALINITY_RANGE.salinityPsu,
    "practical salinity",
  );
}
