import { isCalendarDay } from "@/lib/zone";
import type { RowProblemCode } from "@/modules/imports/model";

/** A sentence on why a text is no date or time, and what to write instead. */
export type MomentRefusal = { kind: "refused"; code: RowProblemCode; reason: string; mend: string };

/**
 * A date as text. `on` and `monthFirst` differ only for dates such as 03/04/2026; either is null where that
 * order gives no day. `at` and `offset` are null where the text has none.
 */
export type DateText = {
  kind: "date";
  dayFirst: string | null;
  monthFirst: string | null;
  at: string | null;
  offset: string | null;
};

const MONTHS = ["jan", "feb", "mar", "apr", "may", "jun", "jul", "aug", "sep", "oct", "nov", "dec"];
const MONTH_WORD =
  "jan(?:uary)?|feb(?:ruary)?|mar(?:ch)?|apr(?:il)?|may|june?|july?|aug(?:ust)?|sept?(?:ember)?|oct(?:ober)?|nov(?:ember)?|dec(?:ember)?";
const WEEKDAY = /^(?:mon|tues?|wed(?:nes)?|thu(?:rs)?|fri|sat(?:ur)?|sun)(?:day)?\.?,?\s+/i;
const YEAR_FIRST = /^(\d{4})([-/.])(\d{1,2})\2(\d{1,2})(?=$|[T\s,])/i;
const COMPACT = /^(\d{4})(\d{2})(\d{2})(?=$|[T\s])/i;
const NUMERIC = /^(\d{1,2})([-/.])(\d{1,2})\2(\d{4}|\d{2})(?=$|[T\s,])/i;
const DAY_MONTH = new RegExp(
  `^(\\d{1,2})(?:st|nd|rd|th)?[-/.\\s]+(${MONTH_WORD})\\.?,?[-/.\\s]+(\\d{4}|\\d{2})(?=$|[T\\s,])`,
  "i",
);
const MONTH_DAY = new RegExp(
  `^(${MONTH_WORD})\\.?\\s+(\\d{1,2})(?:st|nd|rd|th)?,?\\s+(\\d{4}|\\d{2})(?=$|[T\\s,])`,
  "i",
);
const TIME =
  /^(\d{1,2})[:.h](\d{2})(?:[:.](\d{2})(?:[.,](\d{1,9}))?)?\s*(a\.?m\.?|p\.?m\.?)?(?:\s*(z|utc|gmt|[+\-\u2212]\d{2}:?\d{2}))?$/i;
const COMPACT_TIME = /^(\d{2})(\d{2})(\d{2})?(?:[.,](\d{1,9}))?()(z|[+-]\d{2}:?\d{2})?$/i;
const HOUR_ONLY = /^(\d{1,2})\s*(a\.?m\.?|p\.?m\.?)$/i;

const day = (year: string, month: string | number, date: string): string | null => {
  const on = `${year}-${String(month).padStart(2, "0")}-${date.padStart(2, "0")}`;
  return isCalendarDay(on) ? on : null;
};

const refused = (code: RowProblemCode, reason: string, mend: string): MomentRefusal => ({
  kind: "refused",
  code,
  reason,
  mend,
});

const DATE_MEND = "Write it as 2026-03-14 14:05, or as 14 Mar 2026 14:05.";

type DatePart = { dayFirst: string | null; monthFirst: string | null; length: number; year: string };

const monthNumber = (word: string): number => MONTHS.indexOf(word.slice(0, 3).toLowerCase()) + 1;

function datePart(text: string): DatePart | null {
  const iso = YEAR_FIRST.exec(text);
  if (iso) return single(day(iso[1] ?? "", iso[3] ?? "", iso[4] ?? ""), iso);
  const compact = COMPACT.exec(text);
  if (compact) return single(day(compact[1] ?? "", compact[2] ?? "", compact[3] ?? ""), compact);
  const numeric = NUMERIC.exec(text);
  if (numeric) {
    const [all, first = "", , second = "", year = ""] = numeric;
    return {
      dayFirst: day(year, second, first),
      monthFirst: day(year, first, second),
      length: all.length,
      year,
    };
  }
  const dayMonth = DAY_MONTH.exec(text);
  if (dayMonth) return named(dayMonth, dayMonth[3] ?? "", dayMonth[2] ?? "", dayMonth[1] ?? "");
  const monthDay = MONTH_DAY.exec(text);
  return monthDay ? named(monthDay, monthDay[3] ?? "", monthDay[1] ?? "", monthDay[2] ?? "") : null;
}

const single = (on: string | null, found: RegExpExecArray): DatePart => ({
  dayFirst: on,
  monthFirst: on,
  length: found[0].length,
  year: found[1] ?? "",
});

function named(found: RegExpExecArray, year: string, month: string, date: string): DatePart {
  const on = day(year, monthNumber(month), date);
  return { dayFirst: on, monthFirst: on, length: found[0].length, year };
}

/**
 * Reads a date as text, with or without a time of day behind it: 2026-03-14T14:05:07Z, 20260314, 14/03/2026 2:05 pm,
 * 14.03.2026, 14 Mar 2026, March 14, 2026. Years of two digits are refused: 03-04-05 has six readings.
 */
export function parseDateText(input: string): DateText | MomentRefusal {
  const text = input.trim().replace(/\s+/g, " ");
  const bare = text.replace(WEEKDAY, "");
  const part = datePart(bare);
  if (!part) return refused("bad-date", `“${text}” cannot be read as a date.`, DATE_MEND);
  if (part.year.length === 2) {
    return refused(
      "two-digit-year",
      `“${text}” has a year of two digits, which can be read in several ways.`,
      "Write the year with four digits: 2026-03-14.",
    );
  }
  if (part.dayFirst === null && part.monthFirst === null) {
    return refused("bad-date", `“${text}” is a day that does not exist.`, DATE_MEND);
  }
  const rest = bare.slice(part.length).replace(/^[T\s,]+/i, "");
  if (rest === "")
    return { kind: "date", dayFirst: part.dayFirst, monthFirst: part.monthFirst, at: null, offset: null };
  const time = parseTimeText(rest);
  if (time.kind === "refused") return time;
  return {
    kind: "date",
    dayFirst: part.dayFirst,
    monthFirst: part.monthFirst,
    at: time.at,
    offset: time.offset,
  };
}

export type TimeText = { kind: "time"; at: string; offset: string | null };

function offsetOf(text: string | undefined): string | null {
  if (!text) return null;
  if (/^[a-z]/i.test(text)) return "+00:00";
  const digits = text.replace(/\D/g, "");
  const sign = text.startsWith("+") ? "+" : "-";
  return `${sign}${digits.slice(0, 2)}:${digits.slice(2)}`;
}

function hourOf(hourText: string, half: string | undefined): number | null {
  const hour = Number(hourText);
  if (!half) return hour <= 23 ? hour : null;
  if (hour < 1 || hour > 12) return null;
  return (hour % 12) + (half.toLowerCase().startsWith("p") ? 12 : 0);
}

/** Reads a time of day: 14:05, 14:05:07.5, 2:05 pm, 14.05, 1405, 14:05Z, 14:05+01:00. */
export function parseTimeText(input: string): TimeText | MomentRefusal {
  const text = input.trim();
  const mend = "Write it as 14:05, on a clock of 24 hours.";
  const hourOnly = HOUR_ONLY.exec(text);
  const found = hourOnly
    ? [text, hourOnly[1], "00", "", "", hourOnly[2]]
    : (TIME.exec(text) ?? COMPACT_TIME.exec(text));
  if (!found) return refused("bad-time", `“${text}” cannot be read as a time of day.`, mend);
  const [, hourText = "", minute = "00", second = "00", fraction = "", half, zone] = found;
  if (hourText === "24" && !half) {
    return refused(
      "bad-time",
      `“${text}” can be meant for the end of one day or the start of the next.`,
      "Write 00:00 of the day that is meant.",
    );
  }
  const hour = hourOf(hourText, half || undefined);
  const offset = offsetOf(zone);
  const isOffset = offset === null || /^[+-](?:0\d|1[0-4]):[0-5]\d$/.test(offset);
  if (hour === null || Number(minute) > 59 || Number(second || "0") > 59 || !isOffset) {
    return refused("bad-time", `“${text}” is a time that does not exist.`, mend);
  }
  return { kind: "time", at: clockText(hour, minute, second || "00", fraction), offset };
}

function clockText(hour: number, minute: string, second: string, fraction: string): string {
  const short = `${String(hour).padStart(2, "0")}:${minute}`;
  const ms = fraction.slice(0, 3).padEnd(3, "0");
  if (Number(ms) > 0) return `${short}:${second}.${ms}`;
  return Number(second) > 0 ? `${short}:${second}` : short;
}
