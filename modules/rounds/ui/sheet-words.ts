import { timeText } from "@/lib/ui";
import type { SheetCounts, SheetState } from "../model";

/** Names by id, for records that name people by id. */
export type Names = Readonly<Record<number, string>>;

export const nameOf = (names: Names, personId: number | null): string =>
  personId === null ? "Stillwell" : (names[personId] ?? `person ${personId}`);

/** A calendar day as it is read: "Mon 2 Mar". @example weekdayWords("2026-03-02") === "Mon 2 Mar" */
export const weekdayWords = (on: string): string => timeText(Date.parse(`${on}T12:00:00Z`), "UTC", "weekday");

/** A calendar day with its year: "2 Mar 2026". */
export const dayWords = (on: string): string => timeText(Date.parse(`${on}T12:00:00Z`), "UTC", "day");

const COUNTED: readonly [keyof SheetCounts, string, string][] = [
  ["out", "out of tolerance", "out of tolerance"],
  ["implausible", "implausible", "implausible"],
  ["watch", "watch", "watch"],
  ["unjudged", "cannot be judged", "cannot be judged"],
  ["unconfirmed", "not confirmed", "not confirmed"],
  ["unexplained", "not explained", "not explained"],
  ["corrected", "corrected", "corrected"],
  ["late", "entered late", "entered late"],
  ["gaps", "gap", "gaps"],
];

/**
 * What deviates on a sheet, in words, the gravest first; empty where nothing does.
 * @example countWords({ ...none, out: 1, gaps: 2 }) // ["1 out of tolerance", "2 gaps"]
 */
export function countWords(counts: SheetCounts): string[] {
  return COUNTED.flatMap(([key, one, many]) => {
    const count = counts[key];
    return count === 0 ? [] : [`${count} ${count === 1 ? one : many}`];
  });
}

/** Whether anything on a sheet is worth a look before signing. */
export const hasDeviations = (counts: SheetCounts): boolean => countWords(counts).length > 0;

/** Who is waited for, by state. */
export const WAITED_FOR: Readonly<Record<SheetState, string>> = {
  waiting: "waits for a lead's review",
  reviewed: "reviewed",
  returned: "returned: waits for whoever walked the round",
  changed: "changed since it was reviewed: waits for review again",
};

export const readingsWord = (count: number): string => `${count} ${count === 1 ? "reading" : "readings"}`;
