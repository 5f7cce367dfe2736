import { LENGTH_UNITS, type LengthUnit, VOLUME_UNITS, type VolumeUnit } from "../model";

/** The units in which a person reads and types; litres and metres unless they chose others. */
export type ReadingUnits = { length: LengthUnit; volume: VolumeUnit };

/** Takes a person's preferences (unit by dimension) as far as this module knows them. */
export function readingUnits(preferred: Readonly<Record<string, string>>): ReadingUnits {
  return {
    length: LENGTH_UNITS.find((unit) => unit === preferred.length) ?? "m",
    volume: VOLUME_UNITS.find((unit) => unit === preferred.volume) ?? "L",
  };
}

/** From here on litres are many digits for nothing: cubic metres are read. */
const CUBIC_METRES_FROM_L = 1000;

/**
 * In which unit is a volume shown to somebody? In the one they chose, else in cubic metres from 1000 L on. For a list ask
 * with its largest volume, so that one column has one unit.
 * @example shownVolumeUnit({}, 310_700) === "m³"
 */
export function shownVolumeUnit(
  preferred: Readonly<Record<string, string>>,
  largestL: number | null,
): VolumeUnit {
  const chosen = VOLUME_UNITS.find((unit) => unit === preferred.volume);
  return chosen ?? ((largestL ?? 0) >= CUBIC_METRES_FROM_L ? "m³" : "L");
}
