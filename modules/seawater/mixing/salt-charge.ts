import { requireNotNegative, requirePositive } from "../validity";
import { densityKgPerM3 } from "../water/density";
import { saltContentGPerKg } from "../water/salt-content";
import { type SaltMix, sharesOf } from "./salt-mix";

/** Water left in the tank from before. */
export interface Heel {
  volumeL: number;
  salinityPsu: number;
  temperatureC: number;
}

export interface SaltCharge {
  mixKg: number;
  waterKg: number;
  /** at the batch's temperature */
  waterL: number;
  /** finished water, without what settles */
  finishedKg: number;
  finishedL: number;
  /** inert matter that settles */
  inertKg: number;
  heelKg: number;
}

const massKg = (volumeL: number, salinityPsu: number, temperatureC: number) =>
  (densityKgPerM3({ salinityPsu, temperatureC }) * volumeL) / 1000;
const pureWaterKgPerL = (temperatureC: number) => massKg(1, 0, temperatureC);

/**
 * How much salt mix and purified water make a tank of this volume, salinity and temperature, on top of what is left in
 * it? A proposal: a person weighs, checks and signs.
 *
 * Units: L of finished water at its temperature, psu, °C, shares; answer in kg and L. Formula: finished mass M = ρ V;
 * salt M s − m_heel s_heel = mix (1 − w) purity; water fills up. The mix's moisture counts as water, its inert matter
 * settles out of the finished water. Throws RangeError outside EOS-80, for a volume not above zero, and for a heel that
 * is already too salt or too large. Source: mass balance, EOS-80. Checked: computed with mpmath (35.98584 kg).
 * @example saltCharge({ volumeL: 1000, salinityPsu: 35, temperatureC: 25 }).mixKg // => 35.9858
 */
export function saltCharge(
  input: SaltMix & { volumeL: number; salinityPsu: number; temperatureC: number; heel?: Heel },
): SaltCharge {
  const { volumeL, salinityPsu, temperatureC, heel } = input;
  requirePositive("volumeL", volumeL);
  const { salt, inert, basis } = sharesOf(input);
  const finishedKg = massKg(volumeL, salinityPsu, temperatureC);
  const heelKg = heel
    ? massKg(requireNotNegative("heel.volumeL", heel.volumeL), heel.salinityPsu, heel.temperatureC)
    : 0;
  const heelSaltKg = heel ? (heelKg * saltContentGPerKg({ salinityPsu: heel.salinityPsu, basis })) / 1000 : 0;
  const saltKg = (finishedKg * saltContentGPerKg({ salinityPsu, basis })) / 1000 - heelSaltKg;
  if (saltKg < -1e-9 * finishedKg) {
    throw new RangeError("The heel alone holds more salt than the finished water: drain some, then dilute.");
  }
  const mixKg = Math.max(0, saltKg) / salt;
  const inertKg = mixKg * inert;
  const waterKg = finishedKg - heelKg - mixKg + inertKg;
  if (waterKg < -1e-9 * finishedKg) {
    throw new RangeError("The heel and the salt together are more than the volume to be made.");
  }
  return {
    mixKg,
    waterKg: Math.max(0, waterKg),
    waterL: Math.max(0, waterKg) / pureWaterKgPerL(temperatureC),
    finishedKg,
    finishedL: volumeL,
    inertKg,
    heelKg,
  };
}

/**
 * How much salt mix goes into this much purified water, and how much water does it become?
 *
 * Units: L of purified water at the temperature, psu, °C, shares; answer in kg and L. Formula: mix (1 − w) purity =
 * s (m_w + mix − inert). Throws RangeError outside EOS-80, for a volume not above zero, and for a mix too wet to reach
 * the salinity. Source: mass balance, EOS-80. Checked: computed with mpmath (36.33904 kg).
 * @example saltForWater({ waterL: 1000, salinityPsu: 35, temperatureC: 25 }).mixKg // => 36.33904
 */
export function saltForWater(
  input: SaltMix & { waterL: number; salinityPsu: number; temperatureC: number },
): SaltCharge {
  const { waterL, salinityPsu, temperatureC } = input;
  requirePositive("waterL", waterL);
  const { salt, inert, basis } = sharesOf(input);
  const s = saltContentGPerKg({ salinityPsu, basis }) / 1000;
  const waterKg = waterL * pureWaterKgPerL(temperatureC);
  const mixKg = (s * waterKg) / requirePositive("salt in the mix beyond the target", salt - s * (1 - inert));
  const inertKg = mixKg * inert;
  const finishedKg = waterKg + mixKg - inertKg;
  const finishedL = finishedKg / massKg(1, salinityPsu, temperatureC);
  return { mixKg, waterKg, waterL, finishedKg, finishedL, inertKg, heelKg: 0 };
}
