import { Temporal } from "temporal-polyfill";

/** A calendar day and a time of day as a clock on the facility's wall shows them. */
export type LocalMoment = {
  /** "YYYY-MM-DD" */
  on: string;
  /** "HH:MM", or with ":SS" or ":SS.mmm" where the moment has them; reads back as the same moment. */
  at: string;
  /** The zone's distance from UTC at that moment: "+01:00". */
  offset: string;
};

/** One of the moments that a local time can mean. */
export type MomentCandidate = { epochMs: number; offset: string };

/**
 * What a local day and time mean in a zone.
 * `one`: exactly one moment. `doubled`: the clock showed it twice (clocks went back), both are named.
 * `missing`: the clock never showed it (clocks went forward); the candidates are the same distance before
 * the gap's end and after its start, i.e. the time read with the offset after and before the change.
 */
export type LocalReading =
  | { kind: "one"; epochMs: number; offset: string }
  | { kind: "doubled"; earlier: MomentCandidate; later: MomentCandidate }
  | { kind: "missing"; earlier: MomentCandidate; later: MomentCandidate };

/** How to settle a doubled hour once a person has said; without it the two are reported. */
export type Disambiguation = "earlier" | "later";

const DAY = /^\d{4}-\d{2}-\d{2}$/;
const TIME = /^([01]\d|2[0-3]):([0-5]\d)(?::([0-5]\d)(?:\.(\d{1,3}))?)?$/;
const MS_OF_DAY = 86_400_000;

function parseDay(on: string): Temporal.PlainDate {
  if (!DAY.test(on)) throw new RangeError(`"${on}" is not a day written YYYY-MM-DD`);
  return Temporal.PlainDate.from(on, { overflow: "reject" });
}

function parseTimeMs(at: string): number {
  const found = TIME.exec(at);
  if (!found) throw new RangeError(`"${at}" is not a time of day written HH:MM, HH:MM:SS or HH:MM:SS.mmm`);
  const [, hour, minute, second = "0", fraction = "0"] = found;
  return (
    Number(hour) * 3_600_000 +
    Number(minute) * 60_000 +
    Number(second) * 1000 +
    Number(fraction.padEnd(3, "0"))
  );
}

/** A day on which the zone's offset does not change needs no further look-ups; a big file asks for the same days. */
type PlainDay = { startMs: number; offset: string } | "changes";
const plainDays = new Map<string, PlainDay>();
const PLAIN_DAYS_KEPT = 5000;

function plainDay(on: string, zone: string): PlainDay {
  const key = `${zone} ${on}`;
  const known = plainDays.get(key);
  if (known) return known;
  const date = parseDay(on);
  const start = date.toZonedDateTime({ timeZone: zone });
  const next = date.add({ days: 1 }).toZonedDateTime({ timeZone: zone });
  const isPlain =
    start.offsetNanoseconds === next.offsetNanoseconds &&
    next.epochMilliseconds - start.epochMilliseconds === MS_OF_DAY;
  const day: PlainDay = isPlain ? { startMs: start.epochMilliseconds, offset: start.offset } : "changes";
  if (plainDays.size >= PLAIN_DAYS_KEPT) plainDays.clear();
  plainDays.set(key, day);
  return day;
}

function candidate(local: Temporal.PlainDateTime, zone: string, which: Disambiguation): MomentCandidate {
  const zoned = local.toZonedDateTime(zone, { disambiguation: which });
  return { epochMs: zoned.epochMilliseconds, offset: zoned.offset };
}

/**
 * Which moment is meant by a day and a time of day in a zone?
 * `disambiguation` settles a doubled hour; a missing hour is never settled, it needs a person.
 * @throws RangeError when the day, the time or the zone is not one.
 * @example localToEpoch({ on: "2026-01-15", at: "12:00", zone: "Europe/London" })
 *   // { kind: "one", epochMs: 1768478400000, offset: "+00:00" }
 */
export function localToEpoch(input: {
  on: string;
  at: string;
  zone: string;
  disambiguation?: Disambiguation;
}): LocalReading {
  const timeMs = parseTimeMs(input.at);
  const day = plainDay(input.on, input.zone);
  if (day !== "changes") return { kind: "one", epochMs: day.startMs + timeMs, offset: day.offset };
  const local = parseDay(input.on).toPlainDateTime().add({ milliseconds: timeMs });
  const earlier = candidate(local, input.zone, "earlier");
  const later = candidate(local, input.zone, "later");
  if (earlier.epochMs === later.epochMs) return { kind: "one", ...earlier };
  const back = Temporal.Instant.fromEpochMilliseconds(earlier.epochMs).toZonedDateTimeISO(input.zone);
  if (!back.toPlainDateTime().equals(local)) return { kind: "missing", earlier, later };
  if (input.disambiguation) return { kind: "one", ...(input.disambiguation === "later" ? later : earlier) };
  return { kind: "doubled", earlier, later };
}

const pad = (value: number, width = 2): string => String(value).padStart(width, "0");

function clockText(time: { hour: number; minute: number; second: number; millisecond: number }): string {
  const short = `${pad(time.hour)}:${pad(time.minute)}`;
  if (time.millisecond > 0) return `${short}:${pad(time.second)}.${pad(time.millisecond, 3)}`;
  return time.second > 0 ? `${short}:${pad(time.second)}` : short;
}

const zoned = (ms: number, zone: string): Temporal.ZonedDateTime =>
  Temporal.Instant.fromEpochMilliseconds(ms).toZonedDateTimeISO(zone);

/**
 * What do the calendar and the clock of a zone show at a moment (UTC epoch ms)?
 * @throws RangeError when the zone is not an IANA zone or the moment is not a whole number of ms.
 * @example epochToLocal(1768478400000, "Europe/London") // { on: "2026-01-15", at: "12:00", offset: "+00:00" }
 */
export function epochToLocal(ms: number, zone: string): LocalMoment {
  const at = zoned(ms, zone);
  return { on: at.toPlainDate().toString(), at: clockText(at), offset: at.offset };
}

/** The calendar day `days` after `on` (before it when negative). @throws RangeError on a day that does not exist. */
export function addDays(on: string, days: number): string {
  return parseDay(on).add({ days }).toString();
}

/** Is `on` a day of the calendar, written YYYY-MM-DD? */
export function isCalendarDay(on: string): boolean {
  try {
    parseDay(on);
    return true;
  } catch {
    return false;
  }
}

/** Half-open span of an operational day: `fromAt` belongs to it, `toAt` to the next. UTC epoch ms. */
export type DayBounds = { fromAt: number; toAt: number };

/** When the clock first shows the cut of the day; where the cut itself is skipped, when the clock jumps past it. */
function cutOf(date: Temporal.PlainDate, zone: string, dayCutMinutes: number): number {
  const local = date.toPlainDateTime().add({ minutes: dayCutMinutes });
  return local.toZonedDateTime(zone, { disambiguation: "compatible" }).epochMilliseconds;
}

const boundsKept = new Map<string, DayBounds>();

/**
 * From when until when does the operational day `on` last, if days begin `dayCutMinutes` after local midnight?
 * The span is 23, 24 or 25 hours long. @throws RangeError when the cut is not 0 … 1439 or the day does not exist.
 */
export function dayBounds(on: string, zone: string, dayCutMinutes: number): DayBounds {
  if (!Number.isInteger(dayCutMinutes) || dayCutMinutes < 0 || dayCutMinutes > 1439) {
    throw new RangeError(`${dayCutMinutes} is not a number of minutes within a day`);
  }
  const key = `${zone} ${on} ${dayCutMinutes}`;
  const known = boundsKept.get(key);
  if (known) return { ...known };
  const date = parseDay(on);
  const bounds = {
    fromAt: cutOf(date, zone, dayCutMinutes),
    toAt: cutOf(date.add({ days: 1 }), zone, dayCutMinutes),
  };
  if (boundsKept.size >= PLAIN_DAYS_KEPT) boundsKept.clear();
  boundsKept.set(key, bounds);
  return { ...bounds };
}

/**
 * To which operational day ("YYYY-MM-DD") does a moment belong? A round at 02:00 belongs to the day before
 * when days begin at 06:00. Agrees with `dayBounds` on every moment, clock changes included.
 */
export function operationalDayOf(ms: number, zone: string, dayCutMinutes: number): string {
  const on = zoned(ms, zone).toPlainDate().toString();
  const bounds = dayBounds(on, zone, dayCutMinutes);
  if (ms < bounds.fromAt) return addDays(on, -1);
  return ms >= bounds.toAt ? addDays(on, 1) : on;
}

const MONTHS = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];

/** A calendar day as it is read aloud: "15 Jan 2026". */
export function formatDay(on: string): string {
  const date = parseDay(on);
  return `${date.day} ${MONTHS[date.month - 1]} ${date.year}`;
}

/** `moment` "15 Jan 2026, 12:00", `day` "15 Jan 2026", `time` "12:00", `second` "15 Jan 2026, 12:00:07". */
export type LocalStyle = "moment" | "day" | "time" | "second";

/**
 * A moment in the facility's zone for a person to read. In a doubled hour the offset is added, because the
 * time alone would name two moments: "25 Oct 2026, 01:30 (UTC+01:00)".
 */
export function formatLocal(ms: number, zone: string, style: LocalStyle = "moment"): string {
  const local = zoned(ms, zone);
  const day = `${local.day} ${MONTHS[local.month - 1]} ${local.year}`;
  if (style === "day") return day;
  const minutes = `${pad(local.hour)}:${pad(local.minute)}`;
  const time = style === "second" ? `${minutes}:${pad(local.second)}` : minutes;
  const on = local.toPlainDate().toString();
  const isDoubled = localToEpoch({ on, at: minutes, zone }).kind === "doubled";
  const text = isDoubled ? `${time} (UTC${local.offset})` : time;
  return style === "time" ? text : `${day}, ${text}`;
}
