import { convertByFactor } from "@/lib/units/factors";
import type { Measured, VolumeUnit } from "../model";

/**
 * With how many decimals is a volume shown that has no uncertainty beside it? Four significant figures, at most three decimals.
 *
 * @example volumeDecimals(310.4) // 1
 * @example volumeDecimals(27810) // 0
 */
export function volumeDecimals(value: number): number {
  return decimalsFor(value, 4);
}

/** So many decimals that a number keeps its significant figures; 0 to 3. */
function decimalsFor(value: number, figures: number): number {
  if (value === 0) return 0;
  const magnitude = Math.floor(Math.log10(Math.abs(value)));
  return Math.min(3, Math.max(0, figures - 1 - magnitude));
}

export type ShownVolume = { value: number; expanded: number; decimals: number };

/**
 * A volume in the unit that a person reads, with its expanded uncertainty (k = 2) to two significant figures and the volume
 * to the same decimal (GUM 7.2.6).
 */
export function shownVolume(volumeL: Measured, unit: VolumeUnit): ShownVolume {
  const value = convertByFactor(volumeL.value, "L", unit);
  const expanded = convertByFactor(2 * volumeL.standardUncertainty, "L", unit);
  return { value, expanded, decimals: expanded === 0 ? volumeDecimals(value) : decimalsFor(expanded, 2) };
}
