/**
 * Writing CSV that is safe to open in a spreadsheet. RFC 4180 for the form; OWASP "CSV Injection" for the escape:
 * a text that begins with = + - @ TAB CR LF is put in quotes behind an apostrophe. Numbers stay numbers.
 */

/** What may stand in a cell. A `number` is written as a number; a text is always a text, "-0.3" too. */
export type CsvValue = string | number | boolean | null | undefined;

export type CsvDelimiter = "," | ";" | "\t" | "|";

export type CsvOptions = {
  /** Default ",". */
  delimiter?: CsvDelimiter;
  /** The decimal sign of numbers; "comma" only with another delimiter than the comma. Default "point". */
  decimal?: "point" | "comma";
};

/** Begins a UTF-8 file so that spreadsheets read it as UTF-8. */
export const CSV_BOM = "\uFEFF";

/** RFC 4180 ends every record so. */
export const CSV_LINE_END = "\r\n";

/** A formula sign at the start, also behind spaces (some spreadsheets trim) or apostrophes, full-width forms too. */
const DANGEROUS = /^'*[ \u00A0]*[=+\-@\t\r\n＝＋－＠]/;
const NEEDS_QUOTES = /[",;|\t\r\n]|^[\s']|\s$/;

/** Would a spreadsheet take this text for a formula? */
export function isDangerousCsvText(text: string): boolean {
  return DANGEROUS.test(text);
}

/** Takes off the apostrophe that `csvField` put before a dangerous text; any other text is left as it is. */
export function unescapeCsvText(text: string): string {
  return text.charCodeAt(0) === 0x27 && DANGEROUS.test(text.slice(1)) ? text.slice(1) : text;
}

const quoted = (text: string): string => `"${text.replaceAll('"', '""')}"`;

/**
 * One cell of a CSV file.
 * @throws RangeError on a number that is not finite: there is no such value to write.
 * @example csvField("=1+2\";=1+2") // "\"'=1+2\"\";=1+2\""
 */
export function csvField(value: CsvValue, options: CsvOptions = {}): string {
  if (value === null || value === undefined) return "";
  if (typeof value === "boolean") return value ? "true" : "false";
  if (typeof value === "number") return numberField(value, options);
  if (isDangerousCsvText(value)) return quoted(`'${value}`);
  return NEEDS_QUOTES.test(value) ? quoted(value) : value;
}

function numberField(value: number, { delimiter = ",", decimal = "point" }: CsvOptions): string {
  if (!Number.isFinite(value)) throw new RangeError(`${value} cannot be written to a file`);
  const text = String(value);
  if (decimal === "point") return text;
  if (delimiter === ",") throw new RangeError("A decimal comma needs another delimiter than the comma");
  return text.replace(".", ",");
}

/** One record with its line end. A lone empty cell is written as "" so that it is no blank line. */
export function csvLine(values: readonly CsvValue[], options: CsvOptions = {}): string {
  const line = values.map((value) => csvField(value, options)).join(options.delimiter ?? ",");
  return (line === "" && values.length === 1 ? '""' : line) + CSV_LINE_END;
}

/**
 * A whole table, the header first.
 * @throws RangeError when a row has another number of cells than the header.
 */
export function writeCsv(
  header: readonly string[],
  rows: Iterable<readonly CsvValue[]>,
  options: CsvOptions = {},
): string {
  const lines = [csvLine(header, options)];
  for (const row of rows) {
    if (row.length !== header.length) {
      throw new RangeError(`A row has ${row.length} cells where the header has ${header.length}`);
    }
    lines.push(csvLine(row, options));
  }
  return lines.join("");
}
