import { formatDay } from "@/lib/zone";
import type {
  ColumnMap,
  DateOrder,
  FileAnswers,
  FileConventions,
  FileQuestion,
  RawRow,
  RowContext,
} from "@/modules/imports/model";
import { type MomentResult, parseMoment } from "@/modules/imports/rules/parse-moment";
import { bothReadings, decimalEvidence } from "@/modules/imports/rules/parse-number";
import {
  isBlankRow,
  layoutOf,
  momentCells,
  plainCell,
  type RowLayout,
} from "@/modules/imports/rules/row-cells";

/** How often something was seen, and where first. */
type Tally<T> = { rows: number; first: (T & { line: number; text: string }) | null };

const tally = <T>(): Tally<T> => ({ rows: 0, first: null });

function count<T>(into: Tally<T>, line: number, text: string, what: T): void {
  into.rows += 1;
  into.first ??= { ...what, line, text };
}

type Doubled = { earlier: string; later: string };

/** What a file was found to hold after a pass over its rows: small, plain data that can be stored with the import. */
export type SurveyResult = {
  rows: number;
  conventions: FileConventions;
  dateOrder: {
    seen: Record<DateOrder, Tally<object>>;
    open: Tally<{ dayFirst: string; monthFirst: string }>;
  };
  decimal: { point: Tally<object>; comma: Tally<object>; open: Tally<{ asPoint: number; asComma: number }> };
  doubled: Record<DateOrder | "anyOrder", Tally<Doubled>>;
};

/**
 * Looks through the rows of a file, once, for what the file itself shows about its conventions and what only a
 * person can say: order of day and month, decimal sign, the hour that the clock showed twice.
 */
export class FileSurvey {
  readonly #layout: RowLayout;
  readonly #context: RowContext;
  readonly #result: SurveyResult = {
    rows: 0,
    conventions: { dateOrder: null, decimalSign: null },
    dateOrder: { seen: { "day-first": tally(), "month-first": tally() }, open: tally() },
    decimal: { point: tally(), comma: tally(), open: tally() },
    doubled: { anyOrder: tally(), "day-first": tally(), "month-first": tally() },
  };

  constructor(columnMap: ColumnMap, context: Pick<RowContext, "kind" | "zone" | "serialEpoch" | "defaults">) {
    this.#layout = layoutOf(columnMap);
    this.#context = { ...context, answers: {} };
  }

  add(row: RawRow): void {
    if (isBlankRow(row)) return;
    this.#result.rows += 1;
    if (row.problem) return;
    this.#addMoment(row);
    for (const column of this.#layout.values) this.#addValue(row.line, plainCell(row.cells[column.index]));
  }

  /** Everything seen; call after the last row. */
  end(): SurveyResult {
    const { seen } = this.#result.dateOrder;
    const { point, comma } = this.#result.decimal;
    const dateOrder = only(seen["day-first"].rows, "day-first", seen["month-first"].rows, "month-first");
    const decimalSign = only(point.rows, "point", comma.rows, "comma");
    return { ...this.#result, conventions: { dateOrder, decimalSign } };
  }

  #addMoment(row: RawRow): void {
    const cells = momentCells(row, this.#layout);
    const found = parseMoment(cells, this.#context);
    if (found.kind !== "two-orders") {
      if ("order" in found && found.order)
        count(this.#result.dateOrder.seen[found.order], row.line, found.text, {});
      this.#addDoubled("anyOrder", row.line, found);
      return;
    }
    const dayFirst = found.dayFirst.dayFirst ?? "";
    const monthFirst = found.monthFirst.monthFirst ?? "";
    count(this.#result.dateOrder.open, row.line, found.text, { dayFirst, monthFirst });
    for (const order of ["day-first", "month-first"] as const) {
      this.#addDoubled(
        order,
        row.line,
        parseMoment(cells, { ...this.#context, answers: { dateOrder: order } }),
      );
    }
  }

  #addDoubled(order: DateOrder | "anyOrder", line: number, found: MomentResult): void {
    if (found.kind !== "doubled") return;
    const { earlier, later } = found;
    count(this.#result.doubled[order], line, found.text, { earlier: earlier.offset, later: later.offset });
  }

  #addValue(line: number, cell: ReturnType<typeof plainCell>): void {
    if (typeof cell !== "string") return;
    const evidence = decimalEvidence(cell);
    const { decimal } = this.#result;
    if (evidence === "point" || evidence === "comma") count(decimal[evidence], line, cell.trim(), {});
    const both = evidence === "ambiguous" ? bothReadings(cell) : null;
    if (both) count(decimal.open, line, cell.trim(), both);
  }
}

/** The one of two conventions that was seen while the other was not. */
function only<A, B>(rowsA: number, a: A, rowsB: number, b: B): A | B | null {
  if (rowsA > 0 && rowsB > 0) return null;
  return rowsA > 0 ? a : rowsB > 0 ? b : null;
}

/** What the rows are read with: a person's answers before what the file shows. */
export function settledAnswers(survey: SurveyResult, answers: FileAnswers): FileAnswers {
  const dateOrder = answers.dateOrder ?? survey.conventions.dateOrder ?? undefined;
  const decimalSign = answers.decimalSign ?? survey.conventions.decimalSign ?? undefined;
  return {
    ...(dateOrder ? { dateOrder } : {}),
    ...(decimalSign ? { decimalSign } : {}),
    ...(answers.doubledHour ? { doubledHour: answers.doubledHour } : {}),
  };
}

/**
 * What must still be asked before a preview can be made? Empty when the file and the answers settle everything.
 */
export function fileQuestions(survey: SurveyResult, answers: FileAnswers): FileQuestion[] {
  const settled = settledAnswers(survey, answers);
  return [
    settled.dateOrder ? null : dateQuestion(survey),
    settled.decimalSign ? null : decimalQuestion(survey),
    settled.doubledHour ? null : doubledQuestion(survey, settled.dateOrder),
  ].filter((question) => question !== null);
}

function dateQuestion({ dateOrder }: SurveyResult): FileQuestion | null {
  const { first, rows } = dateOrder.open;
  if (!first) return null;
  const isMixed = dateOrder.seen["day-first"].rows > 0 && dateOrder.seen["month-first"].rows > 0;
  return {
    kind: "date-order",
    question: isMixed
      ? `The file holds dates with the day first and dates with the month first. Which is meant by “${first.text}” on line ${first.line}? Dates that do not fit the answer are refused.`
      : `Which day is meant by “${first.text}” on line ${first.line}? The whole file is read the same way.`,
    line: first.line,
    example: first.text,
    rows,
    choices: [
      { answer: "day-first", label: "Day first", reading: formatDay(first.dayFirst) },
      { answer: "month-first", label: "Month first", reading: formatDay(first.monthFirst) },
    ],
  };
}

function decimalQuestion({ decimal }: SurveyResult): FileQuestion | null {
  const isMixed = decimal.point.rows > 0 && decimal.comma.rows > 0;
  const example = decimal.open.first ?? (isMixed ? decimal.comma.first : null);
  if (!example) return null;
  const both = decimal.open.first;
  const mixed = `The file holds numbers with a decimal point (“${decimal.point.first?.text}”) and with a decimal comma (“${decimal.comma.first?.text}”). Which is its decimal sign? Numbers written the other way are refused.`;
  return {
    kind: "decimal-sign",
    question: isMixed
      ? mixed
      : `Which number is meant by “${example.text}” on line ${example.line}? The whole file is read the same way.`,
    line: example.line,
    example: example.text,
    rows: decimal.open.rows + (isMixed ? decimal.point.rows + decimal.comma.rows : 0),
    choices: [
      {
        answer: "point",
        label: "Decimal point",
        reading: both ? String(both.asPoint) : (decimal.point.first?.text ?? ""),
      },
      {
        answer: "comma",
        label: "Decimal comma",
        reading: both ? String(both.asComma) : (decimal.comma.first?.text ?? ""),
      },
    ],
  };
}

function doubledQuestion(survey: SurveyResult, order: DateOrder | undefined): FileQuestion | null {
  const { anyOrder } = survey.doubled;
  const ordered = order ? survey.doubled[order] : null;
  const first = anyOrder.first ?? ordered?.first ?? null;
  if (!first) return null;
  return {
    kind: "doubled-hour",
    question: `The clocks went back, so “${first.text}” on line ${first.line} was twice. Which one is meant?`,
    line: first.line,
    example: first.text,
    rows: anyOrder.rows + (ordered?.rows ?? 0),
    choices: [
      {
        answer: "earlier",
        label: "The first, before the clocks went back",
        reading: `${first.text} (UTC${first.earlier})`,
      },
      {
        answer: "later",
        label: "The second, after the clocks went back",
        reading: `${first.text} (UTC${first.later})`,
      },
      {
        answer: "refuse",
        label: "They differ",
        reading: "Refuse these rows; add the offset to each in the file",
      },
    ],
  };
}
