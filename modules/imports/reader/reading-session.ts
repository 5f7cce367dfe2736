import {
  type ColumnMap,
  type FileHeader,
  IMPORT_LIMITS,
  type RawRow,
  type RowContext,
} from "@/modules/imports/model";
import { fileKind } from "@/modules/imports/reader/file-kind";
import { inspectFile } from "@/modules/imports/reader/inspect-file";
import type { ReaderBatch, ReaderRequest } from "@/modules/imports/reader/messages";
import { openCsv } from "@/modules/imports/reader/read-csv";
import { openXlsx } from "@/modules/imports/reader/read-xlsx";
import type { RowSource } from "@/modules/imports/reader/row-source";
import { FileSurvey, type SurveyResult } from "@/modules/imports/rules/file-questions";
import { findHeader } from "@/modules/imports/rules/find-header";
import { RowMapper } from "@/modules/imports/rules/map-rows";
import { refuseFile } from "@/modules/imports/rules/refused-file";
import { isBlankRow } from "@/modules/imports/rules/row-cells";

/** Rows of a survey are handed on nowhere, so more of them make one step. */
const SURVEY_ROWS = 10_000;

/** One file being read from its first to its last row, a batch at a time. Runs in the reading process. */
export class ReadingSession {
  readonly header: FileHeader;
  readonly #mode: ReaderRequest["mode"];
  readonly #afterLine: number;
  readonly #source: RowSource;
  readonly #survey: FileSurvey;
  readonly #mapper: RowMapper;
  #waiting: RawRow[];
  #rows = 0;
  #isDone = false;

  private constructor(request: ReaderRequest, header: FileHeader, source: RowSource, firstRows: RawRow[]) {
    const { zone, answers, defaults } = request;
    const context: RowContext = {
      kind: header.kind,
      zone,
      serialEpoch: header.serialEpoch,
      answers,
      defaults,
    };
    this.header = header;
    this.#mode = request.mode;
    this.#afterLine = Math.max(request.afterLine ?? 0, header.columnMap.headerLine);
    this.#source = source;
    this.#waiting = firstRows;
    this.#survey = new FileSurvey(header.columnMap, context);
    this.#mapper = new RowMapper(header.columnMap, context);
  }

  /** Looks at the whole file once, then at its first rows for the header. @throws RefusedFile */
  static async open(request: ReaderRequest): Promise<ReadingSession> {
    const facts = await inspectFile(request.path, request.maxBytes);
    const kind = fileKind(request.name, facts.head);
    const source =
      kind === "csv" ? openCsv(request.path, facts) : await openXlsx(request.path, request.sheet ?? null);
    const firstRows = await readFirst(source.rows);
    if (firstRows.length === 0) {
      const where = source.facts.sheet === null ? "The file" : `The worksheet “${source.facts.sheet}”`;
      throw refuseFile(
        "empty-file",
        `${where} is empty.`,
        "Choose the file, or the worksheet, that holds the readings.",
      );
    }
    const columnMap = request.columnMap ?? foundMap(firstRows, request);
    const header: FileHeader = { kind, sha256: facts.sha256, bytes: facts.bytes, ...source.facts, columnMap };
    return new ReadingSession(request, header, source, firstRows);
  }

  /** The next batch, or null behind the last row. @throws RefusedFile */
  async next(): Promise<ReaderBatch | null> {
    const rows = await this.#take(this.#mode === "survey" ? SURVEY_ROWS : IMPORT_LIMITS.batchRows);
    if (rows.length === 0) {
      this.#checkNotEmpty();
      return null;
    }
    const last = rows[rows.length - 1];
    const wanted = rows.filter((row) => row.line > this.#afterLine && !isBlankRow(row));
    this.#rows += wanted.length;
    const batch: ReaderBatch = {
      rowsRead: wanted.length,
      lastLine: last?.line ?? 0,
      share: Math.min(1, this.#source.share()),
      rows: [],
      candidates: [],
      problems: [],
    };
    this.#work(wanted, batch);
    return batch;
  }

  /** Rows read so far, and what the survey saw. */
  end(): { rows: number; survey: SurveyResult | null } {
    return { rows: this.#rows, survey: this.#mode === "survey" ? this.#survey.end() : null };
  }

  async #take(count: number): Promise<RawRow[]> {
    while (this.#waiting.length < count && !this.#isDone) {
      const { value, done } = await this.#source.rows.next();
      if (done) this.#isDone = true;
      else this.#waiting = this.#waiting.length === 0 ? value : [...this.#waiting, ...value];
    }
    const rows = this.#waiting.slice(0, count);
    this.#waiting = this.#waiting.slice(count);
    return rows;
  }

  #work(rows: RawRow[], batch: ReaderBatch): void {
    if (this.#mode === "rows") batch.rows = rows;
    else if (this.#mode === "survey") for (const row of rows) this.#survey.add(row);
    else for (const row of rows) this.#map(row, batch);
  }

  #map(row: RawRow, batch: ReaderBatch): void {
    const { candidates, problems } = this.#mapper.map(row);
    batch.candidates.push(...candidates);
    batch.problems.push(...problems);
    if (problems.length > 0) batch.rows.push(row);
  }

  #checkNotEmpty(): void {
    if (this.#rows > 0 || this.#afterLine > this.header.columnMap.headerLine) return;
    throw refuseFile(
      "no-rows",
      "The file has a header but no rows below it.",
      "Choose the file that holds the readings.",
      this.header.columnMap.headerLine,
    );
  }
}

/** Reads on until there are enough rows to find the header in. */
async function readFirst(source: AsyncGenerator<RawRow[]>): Promise<RawRow[]> {
  const rows: RawRow[] = [];
  while (rows.length < IMPORT_LIMITS.headerRows) {
    const { value, done } = await source.next();
    if (done) break;
    for (const row of value) if (rows.length > 0 || !isBlankRow(row)) rows.push(row);
  }
  return rows;
}

function foundMap(rows: RawRow[], request: ReaderRequest): ColumnMap {
  const found = findHeader(rows, request.parameters);
  if (found.kind === "found") return found.columnMap;
  const { code, reason, mend, line } = found.refusal;
  throw refuseFile(code, reason, mend, line);
}
