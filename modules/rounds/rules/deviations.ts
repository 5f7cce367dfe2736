import type { Status } from "@/modules/measurements/model";
import type { SheetLine } from "../model";
import { isLate, isLineOff } from "./sheet-state";

/** What a reviewer must know of a line beside its status. */
export const DEVIATION_MARKS = ["unconfirmed", "unexplained", "corrected", "late"] as const;
export type DeviationMark = (typeof DEVIATION_MARKS)[number];

export interface Deviation {
  readonly line: SheetLine;
  readonly marks: readonly DeviationMark[];
}

/** The gravest first; what is within or has no limits stands here only for a mark. */
const RANK: Readonly<Record<Status, number>> = {
  out: 0,
  implausible: 1,
  watch: 2,
  unjudged: 3,
  within: 4,
  none: 4,
};

/** What is to be known of a line. */
export function marksOf(line: SheetLine): DeviationMark[] {
  const marks: DeviationMark[] = [];
  if (isLineOff(line) && !line.isConfirmed) marks.push("unconfirmed");
  if (isLineOff(line) && line.explanations.length === 0) marks.push("unexplained");
  if (line.supersedesId !== null) marks.push("corrected");
  if (isLate(line)) marks.push("late");
  return marks;
}

/**
 * Everything on a sheet that deviates, the gravest first: out of tolerance, implausible, watch, cannot be judged, then
 * corrections and late entries that are otherwise well. Within one rank the order of the sheet (the walk) is kept.
 */
export function deviationsOf(lines: readonly SheetLine[]): Deviation[] {
  return lines
    .map((line) => ({ line, marks: marksOf(line) }))
    .filter(({ line, marks }) => RANK[line.status] < RANK.within || marks.length > 0)
    .sort((one, other) => RANK[one.line.status] - RANK[other.line.status]);
}
