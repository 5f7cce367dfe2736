import { convertByFactor, findUnit, UnitError } from "@/lib/units/factors";
import type { FacilityParameter } from "@/modules/methods/model";
import type { Bounds, Qualifier, WatchRow } from "../model";

const MOST_DECIMALS = 9;

/** A value in another unit where a factor is enough; null where it needs more than that. */
export function inUnit(value: number, from: string | null, to: string | null): number | null {
  if (from === null || to === null || from === to) return value;
  try {
    return convertByFactor(value, from, to);
  } catch (error) {
    if (error instanceof UnitError) return null;
    throw error;
  }
}

type Measured = Pick<FacilityParameter, "unit" | "acceptedUnits">;

/**
 * In which unit does a person read and type this parameter? The one preferred for its dimension, where the parameter
 * accepts it and a factor is enough; null where nothing fits, so that the unit of the place stays.
 * @example preferredUnit({ temperature: "°F" }, { unit: "°C", acceptedUnits: ["°C", "°F"] }) // => "°F"
 */
export function preferredUnit(
  preferred: Readonly<Record<string, string>>,
  { unit, acceptedUnits }: Measured,
): string | null {
  if (unit === null) return null;
  const wanted = preferred[findUnit(unit)?.dimension ?? ""];
  if (wanted === undefined || !acceptedUnits.includes(wanted)) return null;
  return inUnit(0, unit, wanted) === null ? null : wanted;
}

/**
 * With how many decimals is a value shown in another unit? The fewest that are no coarser than the canonical ones:
 * a step of the last canonical digit is never hidden. 0 to 9.
 * @example decimalsIn(1, "°C", "°F") // => 1
 */
export function decimalsIn(decimals: number, from: string | null, to: string | null): number {
  const [zero, one] = [inUnit(0, from, to), inUnit(1, from, to)];
  if (zero === null || one === null || from === to) return decimals;
  const step = Math.abs(one - zero) * 10 ** -decimals;
  // an exact power of ten is not pushed over the edge by binary dust
  return Math.min(MOST_DECIMALS, Math.max(0, Math.ceil(-Math.log10(step) - 1e-9)));
}

/** The unit in which the parameter can be shown: the one that is wanted, or the canonical one. */
export function shownUnit(parameter: Pick<FacilityParameter, "unit">, wanted: string | null): string | null {
  if (wanted === null || parameter.unit === null) return parameter.unit;
  return inUnit(0, parameter.unit, wanted) === null ? parameter.unit : wanted;
}

/** The parameter as it is shown in a unit: its unit, decimals and plausible bounds. For showing only. */
export function parameterInUnit<P extends FacilityParameter>(parameter: P, wanted: string | null): P {
  const unit = shownUnit(parameter, wanted);
  if (unit === parameter.unit) return parameter;
  const to = (value: number | null) => (value === null ? null : inUnit(value, parameter.unit, unit));
  return {
    ...parameter,
    unit,
    decimals: decimalsIn(parameter.decimals, parameter.unit, unit),
    plausible: { low: to(parameter.plausible.low), high: to(parameter.plausible.high) },
  };
}

/**
 * A reading as it is shown in a unit. A detection limit is written with three significant figures, rounded to the side
 * on which the statement stays true ("<" up, ">" down). For showing only.
 */
export function readingInUnit<R extends { readonly value: number | null; readonly qualifier: Qualifier }>(
  reading: R,
  parameter: Pick<FacilityParameter, "unit">,
  wanted: string | null,
): R {
  const unit = shownUnit(parameter, wanted);
  if (reading.value === null || unit === parameter.unit) return reading;
  const value = inUnit(reading.value, parameter.unit, unit);
  if (value === null) return reading;
  return { ...reading, value: reading.qualifier === "" ? value : roundTruly(value, reading.qualifier) };
}

function roundTruly(value: number, qualifier: Qualifier): number {
  if (value === 0) return value;
  const place = Math.floor(Math.log10(Math.abs(value))) - 2;
  const steps = Number(`${value.toPrecision(12)}`) / 10 ** place;
  const whole = qualifier === "<" ? Math.ceil(steps - 1e-6) : Math.floor(steps + 1e-6);
  return Number(`${whole}e${place}`);
}

function boundsInUnit(bounds: Bounds, from: string | null, to: string | null): Bounds {
  const { greatestChange24h, ...levels } = bounds;
  const zero = inUnit(0, from, to) ?? 0;
  const shown = Object.entries(levels).map(([name, value]) => [name, inUnit(value, from, to) ?? value]);
  const change = greatestChange24h === undefined ? null : inUnit(greatestChange24h, from, to);
  return {
    ...(Object.fromEntries(shown) as Bounds),
    // a difference has no zero point of its own
    ...(change === null ? {} : { greatestChange24h: change - zero }),
  };
}

/**
 * A row as it is shown in a unit: figures, limits, plausible bounds and decimals; untouched where more than a factor is
 * needed. For showing only: what is judged and sent rests on the canonical row.
 */
export function rowInUnit(row: WatchRow, wanted: string | null): WatchRow {
  const { parameter, limits } = row;
  const unit = shownUnit(parameter, wanted);
  if (unit === parameter.unit) return row;
  return {
    ...row,
    unit,
    parameter: parameterInUnit(parameter, unit),
    limits:
      limits.state === "in-force"
        ? { ...limits, bounds: boundsInUnit(limits.bounds, parameter.unit, unit) }
        : limits,
    recent: row.recent.map((each) => readingInUnit(each, parameter, unit)),
  };
}
