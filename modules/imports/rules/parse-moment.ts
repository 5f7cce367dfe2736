import { formatDay, formatLocal, localToEpoch, type MomentCandidate } from "@/lib/zone";
import type { DateOrder, RawCell, RowContext } from "@/modules/imports/model";
import { fromSerial } from "@/modules/imports/rules/excel-serial";
import {
  type DateText,
  type MomentRefusal,
  parseDateText,
  parseTimeText,
} from "@/modules/imports/rules/parse-date-text";
import { cellText, type MomentCells, plainCell } from "@/modules/imports/rules/row-cells";

export type MomentResult =
  | {
      kind: "moment";
      epochMs: number;
      text: string;
      isSettled: boolean;
      isTimeMissing: boolean;
      order: DateOrder | null;
    }
  /** Two days, depending on the order of day and month. */
  | { kind: "two-orders"; dayFirst: DateText; monthFirst: DateText; text: string }
  | {
      kind: "doubled";
      earlier: MomentCandidate;
      later: MomentCandidate;
      text: string;
      order: DateOrder | null;
    }
  | (MomentRefusal & { text: string });

type Context = Pick<RowContext, "zone" | "serialEpoch" | "answers" | "defaults">;

/** Day numbers of cells that are not formatted as dates: 1954 to 2119, outside of which they are no dates. */
const PLAIN_SERIAL = { from: 20_000, to: 80_000 } as const;

const refused = (code: MomentRefusal["code"], reason: string, mend: string): MomentRefusal => ({
  kind: "refused",
  code,
  reason,
  mend,
});

function fromSerialCell(
  value: number,
  dateCell: { showsTime: boolean } | null,
  context: Context,
): DateText | MomentRefusal {
  const isPlausible = dateCell !== null || (value >= PLAIN_SERIAL.from && value < PLAIN_SERIAL.to);
  const reading = isPlausible ? fromSerial(value, context.serialEpoch) : { kind: "out-of-range" as const };
  if (reading.kind === "phantom") {
    return refused(
      "phantom-day",
      "The cell holds 29 February 1900, a day that spreadsheets count and that never was.",
      "Correct the date in the workbook.",
    );
  }
  if (reading.kind !== "moment") {
    return refused(
      "bad-date",
      `The number ${value} is no date.`,
      "Format the column as date and time in the workbook.",
    );
  }
  return {
    kind: "date",
    dayFirst: reading.on,
    monthFirst: reading.on,
    at: reading.hasTime || dateCell?.showsTime ? reading.at : null,
    offset: null,
  };
}

function dateOf(cell: RawCell | undefined, context: Context): DateText | MomentRefusal {
  const plain = plainCell(cell);
  if (plain === null || plain === undefined || plain === "") {
    return refused("missing-moment", "The date is missing.", "Fill in when the reading was taken.");
  }
  if (typeof plain === "number") return fromSerialCell(plain, null, context);
  if (typeof plain === "string") {
    if (plain.trim() === "") return dateOf(null, context);
    if (/^\d{5}(?:[.,]\d+)?$/.test(plain.trim())) {
      return refused(
        "bad-date",
        `“${plain.trim()}” is a spreadsheet's day number, and a text file does not say from which day it counts.`,
        "Format the column as date and time before the file is saved.",
      );
    }
    return parseDateText(plain);
  }
  if (typeof plain === "object" && plain.kind === "serial")
    return fromSerialCell(plain.value, plain, context);
  return refused("bad-date", `“${cellText(cell)}” is no date.`, "Write it as 2026-03-14 14:05.");
}

function timeOf(
  cell: RawCell | undefined,
  context: Context,
): { at: string; offset: string | null } | MomentRefusal | null {
  const plain = plainCell(cell);
  if (plain === null || plain === undefined || plain === "") return null;
  if (typeof plain === "string") {
    if (plain.trim() === "") return null;
    const time = parseTimeText(plain);
    if (time.kind === "time") return time;
    const whole = parseDateText(plain);
    return whole.kind === "date" && whole.at ? { at: whole.at, offset: whole.offset } : time;
  }
  const value =
    typeof plain === "number"
      ? plain
      : typeof plain === "object" && plain.kind === "serial"
        ? plain.value
        : -1;
  const reading = value >= 0 && value < 1 ? fromSerial(value, 1900) : fromSerial(value, context.serialEpoch);
  if (reading.kind === "time" || reading.kind === "moment") return { at: reading.at, offset: null };
  return refused(
    "bad-time",
    `“${cellText(cell)}” is no time of day.`,
    "Write it as 14:05, on a clock of 24 hours.",
  );
}

/** Chooses the order of day and month: what the date itself allows, else the file's. */
function inOrder(
  date: DateText,
  order: DateOrder | null,
): { on: string; order: DateOrder | null } | "ask" | "wrong" {
  const { dayFirst, monthFirst } = date;
  if (dayFirst !== null && dayFirst === monthFirst) return { on: dayFirst, order: null };
  const own: DateOrder | null = monthFirst === null ? "day-first" : dayFirst === null ? "month-first" : null;
  const chosen = order ?? own;
  if (chosen === null) return "ask";
  const on = chosen === "day-first" ? dayFirst : monthFirst;
  return on === null ? "wrong" : { on, order: own };
}

/**
 * When was it? Dates and times without an offset are meant in the facility's zone. What the cells leave open
 * (order of day and month, the doubled hour) is returned for a person to settle, never guessed.
 */
export function parseMoment(cells: MomentCells, context: Context): MomentResult {
  const hasMoment = cells.moment !== undefined && cellText(cells.moment) !== "";
  const text = hasMoment
    ? cellText(cells.moment)
    : [cellText(cells.date), cellText(cells.time)].filter((part) => part !== "").join(" ");
  const date = dateOf(hasMoment ? cells.moment : cells.date, context);
  if (date.kind === "refused") return { ...date, text };
  const time = hasMoment ? null : timeOf(cells.time, context);
  if (time && "code" in time) return { ...time, text };
  const withTime = time ? { ...date, at: time.at, offset: time.offset ?? date.offset } : date;
  return settle(withTime, text, context);
}

function settle(date: DateText, text: string, context: Context): MomentResult {
  const chosen = inOrder(date, context.answers.dateOrder ?? null);
  if (chosen === "ask") {
    const { dayFirst, monthFirst } = date;
    return {
      kind: "two-orders",
      dayFirst: { ...date, monthFirst: dayFirst },
      monthFirst: { ...date, dayFirst: monthFirst },
      text,
    };
  }
  if (chosen === "wrong") {
    const order = context.answers.dateOrder === "day-first" ? "the day first" : "the month first";
    return {
      ...refused(
        "date-order",
        `“${text}” is no day when ${order}, as this file was said to be written.`,
        "Write the date as 2026-03-14.",
      ),
      text,
    };
  }
  return onClock(chosen, date, text, context);
}

function onClock(
  chosen: { on: string; order: DateOrder | null },
  date: DateText,
  text: string,
  context: Context,
): MomentResult {
  const { on, order } = chosen;
  const at = date.at ?? context.defaults.timeOfDay ?? null;
  if (at === null) {
    return {
      ...refused(
        "missing-moment",
        `“${text}” has no time of day.`,
        "Add the time, or say at which time such readings are taken.",
      ),
      text,
    };
  }
  const isTimeMissing = date.at === null;
  if (date.offset !== null) {
    const epochMs = localToEpoch({ on, at, zone: "UTC" });
    const ms = epochMs.kind === "one" ? epochMs.epochMs - offsetMs(date.offset) : Number.NaN;
    return { kind: "moment", epochMs: ms, text, isSettled: false, isTimeMissing, order };
  }
  const answer = context.answers.doubledHour;
  const disambiguation = answer === "earlier" || answer === "later" ? answer : undefined;
  const found = localToEpoch({ on, at, zone: context.zone });
  if (found.kind === "one")
    return { kind: "moment", epochMs: found.epochMs, text, isSettled: false, isTimeMissing, order };
  if (found.kind === "missing") return { ...missingHour(on, at, found, context.zone), text };
  if (disambiguation) {
    return {
      kind: "moment",
      epochMs: found[disambiguation].epochMs,
      text,
      isSettled: true,
      isTimeMissing,
      order,
    };
  }
  if (answer === "refuse") return { ...doubledHour(on, at, found), text };
  return { kind: "doubled", earlier: found.earlier, later: found.later, text, order };
}

const offsetMs = (offset: string): number => {
  const [hours = "0", minutes = "0"] = offset.slice(1).split(":");
  return (offset.startsWith("-") ? -1 : 1) * (Number(hours) * 60 + Number(minutes)) * 60_000;
};

type Pair = { earlier: MomentCandidate; later: MomentCandidate };

function missingHour(on: string, at: string, { earlier, later }: Pair, zone: string): MomentRefusal {
  return refused(
    "missing-hour",
    `${at} on ${formatDay(on)} never was: the clocks went forward. ${formatLocal(earlier.epochMs, zone, "time")} or ${formatLocal(later.epochMs, zone, "time")} may be meant.`,
    `Correct the time, or add the offset: ${at}${later.offset} or ${at}${earlier.offset}.`,
  );
}

/** A time in the doubled hour that is to be settled row by row. */
function doubledHour(on: string, at: string, { earlier, later }: Pair): MomentRefusal {
  return refused(
    "doubled-hour",
    `${at} on ${formatDay(on)} was twice: the clocks went back.`,
    `Add the offset: ${at}${earlier.offset} for the first, ${at}${later.offset} for the second.`,
  );
}
