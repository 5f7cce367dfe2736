import { convertByFactor } from "@/lib/units/factors";
import type { Measured, VolumeUnit } from "../model";

/** A number rounded for showing, and the decimals that it is shown with. */
export type ShownNumber = { value: number; decimals: number };

const MOST_DECIMALS = 3;

/** The place (power of ten) of the last of so many significant figures; no finer than three decimals. */
function lastPlace(value: number, figures: number): number {
  const first = Math.floor(Math.log10(Math.abs(value)));
  return Math.max(-MOST_DECIMALS, first - figures + 1);
}

/** Rounds to a power of ten by way of its decimal text, so that no binary tail is left. */
function roundedAt(value: number, place: number): ShownNumber {
  return {
    value: Number(`${Math.round(Number(`${value}e${-place}`))}e${place}`),
    decimals: Math.max(0, -place),
  };
}

/**
 * How is a volume shown that has no uncertainty beside it? To four significant figures, at most three decimals.
 *
 * @example plainVolume(303185) // { value: 303200, decimals: 0 }
 */
export function plainVolume(value: number): ShownNumber {
  if (value === 0) return { value, decimals: 0 };
  return roundedAt(value, lastPlace(value, 4));
}

/**
 * A volume in the unit that a person reads, with its expanded uncertainty (k = 2) to two significant figures and the
 * volume to the same place (JCGM 100:2008, 7.2.6). `expanded` is 0 where no uncertainty is given.
 */
export function shownVolume(volumeL: Measured, unit: VolumeUnit): ShownNumber & { expanded: number } {
  const value = convertByFactor(volumeL.value, "L", unit);
  const expanded = convertByFactor(2 * volumeL.standardUncertainty, "L", unit);
  if (expanded === 0) return { ...plainVolume(value), expanded };
  const place = lastPlace(expanded, 2);
  return { ...roundedAt(value, place), expanded: roundedAt(expanded, place).value };
}
