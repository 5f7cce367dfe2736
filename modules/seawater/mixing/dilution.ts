import { requirePositive } from "../validity";
import { densityKgPerM3 } from "../water/density";
import { saltContentGPerKg } from "../water/salt-content";
import { type SaltMix, sharesOf } from "./salt-mix";

const kgPerL = (salinityPsu: number, temperatureC: number) =>
  densityKgPerM3({ salinityPsu, temperatureC }) / 1000;

export interface SalinityChange {
  volumeL: number;
  fromSalinityPsu: number;
  toSalinityPsu: number;
  temperatureC: number;
}

/**
 * How much purified water brings this water down to a salinity, if none is taken out first?
 *
 * Units: L, psu, °C; answer in kg and L. Throws RangeError unless the target is above zero and not above the start, and
 * outside EOS-80. Formula: salt is kept, m_w = m1 (S1/S2 − 1). Source: mass balance. Checked: computed with mpmath
 * (88.16989 L; the shortcut by volumes says 85.7).
 * @example waterToDilute({ volumeL: 1000, fromSalinityPsu: 38, toSalinityPsu: 35, temperatureC: 25 }).waterL // => 88.17
 */
export function waterToDilute(input: SalinityChange): { waterKg: number; waterL: number; finishedL: number } {
  const { volumeL, fromSalinityPsu, toSalinityPsu, temperatureC } = input;
  requirePositive("volumeL", volumeL);
  requirePositive("toSalinityPsu", toSalinityPsu);
  if (toSalinityPsu > fromSalinityPsu) {
    throw new RangeError(
      "toSalinityPsu must not be above fromSalinityPsu: water alone does not raise salinity.",
    );
  }
  const startKg = volumeL * kgPerL(fromSalinityPsu, temperatureC);
  const waterKg = startKg * (fromSalinityPsu / toSalinityPsu - 1);
  return {
    waterKg,
    waterL: waterKg / kgPerL(0, temperatureC),
    finishedL: (startKg + waterKg) / kgPerL(toSalinityPsu, temperatureC),
  };
}

/**
 * How much salt mix brings this water up to a salinity?
 *
 * Units: L, psu, °C, shares; answer in kg and L. Throws RangeError when the target is below the start, outside EOS-80, and
 * for a mix too wet. Formula: m1 s1 + mix (1 − w) purity = s2 (m1 + mix − inert). Source: mass balance.
 * Checked: computed with mpmath (3.189843 kg).
 * @example saltToRaise({ volumeL: 1000, fromSalinityPsu: 32, toSalinityPsu: 35, temperatureC: 25 }).mixKg // => 3.18984
 */
export function saltToRaise(input: SalinityChange & SaltMix): {
  mixKg: number;
  inertKg: number;
  finishedKg: number;
  finishedL: number;
} {
  const { volumeL, fromSalinityPsu, toSalinityPsu, temperatureC } = input;
  requirePositive("volumeL", volumeL);
  if (toSalinityPsu < fromSalinityPsu) {
    throw new RangeError("toSalinityPsu must not be below fromSalinityPsu: salt does not lower salinity.");
  }
  const { salt, inert, basis } = sharesOf(input);
  const s1 = saltContentGPerKg({ salinityPsu: fromSalinityPsu, basis }) / 1000;
  const s2 = saltContentGPerKg({ salinityPsu: toSalinityPsu, basis }) / 1000;
  const startKg = volumeL * kgPerL(fromSalinityPsu, temperatureC);
  const beyond = requirePositive("salt in the mix beyond the target", salt - s2 * (1 - inert));
  const mixKg = (startKg * (s2 - s1)) / beyond;
  const inertKg = mixKg * inert;
  const finishedKg = startKg + mixKg - inertKg;
  return { mixKg, inertKg, finishedKg, finishedL: finishedKg / kgPerL(toSalinityPsu, temperatureC) };
}

/**
 * How much water evaporated when salinity rose from one value to another, and how much tops it up?
 *
 * Units: L before, psu, °C; answer in kg and L of pure water at that temperature. Throws RangeError unless salinity rose
 * from above zero, and outside EOS-80. Formula: salt is kept, m_e = m1 (1 − S1/S2). Source: mass balance.
 * Checked: computed with mpmath (28.51035 L).
 * @example evaporation({ volumeL: 1000, fromSalinityPsu: 35, toSalinityPsu: 36, temperatureC: 25 }).topUpL // => 28.5104
 */
export function evaporation(input: SalinityChange): { lostKg: number; topUpL: number } {
  const { volumeL, fromSalinityPsu, toSalinityPsu, temperatureC } = input;
  requirePositive("volumeL", volumeL);
  requirePositive("fromSalinityPsu", fromSalinityPsu);
  if (toSalinityPsu < fromSalinityPsu) {
    throw new RangeError("toSalinityPsu must not be below fromSalinityPsu: evaporation raises salinity.");
  }
  densityKgPerM3({ salinityPsu: toSalinityPsu, temperatureC });
  const lostKg = volumeL * kgPerL(fromSalinityPsu, temperatureC) * (1 - fromSalinityPsu / toSalinityPsu);
  return { lostKg, topUpL: lostKg / kgPerL(0, temperatureC) };
}
