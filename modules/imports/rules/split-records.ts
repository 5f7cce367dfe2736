import { IMPORT_LIMITS, type RowProblemCode } from "@/modules/imports/model";
import { type RefusedFile, refuseFile } from "@/modules/imports/rules/refused-file";

/** One record of a text file, still in one piece. `line` is the line on which it begins, from 1. */
export type TextRecord = {
  line: number;
  text: string;
  /** Number of fields; 0 for a blank line, which holds no record. */
  fields: number;
  /** What RFC 4180 does not allow and therefore must not be repaired silently. */
  fault: Extract<RowProblemCode, "stray-quote" | "text-after-quote"> | null;
};

const QUOTE = 0x22;
const CR = 0x0d;
const LF = 0x0a;

/** Where in a field the splitter stands: at its start, in a bare field, inside quotes, behind the closing quote. */
type Place = "start" | "bare" | "quoted" | "closed";

/**
 * Splits text into records at the line ends that stand outside quotes (RFC 4180; CR LF, LF or CR), keeping count
 * of lines, and stops at what would eat memory: an unclosed quote, an endless line, too many fields, NUL.
 * Text comes in pieces of any size; a piece may end anywhere.
 */
export class RecordSplitter {
  readonly #delimiter: number;
  #place: Place = "start";
  #pending = "";
  #line = 1;
  #recordLine = 1;
  #quoteLine = 1;
  #fields = 1;
  #fault: TextRecord["fault"] = null;
  #afterCr = false;

  constructor(delimiter: string) {
    this.#delimiter = delimiter.charCodeAt(0);
  }

  /** The records that this piece of text completes. @throws RefusedFile */
  push(text: string): TextRecord[] {
    const records: TextRecord[] = [];
    let from = 0;
    for (let index = 0; index < text.length; index += 1) {
      const code = text.charCodeAt(index);
      if (code === 0) throw this.#nul();
      const isLineEnd = code === CR || code === LF;
      if (isLineEnd && code === LF && this.#afterCr) {
        this.#afterCr = false;
        if (this.#place !== "quoted") from = index + 1;
        continue;
      }
      this.#afterCr = code === CR;
      if (isLineEnd) this.#line += 1;
      if (isLineEnd && this.#place !== "quoted") {
        records.push(this.#finish(this.#pending + text.slice(from, index)));
        from = index + 1;
        continue;
      }
      if (isLineEnd) this.#checkQuoteLines();
      else this.#step(code);
    }
    this.#pending += text.slice(from);
    this.#checkLength();
    return records;
  }

  /** The last record, if the file does not end with a line end. @throws RefusedFile */
  end(): TextRecord | null {
    if (this.#place === "quoted") throw this.#unclosed();
    return this.#pending === "" ? null : this.#finish(this.#pending);
  }

  #step(code: number): void {
    if (this.#place === "quoted") {
      if (code === QUOTE) this.#place = "closed";
    } else if (code === this.#delimiter) {
      this.#nextField();
    } else if (code === QUOTE) {
      this.#quote();
    } else if (this.#place === "closed") {
      this.#fault = "text-after-quote";
      this.#place = "bare";
    } else {
      this.#place = "bare";
    }
  }

  #quote(): void {
    if (this.#place === "bare") {
      this.#fault ??= "stray-quote";
      return;
    }
    if (this.#place === "start") this.#quoteLine = this.#line;
    this.#place = "quoted";
  }

  #nextField(): void {
    this.#place = "start";
    this.#fields += 1;
    if (this.#fields <= IMPORT_LIMITS.columns) return;
    throw refuseFile(
      "too-many-columns",
      `Line ${this.#recordLine} has more than ${IMPORT_LIMITS.columns} columns.`,
      `Keep the columns that are needed; at most ${IMPORT_LIMITS.columns} can be read.`,
      this.#recordLine,
    );
  }

  #finish(text: string): TextRecord {
    if (text.length > IMPORT_LIMITS.recordChars) throw this.#tooLong();
    const record = {
      line: this.#recordLine,
      text,
      fields: text === "" ? 0 : this.#fields,
      fault: this.#fault,
    };
    this.#pending = "";
    this.#place = "start";
    this.#fields = 1;
    this.#fault = null;
    this.#recordLine = this.#line;
    return record;
  }

  #checkLength(): void {
    if (this.#pending.length <= IMPORT_LIMITS.recordChars) return;
    throw this.#place === "quoted" ? this.#unclosed() : this.#tooLong();
  }

  #checkQuoteLines(): void {
    if (this.#line - this.#quoteLine > IMPORT_LIMITS.quotedLines) throw this.#unclosed();
  }

  #unclosed(): RefusedFile {
    return refuseFile(
      "unclosed-quote",
      `A quotation mark opens on line ${this.#quoteLine} and is never closed.`,
      `Close it on line ${this.#quoteLine}, or write a quotation mark inside a field twice ("").`,
      this.#quoteLine,
    );
  }

  #tooLong(): RefusedFile {
    return refuseFile(
      "line-too-long",
      `Line ${this.#recordLine} is longer than a million characters, so this is no table of readings.`,
      "Check that the file has line ends, and save it again as CSV.",
      this.#recordLine,
    );
  }

  #nul(): RefusedFile {
    return refuseFile(
      "nul-bytes",
      `Line ${this.#line} holds NUL characters, so the file is damaged or is no text.`,
      "Save it again as CSV in UTF-8 from the program that made it.",
      this.#line,
    );
  }
}
