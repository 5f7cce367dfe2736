import { createReadStream } from "node:fs";
import Papa from "papaparse";
import { unescapeCsvText } from "@/lib/csv";
import { invariant } from "@/lib/invariant";
import type { FileDelimiter, RawRow, RowProblem, TextEncoding } from "@/modules/imports/model";
import type { FileFacts } from "@/modules/imports/reader/inspect-file";
import type { RowSource } from "@/modules/imports/reader/row-source";
import { detectDelimiter } from "@/modules/imports/rules/detect-delimiter";
import { detectEncoding } from "@/modules/imports/rules/detect-encoding";
import { refuseFile } from "@/modules/imports/rules/refused-file";
import { RecordSplitter, type TextRecord } from "@/modules/imports/rules/split-records";

const SHOWN_CHARS = 200;

/**
 * Opens a text file: encoding and delimiter are found out, rows come as they are read, never the whole file.
 * @throws RefusedFile when it is no text
 */
export function openCsv(path: string, file: FileFacts): RowSource {
  const guess = detectEncoding(file.head, file);
  if (guess.kind !== "encoding") {
    throw refuseFile(
      "nul-bytes",
      guess.kind === "utf-32"
        ? "The file is written in UTF-32, which is not read here."
        : "The file holds NUL bytes, so it is damaged or is no text.",
      "Save it again as CSV in UTF-8 from the program that made it.",
    );
  }
  const { encoding, bomBytes } = guess;
  const sample = new TextDecoder(encoding, { ignoreBOM: true }).decode(file.head.subarray(bomBytes), {
    stream: true,
  });
  if (sample.trim() === "" && file.bytes <= file.head.length) {
    throw refuseFile(
      "empty-file",
      "The file holds nothing but blanks.",
      "Choose the file that holds the readings.",
    );
  }
  const { delimiter, hasSeparatorLine } = detectDelimiter(sample, file.bytes <= file.head.length);
  let bytesRead = bomBytes;
  const pieces = decoded(path, encoding, bomBytes, (bytes) => {
    bytesRead += bytes;
  });
  return {
    facts: { encoding, hasBom: bomBytes > 0, delimiter, serialEpoch: 1900, sheet: null, sheets: [] },
    rows: csvRows(pieces, delimiter, hasSeparatorLine),
    share: () => bytesRead / file.bytes,
  };
}

/** The file's text in pieces. @throws RefusedFile where bytes are no letters of the encoding */
async function* decoded(
  path: string,
  encoding: TextEncoding,
  start: number,
  onBytes: (bytes: number) => void,
): AsyncGenerator<string> {
  const decoder = new TextDecoder(encoding, { fatal: true, ignoreBOM: true });
  try {
    for await (const piece of createReadStream(path, { start, highWaterMark: 256 * 1024 })) {
      onBytes((piece as Buffer).length);
      yield decoder.decode(piece as Buffer, { stream: true });
    }
    yield decoder.decode();
  } catch (cause) {
    if (!(cause instanceof TypeError)) throw cause;
    throw refuseFile(
      "bad-encoding",
      `The file reads as ${encoding.toUpperCase()} but holds bytes that are no letters of it.`,
      "Save it again as CSV in UTF-8 from the program that made it.",
    );
  }
}

async function* csvRows(
  pieces: AsyncGenerator<string>,
  delimiter: FileDelimiter,
  hasSeparatorLine: boolean,
): AsyncGenerator<RawRow[]> {
  const splitter = new RecordSplitter(delimiter);
  const parser = new Papa.Parser({ delimiter, newline: "\n", quoteChar: '"' });
  const toRows = (records: TextRecord[]) =>
    parseRecords(
      parser,
      records.filter((record) => record.fields > 0 && !(hasSeparatorLine && record.line === 1)),
    );
  for await (const piece of pieces) {
    const rows = toRows(splitter.push(piece));
    if (rows.length > 0) yield rows;
  }
  const last = splitter.end();
  if (last) yield toRows([last]);
}

/** Cells of whole records. What RFC 4180 does not allow goes on as a problem, its text unread. */
function parseRecords(parser: Papa.Parser, records: TextRecord[]): RawRow[] {
  const sound = records.filter((record) => record.fault === null);
  const parsed = sound.length === 0 ? [] : cellsOf(parser, sound);
  let next = 0;
  return records.map((record) => {
    if (record.fault)
      return { line: record.line, cells: [record.text.slice(0, SHOWN_CHARS)], problem: quoteProblem(record) };
    const cells = parsed[next] ?? [];
    next += 1;
    invariant(
      cells.length === record.fields,
      `line ${record.line} was split into two different numbers of fields`,
    );
    return { line: record.line, cells: cells.map(unescapeCsvText) };
  });
}

function cellsOf(parser: Papa.Parser, records: TextRecord[]): string[][] {
  const { data } = parser.parse(records.map((record) => record.text).join("\n"), 0, false) as {
    data: string[][];
  };
  invariant(data.length === records.length, "records were split in two different ways");
  return data;
}

function quoteProblem(record: TextRecord): RowProblem {
  const isStray = record.fault === "stray-quote";
  return {
    line: record.line,
    column: null,
    columnName: null,
    code: isStray ? "stray-quote" : "text-after-quote",
    reason: isStray
      ? "A quotation mark stands inside a field that is not in quotation marks."
      : "A field goes on after its closing quotation mark.",
    mend: 'Put the whole field in quotation marks and write the inner one twice: "5"" pipe".',
    text: record.text.slice(0, SHOWN_CHARS),
  };
}
