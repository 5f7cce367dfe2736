import {
  type Bounds,
  type LimitShape,
  type LimitsInForce,
  type LimitVersion,
  ORDERED_BOUNDS,
} from "../model";

const BOUND_NAMES = [...ORDERED_BOUNDS, "greatestChange24h"] as const;

/**
 * Which version of the limits is in force at a moment? The one that began last at or before it and has not ended;
 * of two that begin together the later version. Inclusive at its beginning, exclusive at its end.
 * @example versionInForce([{ version: 1, effectiveFromAt: 0, effectiveToAt: 10 }, { version: 2, effectiveFromAt: 10, effectiveToAt: null }], 10).version // => 2
 */
export function versionInForce(versions: readonly LimitVersion[], at: number): LimitVersion | null {
  let found: LimitVersion | null = null;
  for (const each of versions) {
    if (each.effectiveFromAt > at || (each.effectiveToAt !== null && each.effectiveToAt <= at)) continue;
    const later =
      found === null ||
      each.effectiveFromAt > found.effectiveFromAt ||
      (each.effectiveFromAt === found.effectiveFromAt && each.version > found.version);
    if (later) found = each;
  }
  return found;
}

/**
 * Which limits hold at a moment, or why none? `zone` is the facility's IANA zone; the season follows its calendar.
 * Throws RangeError for a shape without knots or an impossible month-day (`checkLimitShape` refuses both earlier).
 * @example limitsAt([], 0, "Europe/Dublin").state // => "none"
 */
export function limitsAt(versions: readonly LimitVersion[], at: number, zone: string): LimitsInForce {
  const found = versionInForce(versions, at);
  if (!found) return { state: "none" };
  const { id: versionId, version } = found;
  if (found.suspended) return { state: "suspended", versionId, version, reason: found.suspended.reason };
  return { state: "in-force", versionId, version, bounds: boundsAt(found.shape, at, zone) };
}

/**
 * The bounds of one shape at a moment. A ramp is linear between its knots and level before the first and after the
 * last; a season is linear between its days and wraps around the year, in the facility's wall time. A season's day
 * begins at 00:00; 29 February counts as 1 March in years without one.
 * @example boundsAt({ kind: "ramp", knots: [{ at: 0, bounds: { target: 12 } }, { at: 92, bounds: { target: 16 } }] }, 46, "UTC").target // => 14
 */
export function boundsAt(shape: LimitShape, at: number, zone: string): Bounds {
  switch (shape.kind) {
    case "constant":
      return shape.bounds;
    case "ramp":
      return between(
        shape.knots.map((knot) => ({ at: knot.at, bounds: knot.bounds })),
        at,
      );
    case "season": {
      const wall = wallTimeMs(at, zone);
      const year = new Date(wall).getUTCFullYear();
      const knots = [year - 1, year, year + 1].flatMap((each) =>
        shape.knots.map((knot) => ({ at: dayOfYearMs(knot.monthDay, each), bounds: knot.bounds })),
      );
      return between(knots, wall);
    }
  }
}

interface Knot {
  readonly at: number;
  readonly bounds: Bounds;
}

function between(unsorted: readonly Knot[], at: number): Bounds {
  const knots = [...unsorted].sort((a, b) => a.at - b.at);
  const before = knots.filter((knot) => knot.at <= at).at(-1);
  const after = knots.find((knot) => knot.at > at);
  const only = before ?? after;
  if (!only) throw new RangeError("A ramp or season needs at least one knot.");
  if (!before || !after) return only.bounds;
  const share = (at - before.at) / (after.at - before.at);
  const out: { -readonly [Name in keyof Bounds]: Bounds[Name] } = {};
  for (const name of BOUND_NAMES) {
    const from = before.bounds[name];
    const to = after.bounds[name];
    // a bound that only one knot states holds as stated, the stricter reading of an unlikely version
    const value = from === undefined || to === undefined ? (from ?? to) : from + (to - from) * share;
    if (value !== undefined) out[name] = value;
  }
  return out;
}

/** Midnight of "MM-DD" in a year, counted as if wall time were UTC. */
export function dayOfYearMs(monthDay: string, year: number): number {
  const [month, day] = parseMonthDay(monthDay);
  return Date.UTC(year, month - 1, day);
}

/** Month and day of "MM-DD"; throws RangeError for a day no year has. */
export function parseMonthDay(monthDay: string): [number, number] {
  const match = /^(\d{2})-(\d{2})$/.exec(monthDay);
  const month = Number(match?.[1]);
  const day = Number(match?.[2]);
  const date = new Date(Date.UTC(2024, month - 1, day));
  if (!match || date.getUTCMonth() !== month - 1 || date.getUTCDate() !== day) {
    throw new RangeError(`“${monthDay}” is not a day of the year. Write month and day, such as 03-21.`);
  }
  return [month, day];
}

const FORMATS = new Map<string, Intl.DateTimeFormat>();

/** The facility's wall time at a moment, as milliseconds counted as if it were UTC. */
function wallTimeMs(at: number, zone: string): number {
  let format = FORMATS.get(zone);
  if (!format) {
    format = new Intl.DateTimeFormat("en-GB", {
      timeZone: zone,
      hourCycle: "h23",
      year: "numeric",
      month: "numeric",
      day: "numeric",
      hour: "numeric",
      minute: "numeric",
      second: "numeric",
    });
    FORMATS.set(zone, format);
  }
  const part: Record<string, number> = {};
  for (const { type, value } of format.formatToParts(at)) part[type] = Number(value);
  const whole = Date.UTC(
    part.year ?? 0,
    (part.month ?? 1) - 1,
    part.day,
    part.hour,
    part.minute,
    part.second,
  );
  return whole + (((at % 1000) + 1000) % 1000);
}
