/** What a parameter's value is made of. */
export const PARAMETER_KINDS = ["number", "count", "yes-no", "choice", "text"] as const;
export type ParameterKind = (typeof PARAMETER_KINDS)[number];

/** The groups in which parameters are listed on screen, in this order. */
export const PARAMETER_GROUPS = [
  "physics",
  "gases",
  "ph-and-alkalinity",
  "nutrients",
  "ions-and-metals",
  "disinfection",
  "microbiology",
  "source-water",
  "equipment",
  "observation",
] as const;
export type ParameterGroup = (typeof PARAMETER_GROUPS)[number];

/** What an answer says by itself about the water or the machine; "none" is a remark that is not judged. */
export const ANSWER_MEANINGS = ["within", "watch", "out", "none"] as const;
export type AnswerMeaning = (typeof ANSWER_MEANINGS)[number];

/** One answer of a yes/no or choice parameter. Yes/no parameters have exactly the codes "yes" and "no". */
export interface ParameterChoice {
  readonly code: string;
  readonly label: string;
  readonly means: AnswerMeaning;
}

/** The values a parameter can have at all; either side may be open (null). Canonical unit, inclusive. */
export interface PlausibleBounds {
  readonly low: number | null;
  readonly high: number | null;
}

/**
 * What is measured or checked: one entry of the catalogue, and the shape in which a parameter is handed to
 * forms and rules. Numbers are in the canonical unit.
 */
export interface ParameterDefinition {
  /** Short code people type and files carry, such as `ph_nbs`. */
  readonly code: string;
  readonly name: string;
  readonly kind: ParameterKind;
  /** Canonical unit, a code of `lib/units`; null for answers, texts and bare numbers. */
  readonly unit: string | null;
  /** Units in which a value may be typed; the canonical one is always among them when there is one. */
  readonly acceptedUnits: readonly string[];
  /** Digits shown after the point, in the canonical unit. */
  readonly decimals: number;
  readonly plausible: PlausibleBounds;
  readonly choices: readonly ParameterChoice[];
  readonly group: ParameterGroup;
  readonly mayBeNegative: boolean;
  readonly note: string;
}

/** Whether an instrument may be used. */
export const INSTRUMENT_STATES = ["in-use", "out-of-use", "retired"] as const;
export type InstrumentState = (typeof INSTRUMENT_STATES)[number];

/** What a check of an instrument found. "adjusted": found off and put right. */
export const CHECK_VERDICTS = ["good", "adjusted", "failed"] as const;
export type CheckVerdict = (typeof CHECK_VERDICTS)[number];

/** A parameter of the facility as other modules see it: its definition with its id. */
export interface FacilityParameter extends ParameterDefinition {
  readonly id: number;
  readonly isRetired: boolean;
}

/** Where an instrument stands with its checks today. */
export const CHECK_STATES = ["not-checked-by-date", "never-checked", "failed", "overdue", "due"] as const;
export type CheckState = (typeof CHECK_STATES)[number];

/** When the next check is due ("YYYY-MM-DD"; null where none is), and how that stands today. */
export interface CheckDue {
  readonly state: CheckState;
  readonly dueOn: string | null;
  /** A check is missing: never made where one is asked for, failed, or its day has passed. */
  readonly isOverdue: boolean;
}

/** A method as lists and forms know it. */
export interface MethodRow {
  readonly id: number;
  readonly code: string;
  readonly name: string;
  readonly parameterId: number;
  readonly parameterName: string;
  readonly principle: string;
  readonly isRetired: boolean;
}

/** One check of an instrument. Numbers are in `unit`, as typed. */
export interface InstrumentCheckRow {
  readonly id: number;
  readonly parameterId: number | null;
  readonly parameterName: string | null;
  readonly checkedAt: number;
  readonly checkedBy: number;
  readonly standard: string;
  readonly standardValue: number | null;
  readonly asFound: number | null;
  readonly asLeft: number | null;
  readonly unit: string | null;
  readonly verdict: CheckVerdict;
  readonly note: string;
  readonly dueOn: string | null;
}

/** An instrument with its newest check. */
export interface InstrumentRow {
  readonly id: number;
  readonly code: string;
  readonly name: string;
  readonly serial: string;
  readonly principle: string;
  readonly scale: string | null;
  readonly state: InstrumentState;
  readonly checkEveryDays: number | null;
  readonly retiredReason: string | null;
  readonly lastCheck: InstrumentCheckRow | null;
  readonly due: CheckDue;
}

/** An instrument with all its checks, newest first. */
export interface InstrumentDetail extends InstrumentRow {
  readonly checks: readonly InstrumentCheckRow[];
}

export {
  ANSWER_MEANING_WORDS,
  CHECK_VERDICT_WORDS,
  INSTRUMENT_STATE_WORDS,
  PARAMETER_GROUP_WORDS,
  PARAMETER_KIND_WORDS,
} from "./words.data";
