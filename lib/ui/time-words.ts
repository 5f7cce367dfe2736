/** `time` 09:42 · `day` 14 Jul 2026 · `day-time` 14 Jul 2026, 09:42 · `weekday` Tue 14 Jul */
export type TimeParts = "time" | "day" | "day-time" | "weekday";

const FORMATS: Record<TimeParts, Intl.DateTimeFormatOptions> = {
  time: { hour: "2-digit", minute: "2-digit", hourCycle: "h23" },
  day: { day: "numeric", month: "short", year: "numeric" },
  "day-time": {
    day: "numeric",
    month: "short",
    year: "numeric",
    hour: "2-digit",
    minute: "2-digit",
    hourCycle: "h23",
  },
  weekday: { weekday: "short", day: "numeric", month: "short" },
};

const cache = new Map<string, Intl.DateTimeFormat>();

/**
 * How is a moment written on screen? British order, 24 hours, in the given IANA zone.
 * @throws RangeError when the moment is no date or the zone is unknown
 * @example timeText(Date.UTC(2026, 6, 14, 8, 42), "Europe/London", "time") === "09:42"
 */
export function timeText(at: number, zone: string, show: TimeParts): string {
  const key = `${zone} ${show}`;
  let format = cache.get(key);
  if (format === undefined) {
    format = new Intl.DateTimeFormat("en-GB", { ...FORMATS[show], timeZone: zone });
    cache.set(key, format);
  }
  const parts = format.formatToParts(at);
  const part = (type: string) => parts.find((p) => p.type === type)?.value ?? "";
  const month = part("month").slice(0, 3);
  const day = `${part("day")} ${month}`;
  const time = `${part("hour")}:${part("minute")}`;
  if (show === "time") return time;
  if (show === "weekday") return `${part("weekday")} ${day}`;
  return show === "day" ? `${day} ${part("year")}` : `${day} ${part("year")}, ${time}`;
}

/**
 * How long ago is a moment, in one rough word? "just now", "5 min ago", "20 h ago", "3 days ago".
 * @example agoText(0, 72_000_000) === "20 h ago"
 */
export function agoText(at: number, now: number): string {
  const minutes = Math.floor((now - at) / 60_000);
  if (minutes < 0) return "in the future";
  if (minutes < 1) return "just now";
  if (minutes < 60) return `${minutes} min ago`;
  const hours = Math.floor(minutes / 60);
  if (hours < 48) return `${hours} h ago`;
  return `${Math.floor(hours / 24)} days ago`;
}
