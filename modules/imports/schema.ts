import { index, integer, real, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import {
  type FileAnswers,
  type FileHeader,
  type FileKind,
  IMPORT_STATES,
  type RowDefaults,
  STAGED_OUTCOMES,
  type StagedCandidate,
  type StagedProblem,
  type StatusCounts,
} from "./model";
import type { SurveyResult } from "./rules/file-questions";

/** A file as it was brought, known by its content. The bytes lie under `storedPath` in the store of uploads. */
export const importFile = sqliteTable(
  "imports_file",
  {
    id: integer("id").primaryKey(),
    sha256: text("sha256").notNull(),
    originalName: text("original_name").notNull(),
    bytes: integer("bytes").notNull(),
    kind: text("kind").$type<FileKind>().notNull(),
    storedPath: text("stored_path").notNull(),
    uploadedBy: integer("uploaded_by").notNull(),
    uploadedAt: integer("uploaded_at").notNull(),
  },
  (table) => [uniqueIndex("imports_file_sha256").on(table.sha256)],
);

/** One bringing-in of a file, from upload to commit, and its withdrawal. */
export const imports = sqliteTable(
  "imports_import",
  {
    id: integer("id").primaryKey(),
    /** `I26-0042`: the year in which it was uploaded and a count within it. */
    code: text("code").notNull(),
    fileId: integer("file_id")
      .notNull()
      .references(() => importFile.id),
    fileName: text("file_name").notNull(),
    state: text("state", { enum: IMPORT_STATES }).notNull(),
    form: text("form", { enum: ["long", "wide"] }).notNull(),
    /** Encoding, delimiter, worksheet and columns as they were found. */
    header: text("header", { mode: "json" }).$type<FileHeader>().notNull(),
    /** What a pass over all rows showed; null until it has been made. */
    survey: text("survey", { mode: "json" }).$type<SurveyResult>(),
    answers: text("answers", { mode: "json" }).$type<FileAnswers>().notNull(),
    defaults: text("defaults", { mode: "json" }).$type<RowDefaults>().notNull(),
    /** The worksheet that a person chose. */
    sheet: text("sheet"),
    /** Raised whenever the rows are checked anew. */
    checkRun: integer("check_run").notNull().default(0),
    acceptedCount: integer("accepted_count"),
    duplicateCount: integer("duplicate_count"),
    refusedCount: integer("refused_count"),
    /** Statuses to be expected of what is accepted. */
    statusCounts: text("status_counts", { mode: "json" }).$type<StatusCounts>(),
    deliveryId: integer("delivery_id"),
    /** Why it did not go on, as sentences. */
    problem: text("problem"),
    uploadedBy: integer("uploaded_by").notNull(),
    uploadedAt: integer("uploaded_at").notNull(),
    checkedAt: integer("checked_at"),
    committedBy: integer("committed_by"),
    commitStartedAt: integer("commit_started_at"),
    committedAt: integer("committed_at"),
    withdrawnBy: integer("withdrawn_by"),
    withdrawnAt: integer("withdrawn_at"),
    withdrawnReason: text("withdrawn_reason"),
  },
  (table) => [
    uniqueIndex("imports_import_code").on(table.code),
    index("imports_import_file").on(table.fileId),
    index("imports_import_state").on(table.state),
  ],
);

/**
 * One reading that a file offers, or a row of it that cannot be read: what came of it and why.
 * Exempt from the history: the file itself is kept, and what is accepted becomes a reading.
 */
export const stagedRow = sqliteTable(
  "imports_staged_row",
  {
    id: integer("id").primaryKey(),
    importId: integer("import_id").notNull(),
    /** Line of a text file, or row number of a worksheet. */
    line: integer("line").notNull(),
    /** Column of the value, from 0; -1 where the whole row is meant. */
    column: integer("column_index").notNull(),
    outcome: text("outcome", { enum: STAGED_OUTCOMES }).notNull(),
    candidate: text("candidate", { mode: "json" }).$type<StagedCandidate>().notNull(),
    problems: text("problems", { mode: "json" }).$type<StagedProblem[]>().notNull(),
    readingUuid: text("reading_uuid"),
    pointId: integer("point_id"),
    parameterId: integer("parameter_id"),
    takenAt: integer("taken_at"),
    value: real("value"),
    qualifier: text("qualifier"),
    /** The code of an answer, or a text. */
    answer: text("answer"),
    /** Point, parameter, moment, value and qualifier as one text; the same again in one file is a duplicate. */
    identity: text("identity"),
    expectedStatus: text("expected_status"),
    expectedSentence: text("expected_sentence"),
  },
  (table) => [
    uniqueIndex("imports_staged_row_place").on(table.importId, table.line, table.column),
    index("imports_staged_row_outcome").on(table.importId, table.outcome, table.id),
    index("imports_staged_row_identity").on(table.importId, table.identity),
    index("imports_staged_row_series").on(table.importId, table.pointId, table.parameterId, table.takenAt),
  ],
);

/** How far the work on an import is. Exempt from the history; what came of the work is told by the import itself. */
export const importProgress = sqliteTable("imports_progress", {
  importId: integer("import_id").primaryKey(),
  /** The check to which the staged rows belong. */
  checkRun: integer("check_run").notNull(),
  /** Rows up to this line are staged whole. */
  lastLine: integer("last_line").notNull(),
  /** How much of the file is surveyed or checked, 0 … 1. */
  share: real("share").notNull(),
  rowsRead: integer("rows_read").notNull(),
  accepted: integer("accepted").notNull(),
  duplicate: integer("duplicate").notNull(),
  refused: integer("refused").notNull(),
  statusCounts: text("status_counts", { mode: "json" }).$type<StatusCounts>().notNull(),
  /** Staged rows up to this id are brought in. */
  committedId: integer("committed_id").notNull(),
  committed: integer("committed").notNull(),
  updatedAt: integer("updated_at").notNull(),
});
