import { requirePositive } from "../validity";
import { densityKgPerM3 } from "../water/density";
import { salinityFromSaltContent, saltContentGPerKg } from "../water/salt-content";
import { type SaltMix, sharesOf } from "./salt-mix";

/** Half a US cup and a US gallon, in the units used here (exact). */
export const HALF_US_CUP_ML = 118.29411825;
export const US_GALLON_L = 3.785411784;

const waterGrams = (waterL: number, temperatureC: number) =>
  waterL * densityKgPerM3({ salinityPsu: 0, temperatureC });

/**
 * Which salinity comes of a measuring cup of salt mix in so much water? It hangs on the bulk density of the mix: half a
 * US cup in a US gallon gives 30 to 39 over plausible mixes. Weigh instead.
 *
 * Units: mL of mix, g/mL, L of pure water, °C, shares; answer in psu. Throws RangeError above 42 psu and for amounts not
 * above zero. Source: mass balance; the rule itself is common practice, no source. Checked: computed with mpmath (33.328).
 * @example salinityFromMeasuredMix({ mixMl: 118.29411825, bulkDensityGPerMl: 1.1, waterL: 3.785411784, temperatureC: 25, basis: "nominal" }) // => 33.328
 */
export function salinityFromMeasuredMix(
  input: SaltMix & { mixMl: number; bulkDensityGPerMl: number; waterL: number; temperatureC: number },
): number {
  const { salt, inert, basis } = sharesOf(input);
  const mixG =
    requirePositive("mixMl", input.mixMl) * requirePositive("bulkDensityGPerMl", input.bulkDensityGPerMl);
  const waterG = waterGrams(requirePositive("waterL", input.waterL), input.temperatureC);
  return salinityFromSaltContent({
    saltContentGPerKg: (1000 * salt * mixG) / (waterG + mixG * (1 - inert)),
    basis,
  });
}

/**
 * At which bulk density of the mix does a measuring cup give a wanted salinity? (Inverse of salinityFromMeasuredMix.)
 *
 * Units: psu, mL, L, °C; answer in g/mL. Throws RangeError as above. Source: mass balance. Checked: computed (1.16285).
 * @example bulkDensityForMeasuredMixGPerMl({ salinityPsu: 35, mixMl: 118.29411825, waterL: 3.785411784, temperatureC: 25 }) // => 1.16285
 */
export function bulkDensityForMeasuredMixGPerMl(
  input: SaltMix & { salinityPsu: number; mixMl: number; waterL: number; temperatureC: number },
): number {
  const { salt, inert, basis } = sharesOf(input);
  const s = saltContentGPerKg({ salinityPsu: input.salinityPsu, basis }) / 1000;
  const waterG = waterGrams(requirePositive("waterL", input.waterL), input.temperatureC);
  const beyond = requirePositive("salt in the mix beyond the target", salt - s * (1 - inert));
  return (s * waterG) / beyond / requirePositive("mixMl", input.mixMl);
}
