import type { FacilityParameter, ParameterKind, PlausibleBounds } from "@/modules/methods/model";

export { formatNumber, formatValue } from "./rules/format-value";
export { parameterInUnit, preferredUnit, readingInUnit, rowInUnit } from "./rules/in-unit";
export { type ShownValue, shownValue } from "./rules/shown-value";
export type { ParameterKind, PlausibleBounds };

/** The server's judgement of a reading; codes as stored, words in `STATUS_WORDS`. */
export const STATUSES = ["within", "watch", "out", "implausible", "unjudged", "none"] as const;
export type Status = (typeof STATUSES)[number];

/** The words shown for each status. */
export const STATUS_WORDS: Readonly<Record<Status, string>> = {
  within: "within",
  watch: "watch",
  out: "out of tolerance",
  implausible: "implausible",
  unjudged: "cannot be judged",
  none: "no limits",
};

/** "" a plain value; "<" below the number; ">" above the number; "ND" not detected, no number known. */
export const QUALIFIERS = ["", "<", ">", "ND"] as const;
export type Qualifier = (typeof QUALIFIERS)[number];

/**
 * A value as the rules see it, in the canonical unit. `value` is null for ND, for "too numerous to count"
 * (qualifier ">") and for choices and texts. A yes/no answer has 1 or 0; its code stands in `text`.
 */
export interface ReadingValue {
  readonly value: number | null;
  readonly qualifier: Qualifier;
  /** The text as typed, or the code of the answer. */
  readonly text: string;
}

/** The names of the numeric bounds, in the order in which they must stand. */
export const ORDERED_BOUNDS = ["toleranceLow", "watchLow", "target", "watchHigh", "toleranceHigh"] as const;
export type OrderedBound = (typeof ORDERED_BOUNDS)[number];

/** Words for the bounds in sentences. */
export const BOUND_WORDS: Readonly<Record<OrderedBound | "greatestChange24h", string>> = {
  toleranceLow: "lower tolerance limit",
  watchLow: "lower watch limit",
  target: "target",
  watchHigh: "upper watch limit",
  toleranceHigh: "upper tolerance limit",
  greatestChange24h: "greatest change in any 24 h",
};

/** Limits at one moment, canonical unit, inclusive; every side may be open (left out). */
export interface Bounds {
  readonly target?: number;
  readonly watchLow?: number;
  readonly watchHigh?: number;
  readonly toleranceLow?: number;
  readonly toleranceHigh?: number;
  /** Greatest absolute difference to any reading of the same point in the preceding 24.0 elapsed hours. */
  readonly greatestChange24h?: number;
}

export interface RampKnot {
  /** UTC epoch milliseconds. */
  readonly at: number;
  readonly bounds: Bounds;
}

export interface SeasonKnot {
  /** "MM-DD" in the facility's calendar. */
  readonly monthDay: string;
  readonly bounds: Bounds;
}

/** How limits run through time: constant, linear between moments, or linear between days of every year. */
export type LimitShape =
  | { readonly kind: "constant"; readonly bounds: Bounds }
  | { readonly kind: "ramp"; readonly knots: readonly RampKnot[] }
  | { readonly kind: "season"; readonly knots: readonly SeasonKnot[] };

/** One approved version of the limits of a point and parameter. */
export interface LimitVersion {
  readonly id: number;
  readonly version: number;
  readonly effectiveFromAt: number;
  /** The moment from which it no longer holds; null while open. */
  readonly effectiveToAt: number | null;
  readonly shape: LimitShape;
  readonly suspended: { readonly reason: string } | null;
}

/** The limits that hold at one moment, or why there are none. */
export type LimitsInForce =
  | {
      readonly state: "in-force";
      readonly versionId: number;
      readonly version: number;
      readonly bounds: Bounds;
    }
  | {
      readonly state: "suspended";
      readonly versionId: number;
      readonly version: number;
      readonly reason: string;
    }
  | { readonly state: "none" };

/** On which side a value is off. "change": by its change in 24 h only. */
export type Side = "low" | "high" | "change";

/** Why a status was given: codes with the numbers they rest on, in the canonical unit. */
export type Reason =
  | { readonly code: "below-plausible" | "above-plausible"; readonly value: number; readonly limit: number }
  | { readonly code: "below-tolerance" | "above-tolerance"; readonly value: number; readonly limit: number }
  | { readonly code: "below-watch" | "above-watch"; readonly value: number; readonly limit: number }
  | {
      readonly code: "change-too-great";
      readonly change: number;
      readonly limit: number;
      readonly againstValue: number;
      readonly againstAt: number;
    }
  | { readonly code: "change-not-judged" }
  | { readonly code: "bound-does-not-decide"; readonly bound: OrderedBound; readonly limit: number }
  | { readonly code: "no-number" }
  | { readonly code: "answer"; readonly answer: string }
  | { readonly code: "inside-limits" }
  | { readonly code: "no-limits" }
  | { readonly code: "limits-suspended"; readonly reason: string };

/** A status with its grounds and one sentence for people. */
export interface StatusVerdict {
  readonly status: Status;
  readonly side: Side | null;
  readonly reasons: readonly Reason[];
  readonly sentence: string;
}

/** The version of the judging rules, stored with every judgement; raised whenever a rule changes an answer. */
export const STATUS_RULE_VERSION = 1;

export const SIDES = ["low", "high", "change"] as const satisfies readonly Side[];

/** By which way a reading came. */
export const READING_SOURCES = ["entry", "grid", "import", "round", "derived"] as const;
export type ReadingSource = (typeof READING_SOURCES)[number];

/** Why a reading was judged, or judged again. */
export const JUDGEMENT_CAUSES = [
  "entered",
  "late-reading",
  "correction",
  "new-limits",
  "delivery",
  "withdrawal",
  "voided",
] as const;
export type JudgementCause = (typeof JUDGEMENT_CAUSES)[number];

/** The way of proposed limits. */
export const LIMIT_STATES = ["proposed", "approved", "declined"] as const;
export type LimitState = (typeof LIMIT_STATES)[number];

/** What the server answers to one reading that was sent. `status` is null where it had been sent before. */
export interface ReadingAnswer {
  readonly uuid: string;
  readonly readingId: number;
  readonly isRepeat: boolean;
  readonly status: Status | null;
  readonly side: Side | null;
  readonly sentence: string;
  readonly mustBeConfirmed: boolean;
}

/** A value that is off by so much is confirmed by a person, or measured again. */
export function needsConfirmation(status: Status): boolean {
  return status === "out" || status === "implausible";
}

/** One of the newest readings of a point and parameter. */
export interface RecentReading {
  readonly id: number;
  readonly takenAt: number;
  readonly takenBy: number;
  readonly value: number | null;
  readonly qualifier: Qualifier;
  readonly answer: string | null;
  readonly typedText: string;
  readonly status: Status;
  readonly side: Side | null;
  readonly sentence: string;
}

/** One thing that is read at a point: with its limits now and its newest readings, newest first. */
export interface WatchRow {
  readonly pointId: number;
  readonly pointName: string;
  readonly isDefaultPoint: boolean;
  readonly systemId: number;
  readonly systemCode: string;
  readonly systemName: string;
  readonly systemState: string;
  readonly areaId: number;
  readonly areaName: string;
  readonly parameter: FacilityParameter;
  /** The unit in which it is typed and shown unless the person prefers another. */
  readonly unit: string | null;
  readonly everyDays: number | null;
  readonly methodId: number | null;
  readonly instrumentId: number | null;
  readonly limits: LimitsInForce;
  readonly recent: readonly RecentReading[];
}

/** One version of the limits of a point and parameter, with who proposed and decided on it. */
export interface LimitVersionRow extends LimitVersion {
  readonly state: LimitState;
  readonly workbookId: number;
  readonly workbookTitle: string;
  readonly reason: string;
  readonly proposedBy: number;
  readonly proposedAt: number;
  readonly decidedBy: number | null;
  readonly decidedAt: number | null;
  readonly decisionComment: string | null;
}

/** The limits of a point and parameter: what is in force at the moment asked about, and every version behind it, newest first. */
export interface LimitBoardRow {
  readonly pointId: number;
  readonly pointName: string;
  readonly systemId: number;
  readonly systemCode: string;
  readonly parameterId: number;
  readonly limits: LimitsInForce;
  readonly versions: readonly LimitVersionRow[];
  /** The newest reading, where it has a number. */
  readonly latest: { readonly value: number; readonly status: Status } | null;
}

/** That a parameter is read at a point, as it is planned. */
export interface WatchPlanRow {
  readonly pointId: number;
  readonly parameterId: number;
  readonly everyDays: number | null;
  readonly unit: string | null;
  readonly methodId: number | null;
  readonly instrumentId: number | null;
}

/** Limits by parameter under a name, to be laid on many systems at once. */
export interface LimitTemplateRow {
  readonly id: number;
  readonly name: string;
  readonly note: string;
  readonly rows: readonly { readonly parameterId: number; readonly shape: LimitShape }[];
}

/** A workbook of limits: rows proposed, and decided on, in one act. */
export interface LimitWorkbookRow {
  readonly id: number;
  readonly title: string;
  readonly reason: string;
  readonly state: LimitState;
  readonly proposedBy: number;
  readonly proposedAt: number;
  readonly decidedBy: number | null;
  readonly decidedAt: number | null;
}

/** A workbook with its rows, each with what was in force before it, and the signatures under it. */
export interface LimitWorkbookDetail {
  readonly workbook: LimitWorkbookRow;
  readonly rows: readonly {
    readonly id: number;
    readonly parameterId: number;
    readonly effectiveFromAt: number;
    readonly effectiveToAt: number | null;
    readonly shape: LimitShape;
    readonly suspendedReason: string | null;
    readonly place: { readonly systemCode: string; readonly pointName: string } | null;
    readonly before: { readonly shape: LimitShape; readonly suspendedReason: string | null } | null;
  }[];
  readonly signatures: readonly {
    readonly id: number;
    readonly printedName: string;
    readonly signedAt: number;
    readonly meaning: string;
    readonly comment: string | null;
    readonly holds: boolean | null;
  }[];
}
