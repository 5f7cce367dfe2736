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
