import type { ReviewOutcome, SheetCounts, SheetGap, SheetLine, SheetState } from "../model";

/** Later than this after it was taken, a reading was entered late. Common practice, no source. */
const LATE_MS = 12 * 3_600_000;

/** Entered long after it was taken. */
export function isLate(line: Pick<SheetLine, "takenAt" | "enteredAt">): boolean {
  return line.enteredAt - line.takenAt > LATE_MS;
}

/** Out of tolerance or implausible: must be confirmed or measured again. */
export function isLineOff(line: Pick<SheetLine, "status">): boolean {
  return line.status === "out" || line.status === "implausible";
}

/** Where a sheet stands, from the newest review and the hash of what is there now. */
export function sheetState(
  newest: { outcome: ReviewOutcome; contentHash: string } | null,
  hashNow: string,
): SheetState {
  if (newest === null) return "waiting";
  if (newest.outcome === "returned") return newest.contentHash === hashNow ? "returned" : "waiting";
  return newest.contentHash === hashNow ? "reviewed" : "changed";
}

/** What a lead must know before opening a sheet. */
export function countSheet(lines: readonly SheetLine[], gaps: readonly SheetGap[]): SheetCounts {
  const count = (test: (line: SheetLine) => boolean): number => lines.filter(test).length;
  return {
    readings: lines.length,
    watch: count((line) => line.status === "watch"),
    out: count((line) => line.status === "out"),
    implausible: count((line) => line.status === "implausible"),
    unjudged: count((line) => line.status === "unjudged"),
    unconfirmed: count((line) => isLineOff(line) && !line.isConfirmed),
    unexplained: count((line) => isLineOff(line) && line.explanations.length === 0),
    corrected: count((line) => line.supersedesId !== null),
    late: count(isLate),
    gaps: gaps.length,
  };
}

/** Why a sheet cannot be reviewed yet, one sentence each; none where it can. */
export function reviewHindrances(lines: readonly SheetLine[], reviewerId: number): string[] {
  const hindrances: string[] = [];
  const own = lines.filter((line) => line.takenBy === reviewerId || line.enteredBy === reviewerId);
  if (own.length > 0) {
    const what = own.length === 1 ? "a reading" : `${own.length} readings`;
    hindrances.push(`You took or entered ${what} on this sheet; another lead must review it.`);
  }
  for (const line of lines) {
    if (isLineOff(line) && !line.isConfirmed) {
      hindrances.push(
        `${line.systemCode} ${line.parameterCode} ${line.typedText} is off and neither confirmed nor measured again.`,
      );
    }
  }
  return hindrances;
}
