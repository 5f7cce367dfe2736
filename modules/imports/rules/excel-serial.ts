import type { SerialEpoch } from "@/modules/imports/model";

/** A day and time of day read from a spreadsheet's day number; `time` alone for numbers below one day. */
export type SerialReading =
  | { kind: "moment"; on: string; at: string; hasTime: boolean }
  | { kind: "time"; at: string }
  | { kind: "phantom" }
  | { kind: "out-of-range" };

const SECONDS_OF_DAY = 86_400;
const DAY_MS = 86_400_000;
/** 31 December 9999 in the 1900 system. */
const LAST_SERIAL_1900 = 2_958_465;
/** Days between the two systems: four years and a day, the phantom day included. */
export const SERIAL_EPOCH_DIFFERENCE = 1462;

const pad = (value: number): string => String(value).padStart(2, "0");

function clock(seconds: number): string {
  const rest = seconds % 60;
  const short = `${pad(Math.floor(seconds / 3600))}:${pad(Math.floor(seconds / 60) % 60)}`;
  return rest === 0 ? short : `${short}:${pad(rest)}`;
}

/**
 * Which day and time does a spreadsheet's day number mean? Rounded to the nearest second, because a time of day
 * as a fraction is never exact.
 * Formula: 1900 system: n ≥ 61: 30 Dec 1899 + n; n < 60: 31 Dec 1899 + n; 60 is 29 Feb 1900, a day that never was.
 * 1904 system: 1 Jan 1904 + n. Source: ECMA-376 part 1, 18.17.4 (both systems).
 * @example fromSerial(45000.760416666664, 1900) // => { kind: "moment", on: "2023-03-15", at: "18:15", hasTime: true }
 */
export function fromSerial(serial: number, epoch: SerialEpoch): SerialReading {
  const last = epoch === 1900 ? LAST_SERIAL_1900 : LAST_SERIAL_1900 - SERIAL_EPOCH_DIFFERENCE;
  if (!(serial >= 0) || serial >= last + 1) return { kind: "out-of-range" };
  const total = Math.round(serial * SECONDS_OF_DAY);
  const days = Math.floor(total / SECONDS_OF_DAY);
  const seconds = total - days * SECONDS_OF_DAY;
  if (epoch === 1900 && days === 0) return { kind: "time", at: clock(seconds) };
  if (epoch === 1900 && days === 60) return { kind: "phantom" };
  const first = epoch === 1904 ? Date.UTC(1904, 0, 1) : Date.UTC(1899, 11, days >= 61 ? 30 : 31);
  const on = new Date(first + days * DAY_MS).toISOString().slice(0, 10);
  return { kind: "moment", on, at: clock(seconds), hasTime: !Number.isInteger(serial) };
}
