import {
  type CandidateReading,
  type ColumnMap,
  IMPORT_LIMITS,
  type ImportField,
  type MappedColumn,
  type ParsedValue,
  type RawCell,
  type RawRow,
  type ReadingRemark,
  type RowContext,
  type RowProblem,
  type RowProblemCode,
} from "@/modules/imports/model";
import { type MomentResult, parseMoment } from "@/modules/imports/rules/parse-moment";
import { parseValue } from "@/modules/imports/rules/parse-number";
import {
  cellText,
  fieldCell,
  isBlankRow,
  isEmptyFormula,
  layoutOf,
  momentCells,
  plainCell,
  type RowLayout,
} from "@/modules/imports/rules/row-cells";

export type MappedRow = { candidates: CandidateReading[]; problems: RowProblem[] };

const SHOWN_CHARS = 200;
const shorten = (text: string): string =>
  text.length > SHOWN_CHARS ? `${text.slice(0, SHOWN_CHARS)}…` : text;

type Sentence = { code: RowProblemCode; reason: string; mend: string };

function problem(
  line: number,
  column: MappedColumn | null,
  text: string | null,
  sentence: Sentence,
): RowProblem {
  return {
    line,
    column: column?.index ?? null,
    columnName: column?.header ?? null,
    ...sentence,
    text: text === null ? null : shorten(text),
  };
}

/**
 * Turns the rows of one file into candidate readings, or into problems that name line, column, reason and mend.
 * A row of the long form gives one candidate; a row of the wide form one per filled parameter column, and a fault in
 * one of them leaves the others good. Nothing is looked up: names stay as typed.
 */
export class RowMapper {
  readonly #layout: RowLayout;
  readonly #map: ColumnMap;
  readonly #context: RowContext;

  constructor(columnMap: ColumnMap, context: RowContext) {
    this.#map = columnMap;
    this.#layout = layoutOf(columnMap);
    this.#context = context;
  }

  map(row: RawRow): MappedRow {
    if (isBlankRow(row)) return { candidates: [], problems: [] };
    const shape = row.problem ?? this.#shapeProblem(row);
    if (shape) return { candidates: [], problems: [shape] };
    const shared = this.#shared(row);
    const mapped: MappedRow = { candidates: [], problems: [...shared.problems] };
    for (const column of this.#layout.values) this.#addValue(row, column, shared, mapped);
    return mapped;
  }

  #shapeProblem(row: RawRow): RowProblem | null {
    const { width } = this.#layout;
    const extra = row.cells.slice(width).findIndex((cell) => cellText(cell) !== "");
    if (extra >= 0) {
      return problem(row.line, null, row.cells.map(cellText).join(" · "), {
        code: "too-many-fields",
        reason: `The row has ${row.cells.length} fields where the header has ${width}.`,
        mend: "Put fields that hold the delimiter in quotation marks, or give the extra column a header.",
      });
    }
    if (this.#context.kind === "csv" && row.cells.length < width) {
      return problem(row.line, null, row.cells.map(cellText).join(" · "), {
        code: "too-few-fields",
        reason: `The row has ${row.cells.length} fields where the header has ${width}.`,
        mend: "Check that no delimiter or line end is missing; empty fields still need their delimiter.",
      });
    }
    return null;
  }

  #text(row: RawRow, field: ImportField): string | null {
    const text = cellText(fieldCell(row, this.#layout, field));
    return text === "" ? null : text;
  }

  /** What all values of a row have in common: when, where, by whom, with what. */
  #shared(row: RawRow): Shared {
    const problems: RowProblem[] = [];
    const moment = parseMoment(momentCells(row, this.#layout), this.#context);
    const momentFault = momentSentence(moment);
    const column = this.#layout.fields.get("moment") ?? this.#layout.fields.get("date") ?? null;
    if (momentFault) problems.push(problem(row.line, column, moment.text, momentFault));
    const system = this.#text(row, "system") ?? this.#context.defaults.system ?? null;
    if (system === null)
      problems.push(problem(row.line, this.#layout.fields.get("system") ?? null, null, NO_SYSTEM));
    for (const [field, where] of this.#layout.fields) {
      const fault = field === "value" ? null : cellFault(row.cells[where.index]);
      const isMomentField = field === "moment" || field === "date" || field === "time";
      if (fault && !isMomentField)
        problems.push(problem(row.line, where, cellText(row.cells[where.index]), fault));
    }
    return { moment, system, problems };
  }

  #addValue(row: RawRow, column: MappedColumn, shared: Shared, into: MappedRow): void {
    const cell = row.cells[column.index];
    const valueText = cellText(cell);
    const isWide = this.#map.form === "wide";
    if (isWide && valueText === "" && !isEmptyFormula(cell)) return;
    const parameter = column.use.kind === "parameter" ? column.use.parameter : this.#text(row, "parameter");
    if (parameter === null) {
      into.problems.push(problem(row.line, this.#layout.fields.get("parameter") ?? null, null, NO_PARAMETER));
    }
    const value = readValue(cell, valueText, this.#context);
    if ("code" in value) into.problems.push(problem(row.line, column, valueText, value));
    const isWhole = shared.problems.length === 0;
    if ("code" in value || parameter === null || !isWhole || shared.moment.kind !== "moment") return;
    const { defaults } = this.#context;
    into.candidates.push({
      line: row.line,
      column: column.index,
      system: shared.system,
      point: this.#text(row, "point") ?? defaults.point ?? null,
      parameter,
      valueText,
      value,
      unit: column.use.kind === "parameter" ? column.use.unit : this.#text(row, "unit"),
      takenAt: shared.moment.epochMs,
      takenAtText: shared.moment.text,
      method: this.#text(row, "method") ?? defaults.method ?? null,
      instrument: this.#text(row, "instrument") ?? defaults.instrument ?? null,
      note: this.#text(row, "note"),
      takenBy: this.#text(row, "takenBy") ?? defaults.takenBy ?? null,
      remarks: remarks(cell, value, shared.moment, this.#context),
    });
  }
}

type Shared = { moment: MomentResult; system: string | null; problems: RowProblem[] };

const NO_SYSTEM: Sentence = {
  code: "missing-system",
  reason: "The row names no system.",
  mend: "Fill in the system's code, or choose one system for the whole file.",
};
const NO_PARAMETER: Sentence = {
  code: "missing-parameter",
  reason: "The row names no parameter.",
  mend: "Fill in the parameter's code or name.",
};

function momentSentence(moment: MomentResult): Sentence | null {
  if (moment.kind === "moment") return null;
  if (moment.kind === "refused") return { code: moment.code, reason: moment.reason, mend: moment.mend };
  if (moment.kind === "two-orders") {
    return {
      code: "date-order",
      reason: `“${moment.text}” can be two days, depending on whether the day or the month comes first.`,
      mend: "Say which comes first in this file.",
    };
  }
  return {
    code: "doubled-hour",
    reason: `“${moment.text}” was twice: the clocks went back.`,
    mend: `Say which is meant, or add the offset UTC${moment.earlier.offset} or UTC${moment.later.offset}.`,
  };
}

/** What makes any cell unreadable, whatever it is for. */
function cellFault(cell: RawCell | undefined): Sentence | null {
  if (isEmptyFormula(cell)) {
    return {
      code: "formula-without-result",
      reason: "The cell holds a formula whose result was not saved with the file.",
      mend: "Open the workbook, let it calculate, save it, or paste the values in place of the formulas.",
    };
  }
  const plain = plainCell(cell);
  if (plain !== null && typeof plain === "object" && plain.kind === "error") {
    return {
      code: "error-value",
      reason: `The cell shows the error ${plain.text} in place of a value.`,
      mend: "Mend the formula, or empty the cell.",
    };
  }
  if (typeof plain === "string" && plain.length > IMPORT_LIMITS.cellChars) {
    return {
      code: "cell-too-long",
      reason: `The cell holds ${plain.length} characters.`,
      mend: `Shorten it to at most ${IMPORT_LIMITS.cellChars} characters.`,
    };
  }
  return null;
}

function readValue(cell: RawCell | undefined, text: string, context: RowContext): ParsedValue | Sentence {
  const fault = cellFault(cell);
  if (fault) return fault;
  const plain = plainCell(cell);
  if (text === "") {
    return { code: "missing-value", reason: "The value is missing.", mend: "Fill it in, or remove the row." };
  }
  if (plain !== null && typeof plain === "object") {
    return {
      code: "bad-number",
      reason: "The cell is formatted as a date, so what was typed as its value is no longer known.",
      mend: "Format the column as a number and type the value again.",
    };
  }
  if (typeof plain === "number") return { kind: "number", number: plain, relation: null, qualifier: null };
  if (typeof plain === "boolean") return { kind: "text", text };
  return fromText(text, context);
}

function fromText(text: string, { answers }: RowContext): ParsedValue | Sentence {
  const result = parseValue(text, answers.decimalSign ?? null);
  if (result.kind === "value") return result.value;
  if (result.kind === "ambiguous") {
    return {
      code: "decimal-sign",
      reason: `“${text}” can be ${result.asPoint} or ${result.asComma}.`,
      mend: "Say which decimal sign this file has.",
    };
  }
  if (result.kind === "wrong-sign") {
    const sign = answers.decimalSign === "comma" ? "a comma" : "a point";
    return {
      code: "decimal-sign",
      reason: `“${text}” does not fit ${sign} as decimal sign, with which this file is read.`,
      mend: "Write all numbers of the file with the same decimal sign.",
    };
  }
  return { code: "bad-number", reason: `“${text}” is too large for a number.`, mend: "Correct the value." };
}

function remarks(
  cell: RawCell | undefined,
  value: ParsedValue,
  moment: Extract<MomentResult, { kind: "moment" }>,
  context: RowContext,
): ReadingRemark[] {
  const isFormula = cell !== null && typeof cell === "object" && cell.kind === "formula";
  const isNumberText =
    context.kind === "xlsx" && value.kind === "number" && typeof plainCell(cell) === "string";
  const found: [boolean, ReadingRemark][] = [
    [isNumberText, "number-as-text"],
    [isFormula, "formula-result"],
    [moment.isSettled, "doubled-hour-settled"],
    [moment.isTimeMissing, "time-missing"],
  ];
  return found.filter(([holds]) => holds).map(([, remark]) => remark);
}
