import type {
  CandidateReading,
  ColumnMap,
  ImportField,
  RawCell,
  RawRow,
  ReadingTexts,
  RowProblem,
  SerialEpoch,
  StagedProblem,
} from "../model";
import { fromSerial } from "./excel-serial";
import { cellText, fieldCell, layoutOf, plainCell, type RowLayout } from "./row-cells";

/** Stands for a whole row where no one column is meant. */
export const WHOLE_ROW = -1;

/** One reading of a file before anything is looked up: readable, or refused with its problems. */
export type DraftRow = {
  line: number;
  /** Column of the value, `WHOLE_ROW` where the row cannot even be taken apart. */
  column: number;
  texts: ReadingTexts;
  candidate: CandidateReading | null;
  problems: StagedProblem[];
};

type ReadBatch = { rows: RawRow[]; candidates: CandidateReading[]; problems: RowProblem[] };

/** The texts of a candidate as the file has them. */
function candidateTexts(candidate: CandidateReading): ReadingTexts {
  return {
    system: candidate.system ?? "",
    point: candidate.point ?? "",
    parameter: candidate.parameter,
    value: candidate.valueText,
    unit: candidate.unit ?? "",
    takenAt: candidate.takenAtText,
    method: candidate.method ?? "",
    instrument: candidate.instrument ?? "",
    note: candidate.note ?? "",
    takenBy: candidate.takenBy ?? "",
  };
}

/** A cell as a person reads it: a workbook's day number as its day and time. */
function shownText(cell: RawCell | undefined, epoch: SerialEpoch): string {
  const plain = plainCell(cell);
  if (plain === null || typeof plain !== "object" || plain.kind !== "serial") return cellText(cell);
  const read = fromSerial(plain.value, epoch);
  if (read.kind === "moment") return `${read.on} ${read.at}`;
  return read.kind === "time" ? read.at : cellText(cell);
}

/**
 * The readings of a batch, in the order of the file: those that can be read, and those that cannot with their problems.
 * A problem of a whole row of the wide form stands with each value of the row, so that every value is counted once.
 */
export class RowDrafter {
  readonly #layout: RowLayout;
  readonly #form: ColumnMap["form"];

  constructor(
    columnMap: ColumnMap,
    private readonly epoch: SerialEpoch,
  ) {
    this.#layout = layoutOf(columnMap);
    this.#form = columnMap.form;
  }

  draft({ rows, candidates, problems }: ReadBatch): DraftRow[] {
    const drafts: DraftRow[] = candidates.map((candidate) => ({
      line: candidate.line,
      column: candidate.column,
      texts: candidateTexts(candidate),
      candidate,
      problems: [],
    }));
    const byLine = new Map<number, RowProblem[]>();
    for (const each of problems) byLine.set(each.line, [...(byLine.get(each.line) ?? []), each]);
    for (const row of rows) drafts.push(...this.#refused(row, byLine.get(row.line) ?? []));
    return drafts.sort((a, b) => a.line - b.line || a.column - b.column);
  }

  #refused(row: RawRow, problems: RowProblem[]): DraftRow[] {
    if (problems.length === 0) return [];
    const isBroken = row.problem !== undefined || problems.some(({ code }) => SHAPE_CODES.has(code));
    if (isBroken) return [this.#draft(row, WHOLE_ROW, problems)];
    if (this.#form === "long")
      return [this.#draft(row, this.#layout.values[0]?.index ?? WHOLE_ROW, problems)];
    const columns = this.#layout.values.map((column) => column.index);
    const shared = problems.filter(({ column }) => column === null || !columns.includes(column));
    const own = (index: number) => problems.filter(({ column }) => column === index);
    const filled = columns.filter(
      (index) => own(index).length > 0 || (shared.length > 0 && cellText(row.cells[index]) !== ""),
    );
    if (filled.length === 0) return [this.#draft(row, WHOLE_ROW, problems)];
    return filled.map((index) => this.#draft(row, index, [...shared, ...own(index)]));
  }

  #draft(row: RawRow, column: number, problems: RowProblem[]): DraftRow {
    return {
      line: row.line,
      column,
      texts: this.#texts(row, column),
      candidate: null,
      problems: problems.map(({ columnName, code, reason, mend, text }) => ({
        columnName,
        code,
        reason,
        mend,
        text,
      })),
    };
  }

  #texts(row: RawRow, column: number): ReadingTexts {
    const text = (field: ImportField) => shownText(fieldCell(row, this.#layout, field), this.epoch);
    const of = this.#layout.values.find((each) => each.index === column);
    const named = of?.use.kind === "parameter" ? of.use : null;
    const moment = [text("moment"), text("date"), text("time")].filter((part) => part !== "").join(" ");
    return {
      system: text("system"),
      point: text("point"),
      parameter: named ? named.parameter : text("parameter"),
      value: of ? shownText(row.cells[column], this.epoch) : "",
      unit: named ? (named.unit ?? "") : text("unit"),
      takenAt: moment,
      method: text("method"),
      instrument: text("instrument"),
      note: text("note"),
      takenBy: text("takenBy"),
    };
  }
}

/** The row has too many or too few fields, or a quotation mark where none may be: its cells are not where they belong. */
const SHAPE_CODES: ReadonlySet<string> = new Set([
  "too-many-fields",
  "too-few-fields",
  "stray-quote",
  "text-after-quote",
]);
