/** What a file of readings is made of, from raw cells to candidate readings. Pure types and limits. */

export {
  type DuplicateCode,
  IMPORT_STATE_WORDS,
  IMPORT_STATES,
  type ImportDetail,
  type ImportProgress,
  type ImportRow,
  type ImportState,
  NO_STATUS_COUNTS,
  type ReadingTexts,
  type ResolvedReading,
  type ResolveProblemCode,
  STAGED_OUTCOMES,
  type StagedCandidate,
  type StagedOutcome,
  type StagedPage,
  type StagedProblem,
  type StagedRowView,
  type StatusCounts,
  type SystemQuestion,
  WORKING_STATES,
} from "./import-model";

/** What the reader accepts; beyond it a file is refused with a sentence. */
export const IMPORT_LIMITS = {
  fileBytes: 200 * 1024 * 1024,
  columns: 300,
  /** Characters of one record of a text file. */
  recordChars: 1024 * 1024,
  /** Lines one quoted field may span before the quote counts as unclosed. */
  quotedLines: 1000,
  /** Characters of one cell that are handed on. */
  cellChars: 32_767,
  zipEntries: 2000,
  inflatedBytes: 300 * 1024 * 1024,
  inflationRatio: 200,
  batchRows: 500,
  /** Rows at the top of a file among which the header is looked for. */
  headerRows: 30,
} as const;

export type FileKind = "csv" | "xlsx";
export type TextEncoding = "utf-8" | "utf-16le" | "utf-16be" | "windows-1252";
export type FileDelimiter = "," | ";" | "\t" | "|";
/** The first day of a workbook's serial dates: 1 January 1900 or 1 January 1904. */
export type SerialEpoch = 1900 | 1904;

/** Whether a workbook's cell is shown as a day, as a time of day (with or without its day), or as neither. */
export type DateStyle = "day" | "time" | null;

/**
 * One cell as the file holds it. Text files have texts only. Workbooks have numbers, yes/no, dates (serials,
 * a whole one being midnight where the cell shows a time),
 * formulas with the result last saved (null when none was), and error values such as #N/A.
 */
export type PlainCell = string | number | boolean | null;
export type RawCell =
  | PlainCell
  | { kind: "serial"; value: number; showsTime: boolean }
  | { kind: "formula"; value: PlainCell; dateStyle: DateStyle }
  | { kind: "error"; text: string };

/** One record. `line` is the line of a text file on which it begins, or the row number of a worksheet. */
export type RawRow = { line: number; cells: RawCell[]; problem?: RowProblem };

export type ImportField =
  | "system"
  | "point"
  | "parameter"
  | "value"
  | "unit"
  | "moment"
  | "date"
  | "time"
  | "method"
  | "instrument"
  | "note"
  | "takenBy";

/** What one column is read as. `unknown` columns are shown to the person and not read. */
export type ColumnUse =
  | { kind: "field"; field: ImportField }
  | { kind: "parameter"; parameter: string; unit: string | null }
  | { kind: "unknown" };

export type MappedColumn = { index: number; header: string; use: ColumnUse };

/**
 * Which column means what. `long`: a row is one reading (columns parameter and value); `wide`: a row is one
 * moment at one place, with a column per parameter. May be changed by a person and saved.
 */
export type ColumnMap = { form: "long" | "wide"; headerLine: number; columns: MappedColumn[] };

/** A parameter that headers may name; names are compared without case, spaces and signs. */
export type KnownParameter = { code: string; names: readonly string[] };

/** A number as it was written, never more certain than the text: relation and qualifier stand apart. */
export type ParsedValue =
  | { kind: "number"; number: number; relation: "<" | ">" | null; qualifier: string | null }
  /** "ND", "<LOD": below a limit that the file does not name; "TNTC": above. */
  | { kind: "unquantified"; relation: "<" | ">"; qualifier: string }
  /** No number: a choice, a yes or no, a text. Whether that will do depends on the parameter. */
  | { kind: "text"; text: string };

/** Remarks about how a value was read; shown in the preview, none of them a refusal. */
export type ReadingRemark = "number-as-text" | "formula-result" | "doubled-hour-settled" | "time-missing";

/** One reading that the file offers. Nothing in it has been looked up: names are as typed. */
export type CandidateReading = {
  line: number;
  /** Index of the column the value stands in, from 0. */
  column: number;
  system: string | null;
  point: string | null;
  parameter: string;
  valueText: string;
  value: ParsedValue;
  unit: string | null;
  /** UTC epoch ms. */
  takenAt: number;
  takenAtText: string;
  method: string | null;
  instrument: string | null;
  note: string | null;
  takenBy: string | null;
  remarks: ReadingRemark[];
};

/** Why a row, or one cell of it, is not read: where, a code, what is wrong and how to mend it, as sentences. */
export type RowProblem = {
  line: number;
  /** Index of the column from 0; null when the whole row is meant. */
  column: number | null;
  /** The column's header, for the person. */
  columnName: string | null;
  code: RowProblemCode;
  reason: string;
  mend: string;
  /** What stood there, shortened. */
  text: string | null;
};

export type RowProblemCode =
  | "too-many-fields"
  | "too-few-fields"
  | "stray-quote"
  | "text-after-quote"
  | "missing-value"
  | "missing-parameter"
  | "missing-system"
  | "missing-moment"
  | "bad-date"
  | "bad-time"
  | "two-digit-year"
  | "date-order"
  | "phantom-day"
  | "missing-hour"
  | "doubled-hour"
  | "decimal-sign"
  | "bad-number"
  | "formula-without-result"
  | "error-value"
  | "cell-too-long";

export type DateOrder = "day-first" | "month-first";
export type DecimalSign = "point" | "comma";

/** One answer a person may give, with what it makes of the example. */
export type QuestionChoice<T extends string> = { answer: T; label: string; reading: string };

/** Something a file does not say itself. Asked once per file, before the preview. */
export type FileQuestion =
  | {
      kind: "date-order";
      question: string;
      line: number;
      example: string;
      rows: number;
      choices: QuestionChoice<DateOrder>[];
    }
  | {
      kind: "decimal-sign";
      question: string;
      line: number;
      example: string;
      rows: number;
      choices: QuestionChoice<DecimalSign>[];
    }
  | {
      kind: "doubled-hour";
      question: string;
      line: number;
      example: string;
      rows: number;
      choices: QuestionChoice<"earlier" | "later" | "refuse">[];
    };

/** What a person answered. What is left out has not been asked or not been answered. */
export type FileAnswers = {
  dateOrder?: DateOrder;
  decimalSign?: DecimalSign;
  doubledHour?: "earlier" | "later" | "refuse";
};

/** What the file itself shows about its conventions; `null` where it shows nothing. Answers go before it. */
export type FileConventions = { dateOrder: DateOrder | null; decimalSign: DecimalSign | null };

/** Used where the file has no such column or the cell is empty. */
export type RowDefaults = {
  system?: string;
  point?: string;
  method?: string;
  instrument?: string;
  takenBy?: string;
  /** "HH:MM" for dates that come without a time of day; the readings are remarked `time-missing`. */
  timeOfDay?: string;
};

/** How a file's cells are to be read, once its questions are answered. */
export type RowContext = {
  kind: FileKind;
  /** The facility's IANA zone, in which times without an offset are meant. */
  zone: string;
  serialEpoch: SerialEpoch;
  answers: FileAnswers;
  defaults: RowDefaults;
};

/** What is known about a file before its rows are read. */
export type FileHeader = {
  kind: FileKind;
  /** SHA-256 of the bytes, hexadecimal. */
  sha256: string;
  bytes: number;
  encoding: TextEncoding | null;
  hasBom: boolean;
  delimiter: FileDelimiter | null;
  serialEpoch: SerialEpoch;
  /** The worksheet that is read, and those that could be. */
  sheet: string | null;
  sheets: string[];
  columnMap: ColumnMap;
};

/** Why a whole file is not read. `line` where one line is to blame. */
export type FileRefusalCode =
  | "empty-file"
  | "no-rows"
  | "wrong-type"
  | "old-workbook"
  | "macro-workbook"
  | "encrypted-workbook"
  | "damaged-workbook"
  | "too-large"
  | "zip-bomb"
  | "too-many-columns"
  | "nul-bytes"
  | "bad-encoding"
  | "unclosed-quote"
  | "line-too-long"
  | "duplicate-headers"
  | "no-header"
  | "no-such-sheet"
  | "out-of-memory"
  | "took-too-long"
  | "stopped"
  | "reader-failed";

export type FileRefusal = { code: FileRefusalCode; reason: string; mend: string; line: number | null };
