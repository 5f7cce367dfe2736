import {
  type DateStyle,
  IMPORT_LIMITS,
  type PlainCell,
  type RawCell,
  type RawRow,
} from "@/modules/imports/model";
import { readXml } from "@/modules/imports/reader/read-xml";
import type { RowSource } from "@/modules/imports/reader/row-source";
import {
  decodeEscapes,
  readWorkbookParts,
  type SheetPart,
  type WorkbookParts,
} from "@/modules/imports/reader/workbook-parts";
import { damaged, GuardedZip } from "@/modules/imports/reader/zip-guard";
import { refuseFile } from "@/modules/imports/rules/refused-file";

/**
 * Opens a workbook's worksheet: the archive is checked before anything is unpacked, rows come as they are read.
 * Formulas give the result that was saved with them; nothing is calculated. The first worksheet that is not
 * hidden is read, or the one that is named.
 * @throws RefusedFile
 */
export async function openXlsx(path: string, sheetName: string | null): Promise<RowSource> {
  const zip = await GuardedZip.open(path);
  const workbook = await readWorkbookParts(zip);
  const sheet = chooseSheet(workbook.sheets, sheetName);
  let bytesRead = 0;
  const pieces = counted(zip.read(sheet.part), (bytes) => {
    bytesRead += bytes;
  });
  return {
    facts: {
      encoding: null,
      hasBom: false,
      delimiter: null,
      serialEpoch: workbook.serialEpoch,
      sheet: sheet.name,
      sheets: workbook.sheets.filter((each) => !each.isHidden).map((each) => each.name),
    },
    rows: sheetRows(pieces, workbook),
    share: () => bytesRead / Math.max(1, zip.inflatedSize(sheet.part)),
  };
}

function chooseSheet(sheets: SheetPart[], name: string | null): SheetPart {
  const shown = sheets.filter((sheet) => !sheet.isHidden);
  const chosen = name === null ? (shown[0] ?? sheets[0]) : sheets.find((sheet) => sheet.name === name);
  if (chosen) return chosen;
  const names = shown.map((sheet) => `“${sheet.name}”`).join(", ");
  throw refuseFile("no-such-sheet", `The workbook has no worksheet “${name}”.`, `Choose one of ${names}.`);
}

async function* counted(
  pieces: AsyncGenerator<Buffer>,
  onBytes: (bytes: number) => void,
): AsyncGenerator<Buffer> {
  for await (const piece of pieces) {
    onBytes(piece.length);
    yield piece;
  }
}

async function* sheetRows(pieces: AsyncGenerator<Buffer>, workbook: WorkbookParts): AsyncGenerator<RawRow[]> {
  const builder = new SheetBuilder(workbook);
  for await (const _ of readXml(pieces, builder)) {
    const rows = builder.take();
    if (rows.length > 0) yield rows;
  }
}

/** "AB12" → 27; null where the reference is missing or is none. */
function columnOf(reference: string | undefined): number | null {
  if (!reference) return null;
  let column = 0;
  let index = 0;
  for (; index < reference.length; index += 1) {
    const code = reference.charCodeAt(index) & ~0x20;
    if (code < 65 || code > 90) break;
    column = column * 26 + code - 64;
  }
  return index === 0 || index > 3 ? null : column - 1;
}

/** Builds rows from the elements of a worksheet (ECMA-376 part 1, 18.3.1.4 c, 18.3.1.73 row, 18.18.11 cell types). */
class SheetBuilder {
  readonly #workbook: WorkbookParts;
  #rows: RawRow[] = [];
  #line = 0;
  #cells: RawCell[] = [];
  #column = -1;
  #type = "n";
  #dateStyle: DateStyle = null;
  #hasFormula = false;
  #value: string | null = null;
  #isReading = false;
  #phonetic = 0;

  constructor(workbook: WorkbookParts) {
    this.#workbook = workbook;
  }

  /** The rows finished since the last call. */
  take(): RawRow[] {
    const rows = this.#rows;
    this.#rows = [];
    return rows;
  }

  readonly open = (name: string, attributes: Record<string, string>): void => {
    if (name === "row") this.#openRow(attributes);
    else if (name === "c") this.#openCell(attributes);
    else if (name === "f") this.#hasFormula = true;
    else if (name === "rPh") this.#phonetic += 1;
    else if (name === "v" || (name === "t" && this.#phonetic === 0)) {
      this.#isReading = true;
      this.#value ??= "";
    }
  };

  readonly text = (text: string): void => {
    if (this.#isReading) this.#value += text;
  };

  readonly close = (name: string): void => {
    if (name === "v" || name === "t") this.#isReading = false;
    else if (name === "rPh") this.#phonetic -= 1;
    else if (name === "c") this.#closeCell();
    else if (name === "row" && this.#cells.length > 0)
      this.#rows.push({ line: this.#line, cells: this.#cells });
  };

  #openRow(attributes: Record<string, string>): void {
    const given = Number(attributes.r);
    this.#line = Number.isInteger(given) && given > this.#line ? given : this.#line + 1;
    this.#cells = [];
    this.#column = -1;
  }

  #openCell(attributes: Record<string, string>): void {
    this.#column = columnOf(attributes.r) ?? this.#column + 1;
    this.#type = attributes.t ?? "n";
    this.#dateStyle = this.#workbook.dateStyles[Number(attributes.s ?? 0)] ?? null;
    this.#hasFormula = false;
    this.#value = null;
  }

  #closeCell(): void {
    const cell = this.#cell();
    if (cell === null || cell === "") return;
    if (this.#column >= IMPORT_LIMITS.columns) {
      throw refuseFile(
        "too-many-columns",
        `Row ${this.#line} has more than ${IMPORT_LIMITS.columns} columns.`,
        `Keep the columns that are needed; at most ${IMPORT_LIMITS.columns} can be read.`,
        this.#line,
      );
    }
    while (this.#cells.length < this.#column) this.#cells.push(null);
    this.#cells[this.#column] = cell;
  }

  #cell(): RawCell {
    if (this.#type === "e" && this.#value !== null) return { kind: "error", text: this.#value };
    const value = this.#plain();
    const dateStyle = typeof value === "number" ? this.#dateStyle : null;
    if (this.#hasFormula) return { kind: "formula", value: value === "" ? null : value, dateStyle };
    if (dateStyle === null || typeof value !== "number") return value;
    return { kind: "serial", value, showsTime: dateStyle === "time" };
  }

  #plain(): PlainCell {
    const text = this.#value;
    if (text === null) return null;
    if (this.#type === "s") return this.#shared(text);
    if (this.#type === "b") return text.trim() === "1" || text.trim() === "true";
    if (this.#type !== "n") return decodeEscapes(text);
    const number = text.trim() === "" ? null : Number(text);
    if (number !== null && !Number.isFinite(number))
      throw damaged(`a cell of row ${this.#line} holds no number`);
    return number;
  }

  #shared(text: string): string {
    const found = this.#workbook.sharedStrings[Number(text)];
    if (found === undefined) throw damaged(`a text of row ${this.#line} is missing`);
    return found;
  }
}
