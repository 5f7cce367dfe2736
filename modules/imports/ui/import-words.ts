import type { ColumnUse, ImportField, ImportState, ReadingRemark, StagedOutcome } from "../model";

/** What a column is understood as. */
export const FIELD_WORDS: Readonly<Record<ImportField, string>> = {
  system: "system",
  point: "point",
  parameter: "parameter",
  value: "value",
  unit: "unit",
  moment: "taken at (day and time)",
  date: "taken at (day)",
  time: "taken at (time of day)",
  method: "method",
  instrument: "instrument",
  note: "note",
  takenBy: "taken by",
};

export function columnWords(use: ColumnUse): string {
  if (use.kind === "unknown") return "not read";
  if (use.kind === "field") return FIELD_WORDS[use.field];
  return use.unit === null ? `values of ${use.parameter}` : `values of ${use.parameter} in ${use.unit}`;
}

export const OUTCOME_WORDS: Readonly<Record<StagedOutcome, string>> = {
  accepted: "accepted",
  duplicate: "duplicate",
  refused: "refused",
};

export const REMARK_WORDS: Readonly<Record<ReadingRemark, string>> = {
  "number-as-text": "a number kept as text in the workbook",
  "formula-result": "the saved result of a formula",
  "doubled-hour-settled": "in the hour that was twice, as you said",
  "time-missing": "without a time of day",
};

/** Who or what is waited for, as a line under the title. */
export const STATE_SENTENCES: Readonly<Record<ImportState, string>> = {
  uploaded: "The file is being looked through. You may leave this page; the work goes on.",
  questions: "The file leaves something open. Answer below, then its rows are checked.",
  checking: "Every row is being checked. You may leave this page; the work goes on.",
  checked: "Checked. Look at what was found, then commit it. Nothing is stored as a reading yet.",
  committing: "The readings are being brought in; all become visible at one moment. You may leave this page.",
  committed: "Committed: the accepted readings count.",
  withdrawn: "Withdrawn: none of its readings counts any more; all stay readable in the history.",
  discarded: "Laid aside. None of it was stored as a reading.",
  failed: "It could not go on. Nothing of it was stored as a reading.",
};
