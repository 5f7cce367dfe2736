import type {
  CandidateReading,
  ColumnMap,
  FileAnswers,
  FileHeader,
  FileRefusal,
  KnownParameter,
  RawRow,
  RowDefaults,
  RowProblem,
} from "@/modules/imports/model";
import type { SurveyResult } from "@/modules/imports/rules/file-questions";

/**
 * What is to be done with the rows. `survey`: look for what must be asked, hand no rows on.
 * `map`: candidate readings and problems. `rows`: the raw rows.
 */
export type ReaderMode = "survey" | "map" | "rows";

/** One reading of one file. Plain data: it goes to another process. */
export type ReaderRequest = {
  path: string;
  /** The name the file was brought under; its ending must agree with the content. */
  name: string;
  mode: ReaderMode;
  /** The facility's IANA zone. */
  zone: string;
  /** Parameters that headers may name. */
  parameters: readonly KnownParameter[];
  defaults: RowDefaults;
  /** What a person and a survey have settled (`settledAnswers`); for `map`. */
  answers: FileAnswers;
  /** A column map made or changed by a person, in place of the one that is found. */
  columnMap?: ColumnMap;
  /** The worksheet to read; the first one otherwise. */
  sheet?: string;
  /** Go on behind this line, after an interruption. */
  afterLine?: number;
  maxBytes?: number;
};

/** Up to 500 rows' worth. In mode `map`, `rows` holds the rows that have problems, for the list of rejects. */
export type ReaderBatch = {
  /** Rows with anything in them, in this batch. */
  rowsRead: number;
  /** Line of the last row in this batch. */
  lastLine: number;
  /** How much of the file is read, 0 … 1. */
  share: number;
  rows: RawRow[];
  candidates: CandidateReading[];
  problems: RowProblem[];
};

export type ReaderReport = {
  rows: number;
  /** In mode `survey`. */
  survey: SurveyResult | null;
  /** The most memory the reading process held, bytes. */
  peakRssBytes: number;
};

export type ToReader = { kind: "open"; request: ReaderRequest } | { kind: "next" };
export type FromReader =
  | { kind: "header"; header: FileHeader }
  | { kind: "batch"; batch: ReaderBatch }
  | { kind: "end"; report: ReaderReport }
  | { kind: "refused"; refusal: FileRefusal }
  | { kind: "failed"; detail: string };
