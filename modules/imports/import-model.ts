import type {
  FileAnswers,
  FileHeader,
  FileKind,
  FileQuestion,
  ReadingRemark,
  RowDefaults,
  RowProblemCode,
} from "./model";

/** The way of an import. */
export const IMPORT_STATES = [
  "uploaded",
  "questions",
  "checking",
  "checked",
  "committing",
  "committed",
  "withdrawn",
  "discarded",
  "failed",
] as const;
export type ImportState = (typeof IMPORT_STATES)[number];

/** What each state is called, and who is waited for. */
export const IMPORT_STATE_WORDS: Readonly<Record<ImportState, string>> = {
  uploaded: "being looked through",
  questions: "waits for answers",
  checking: "being checked",
  checked: "waits to be committed",
  committing: "being committed",
  committed: "committed",
  withdrawn: "withdrawn",
  discarded: "discarded",
  failed: "could not go on",
};

/** States in which the server works and a page looks again by itself. */
export const WORKING_STATES: readonly ImportState[] = ["uploaded", "checking", "committing"];

export const STAGED_OUTCOMES = ["accepted", "duplicate", "refused"] as const;
export type StagedOutcome = (typeof STAGED_OUTCOMES)[number];

/** Why a reading of a file cannot be taken although its row can be read. */
export type ResolveProblemCode =
  | "unknown-system"
  | "retired-system"
  | "other-area"
  | "unknown-point"
  | "unused-point"
  | "unknown-parameter"
  | "retired-parameter"
  | "bad-value"
  | "bad-unit"
  | "future"
  | "unknown-method"
  | "unknown-instrument"
  | "unknown-person"
  | "too-long";

/** Why a reading is a duplicate. */
export type DuplicateCode = "already-in-force" | "twice-in-file";

export type StagedProblem = {
  columnName: string | null;
  code: RowProblemCode | ResolveProblemCode | DuplicateCode;
  reason: string;
  mend: string;
  text: string | null;
};

/** The texts of one reading as the file has them, to be shown and to be written into the list of rejects. */
export type ReadingTexts = {
  system: string;
  point: string;
  parameter: string;
  value: string;
  unit: string;
  takenAt: string;
  method: string;
  instrument: string;
  note: string;
  takenBy: string;
};

/** What of a reading is found: everything that a stored reading needs. */
export type ResolvedReading = {
  pointId: number;
  parameterId: number;
  /** As typed. */
  typedText: string;
  /** The same with a decimal point. */
  plainText: string;
  typedUnit: string | null;
  takenAt: number;
  takenBy: number | null;
  methodId: number | null;
  instrumentId: number | null;
  note: string | null;
};

export type StagedCandidate = {
  texts: ReadingTexts;
  remarks: ReadingRemark[];
  reading: ResolvedReading | null;
};

/** How many readings have which status; codes of measurements. */
export type StatusCounts = Record<"within" | "watch" | "out" | "implausible" | "unjudged" | "none", number>;

export const NO_STATUS_COUNTS: StatusCounts = {
  within: 0,
  watch: 0,
  out: 0,
  implausible: 0,
  unjudged: 0,
  none: 0,
};

/** How far the server is with an import. */
export type ImportProgress = {
  share: number;
  rowsRead: number;
  accepted: number;
  duplicate: number;
  refused: number;
  statusCounts: StatusCounts;
  committed: number;
};

/** An import in a list. */
export type ImportRow = {
  id: number;
  code: string;
  fileName: string;
  state: ImportState;
  form: "long" | "wide";
  bytes: number;
  acceptedCount: number | null;
  duplicateCount: number | null;
  refusedCount: number | null;
  uploadedAt: number;
  uploadedByName: string;
  committedAt: number | null;
  problem: string | null;
};

/** What is asked beside the questions of the file itself. */
export type SystemQuestion = { question: string; systems: { code: string; name: string }[] };

/** An import with everything its page shows. */
export type ImportDetail = ImportRow & {
  sha256: string;
  kind: FileKind;
  header: FileHeader;
  answers: FileAnswers;
  defaults: RowDefaults;
  sheet: string | null;
  questions: FileQuestion[];
  systemQuestion: SystemQuestion | null;
  statusCounts: StatusCounts | null;
  progress: ImportProgress | null;
  checkedAt: number | null;
  committedByName: string | null;
  withdrawnAt: number | null;
  withdrawnByName: string | null;
  withdrawnReason: string | null;
};

/** One reading of a file in the preview. */
export type StagedRowView = {
  id: number;
  line: number;
  columnName: string | null;
  outcome: StagedOutcome;
  texts: ReadingTexts;
  remarks: ReadingRemark[];
  problems: StagedProblem[];
  expectedStatus: string | null;
  expectedSentence: string | null;
};

export type StagedPage = { rows: StagedRowView[]; next: number | null };
