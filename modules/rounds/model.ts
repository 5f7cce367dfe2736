import type { Qualifier, Side, Status } from "@/modules/measurements/model";

export const REVIEW_OUTCOMES = ["reviewed", "returned"] as const;
export type ReviewOutcome = (typeof REVIEW_OUTCOMES)[number];

/** Where a day sheet stands. "changed": it was reviewed, and then something on it changed. */
export const SHEET_STATES = ["waiting", "reviewed", "returned", "changed"] as const;
export type SheetState = (typeof SHEET_STATES)[number];

export const SHEET_STATE_WORDS: Readonly<Record<SheetState, string>> = {
  waiting: "waits for review",
  reviewed: "reviewed",
  returned: "returned",
  changed: "changed since it was reviewed",
};

/** One reading on a day sheet, as it is signed. Ids, codes and numbers only; names are looked up beside it. */
export interface SheetLine {
  readonly readingId: number;
  readonly pointId: number;
  readonly parameterId: number;
  readonly systemCode: string;
  readonly pointCode: string;
  readonly parameterCode: string;
  readonly typedText: string;
  readonly typedUnit: string | null;
  readonly value: number | null;
  readonly qualifier: Qualifier;
  readonly answer: string | null;
  readonly takenAt: number;
  readonly enteredAt: number;
  readonly takenBy: number;
  readonly enteredBy: number;
  readonly methodId: number | null;
  readonly instrumentId: number | null;
  readonly note: string | null;
  readonly supersedesId: number | null;
  readonly correctionReason: string | null;
  readonly isConfirmed: boolean;
  readonly status: Status;
  readonly side: Side | null;
  readonly sentence: string;
  readonly explanations: readonly { readonly text: string; readonly by: number; readonly at: number }[];
}

/** What a corrected line said before. */
export interface OldValue {
  readonly typedText: string;
  readonly typedUnit: string | null;
  readonly value: number | null;
  readonly qualifier: Qualifier;
  readonly answer: string | null;
  readonly takenAt: number;
  readonly enteredBy: number;
  readonly enteredAt: number;
}

/** A reading of the day that was struck out. */
export interface StruckOut {
  readonly readingId: number;
  readonly systemCode: string;
  readonly parameterId: number;
  readonly typedText: string;
  readonly typedUnit: string | null;
  readonly voidedBy: number | null;
  readonly voidedAt: number | null;
  readonly reason: string;
}

/** Something that should have been read on the day and was not. */
export interface SheetGap {
  readonly systemCode: string;
  readonly pointCode: string;
  readonly parameterCode: string;
  readonly parameterName: string;
  /** When it was last read; null: never. */
  readonly lastAt: number | null;
}

/** Counts by which a list of sheets is read. */
export interface SheetCounts {
  readonly readings: number;
  readonly watch: number;
  readonly out: number;
  readonly implausible: number;
  readonly unjudged: number;
  readonly unconfirmed: number;
  readonly unexplained: number;
  readonly corrected: number;
  readonly late: number;
  readonly gaps: number;
}
