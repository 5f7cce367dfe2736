import { writeFile } from "node:fs/promises";
import fc from "fast-check";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { type CsvDelimiter, csvLine, writeCsv } from "@/lib/csv";
import type { TextEncoding } from "@/modules/imports/model";
import { ReadingSession } from "@/modules/imports/reader/reading-session";
import { encodeText, isEncodable, sha256, workbook, writeLongLine } from "@/tests/support/import-files";
import { ImportFolder } from "@/tests/support/import-folder";

const files = new ImportFolder();
beforeAll(() => files.make());
afterAll(() => files.remove());

const ENCODINGS: readonly [TextEncoding, boolean][] = [
  ["utf-8", false],
  ["utf-8", true],
  ["utf-16le", true],
  ["utf-16be", true],
  ["utf-16le", false],
  ["utf-16be", false],
  ["windows-1252", false],
];
const DELIMITERS: readonly CsvDelimiter[] = [",", ";", "\t", "|"];
const HEADER = ["System", "Parameter", "Value", "Unit", "Taken at"];
const ROW = ["KELP-01", "TEMP", "12,5", "°C – 5€", "2026-03-14 09:00"];

describe("text files", () => {
  it.each(ENCODINGS)(
    "are read in %s (byte order mark: %s) with each delimiter",
    async (encoding, withBom) => {
      for (const delimiter of DELIMITERS) {
        const bytes = encodeText(writeCsv(HEADER, [ROW, ROW], { delimiter }), encoding, withBom);
        const { header, rows } = await files.read("readings.csv", bytes);
        expect(header).toMatchObject({
          kind: "csv",
          encoding,
          hasBom: withBom,
          delimiter,
          bytes: bytes.length,
        });
        expect(header.sha256).toBe(sha256(bytes));
        expect(header.columnMap.columns[0]).toMatchObject({ header: "System", use: { field: "system" } });
        expect(rows).toEqual([
          { line: 2, cells: ROW },
          { line: 3, cells: ROW },
        ]);
      }
    },
  );

  it("are read back cell for cell, whatever table was written, in any encoding and with any delimiter", async () => {
    const cell = fc.oneof(
      fc.string({ unit: "grapheme" }),
      fc.stringMatching(/^['=+\-@\t\r\n ;,|"aé€]{0,6}$/),
      fc.constant("\uFEFF"),
    );
    const table = fc.array(fc.tuple(fc.stringMatching(/^[A-Z]{1,4}$/), cell, cell, cell, cell), {
      minLength: 1,
      maxLength: 8,
    });
    await fc.assert(
      fc.asyncProperty(
        table,
        fc.constantFrom(...ENCODINGS),
        fc.constantFrom(...DELIMITERS),
        async (cells, [encoding, bom], delimiter) => {
          // A few plain rows let delimiter and encoding be found, as in any real file.
          const plain = Array.from({ length: 8 }, () => ROW.map((text) => text.replace(",", ".")));
          const rows = [...plain, ...cells].filter((row) => row.every((text) => isEncodable(text, encoding)));
          const read = await files.read(
            "any.csv",
            encodeText(writeCsv(HEADER, rows, { delimiter }), encoding, bom),
          );
          expect(read.header.encoding === encoding || encoding === "windows-1252").toBe(true);
          expect(read.rows.map((row) => row.cells)).toEqual(rows);
        },
      ),
      { numRuns: 150 },
    );
  });

  it("are read across the edges of the pieces they come in", async () => {
    const rows = Array.from({ length: 30_000 }, (_, index) => [
      "KELP-01",
      "PH",
      String(index),
      `°C "${index}"\r\n`,
      "é".repeat(index % 7),
    ]);
    const { rows: read } = await files.read("large.csv", writeCsv(HEADER, rows));
    expect(read.map((row) => row.cells)).toEqual(rows);
    expect(read[29_999]?.line).toBe(2 * 29_999 + 2);
  });

  // Source: RFC 4180 section 2: the five forms that are not allowed are reported.
  it("report what RFC 4180 does not allow by line, and read the rest", async () => {
    const good = "KELP-01,PH,8.1,,2026-03-14 09:00\r\n";
    const text = `System,Parameter,Value,Unit,Taken at\r\n${good}KELP"01,PH,8.1,,2026-03-14 09:00\r\n"KELP"01,PH,8.1,,2026-03-14 09:00\r\n${good.trim()},more\r\nKELP-01,PH\r\n\r\n${good}`;
    const { candidates, problems, rows, end } = await files.read("faults.csv", text, { mode: "map" });
    expect(problems.map(({ line, code }) => [line, code])).toEqual([
      [3, "stray-quote"],
      [4, "text-after-quote"],
      [5, "too-many-fields"],
      [6, "too-few-fields"],
    ]);
    expect(candidates.map(({ line }) => line)).toEqual([2, 8]);
    expect(rows.map(({ line }) => line)).toEqual([3, 4, 5, 6]);
    expect(end.rows).toBe(6);
    expect(await files.refusal("open.csv", 'System,Date,pH\n"KELP,2026-03-14,8.1\n')).toMatchObject({
      code: "unclosed-quote",
      line: 2,
    });
  });

  it("obey a first line that declares the separator", async () => {
    const { header, rows } = await files.read(
      "sep.csv",
      "sep=;\r\nSystem;Taken at;pH\r\nKELP-01;2026-03-14 09:00;8,1\r\n",
    );
    expect(header).toMatchObject({ delimiter: ";", columnMap: { headerLine: 2 } });
    expect(rows).toEqual([{ line: 3, cells: ["KELP-01", "2026-03-14 09:00", "8,1"] }]);
  });

  it("go on behind a line after an interruption", async () => {
    const text = writeCsv(HEADER, [ROW, ROW, ROW]);
    expect((await files.read("go-on.csv", text, { afterLine: 3 })).rows.map(({ line }) => line)).toEqual([4]);
    expect((await files.read("go-on.csv", text, { afterLine: 4 })).rows).toEqual([]);
  });

  it("come in batches of at most 500 rows", async () => {
    const wanted = files.request("batches.csv");
    await writeFile(wanted.path, csvLine(HEADER) + csvLine(ROW).repeat(1201));
    const session = await ReadingSession.open(wanted);
    const sizes: number[] = [];
    for (let batch = await session.next(); batch; batch = await session.next()) sizes.push(batch.rowsRead);
    expect(Math.max(...sizes)).toBe(500);
    expect(sizes.reduce((sum, size) => sum + size, 0)).toBe(1201);
  });
});

describe("refusals of text files", () => {
  it("say what is wrong with an empty file, a bare header and a missing header", async () => {
    expect(await files.refusal("empty.csv", "")).toMatchObject({ code: "empty-file" });
    expect(await files.refusal("blank.csv", " \r\n\r\n")).toMatchObject({ code: "empty-file" });
    expect(await files.refusal("commas.csv", ",,\r\n,,\r\n")).toMatchObject({ code: "empty-file" });
    expect(await files.refusal("bare.csv", csvLine(HEADER))).toMatchObject({ code: "no-rows", line: 1 });
    expect(await files.refusal("none.csv", "1,2\r\n3,4\r\n")).toMatchObject({ code: "no-header" });
    expect(await files.refusal("twice.csv", "System,pH,Date,pH\r\n")).toMatchObject({
      code: "duplicate-headers",
      line: 1,
    });
  });

  it("hold for NUL bytes, half a UTF-16 letter and too many columns", async () => {
    expect(await files.refusal("nul.csv", "System,pH\r\nKELP\0,8\r\n")).toMatchObject({ code: "nul-bytes" });
    const odd = Buffer.concat([encodeText(writeCsv(HEADER, [ROW]), "utf-16le", true), Buffer.from([0x41])]);
    expect(await files.refusal("odd.csv", odd)).toMatchObject({ code: "bad-encoding" });
    const nul16 = encodeText(`${csvLine(HEADER)}KELP\0`, "utf-16le", true);
    expect(await files.refusal("nul16.csv", nul16)).toMatchObject({ code: "nul-bytes", line: 2 });
    expect(await files.refusal("wide.csv", `${"pH,".repeat(10_000)}\r\n`)).toMatchObject({
      code: "too-many-columns",
      line: 1,
    });
  });

  it("hold for a name that does not agree with the content", async () => {
    expect(await files.refusal("scan.csv", "%PDF-1.7 …")).toMatchObject({ code: "wrong-type" });
    expect(await files.refusal("book.csv", await workbook([["pH"]]))).toMatchObject({ code: "wrong-type" });
    expect(await files.refusal("text.xlsx", "System,pH\r\n")).toMatchObject({ code: "wrong-type" });
    expect(await files.refusal("readings.docx", "System,pH\r\n")).toMatchObject({ code: "wrong-type" });
    expect(await files.refusal("readings", "System,pH\r\n")).toMatchObject({ code: "wrong-type" });
  });

  it("hold for files larger than allowed and for an endless line, which is not held in memory", async () => {
    expect(await files.refusal("big.csv", writeCsv(HEADER, [ROW]), { maxBytes: 20 })).toMatchObject({
      code: "too-large",
    });
    const wanted = files.request("line.csv");
    await writeLongLine(wanted.path, csvLine(HEADER), 100 * 1024 * 1024);
    const before = process.memoryUsage().rss;
    await expect(ReadingSession.open(wanted)).rejects.toMatchObject({
      refusal: { code: "line-too-long", line: 2 },
    });
    expect(process.memoryUsage().rss - before).toBeLessThan(80 * 1024 * 1024);
  });
});
